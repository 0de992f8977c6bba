export { formatUncertainty as uncertaintyText, uncertaintyDecimals } from '#shared/quantities/format-uncertainty';
