/** The tokens a chart is drawn with: one ink, one ghost, one fill, and verdict colours for signals alone. */
const TOKENS = {
  ink: '--qr-ink',
  ink2: '--qr-ink-2',
  sheet: '--qr-sheet',
  line: '--qr-line-2',
  grid: '--qr-chart-grid',
  chart1: '--qr-chart-1',
  chart2: '--qr-chart-2',
  chart3: '--qr-chart-3',
  container: '--qr-primary-container',
  nok: '--qr-nok-fill',
  hold: '--qr-hold-fill',
  holdEdge: '--qr-hold-edge',
  holdTint: '--qr-hold-tint',
} as const;

/** Colours of the scheme that is shown at this moment, as a canvas understands them. */
export type ChartColours = Readonly<Record<keyof typeof TOKENS, string>>;

/** Reads the colours where a chart stands. A token names two colours; only a computed style says which of them holds. */
export function chartColours(place: HTMLElement): ChartColours {
  const probe = place.ownerDocument.createElement('span');
  // Where motion is reduced every change of colour is a very short transition, and would be read at its beginning.
  probe.style.setProperty('transition', 'none', 'important');
  place.append(probe);
  const style = getComputedStyle(probe);
  const colours = Object.entries(TOKENS).map(([name, token]) => {
    probe.style.color = `var(${token})`;
    return [name, style.color];
  });
  probe.remove();
  return Object.fromEntries(colours) as ChartColours;
}
