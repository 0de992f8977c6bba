/** Whether people at this browser write a decimal comma. */
export const DECIMAL_COMMA = new Intl.NumberFormat(navigator.language).format(0.5).includes(',');
