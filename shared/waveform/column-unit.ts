/** Units of time and of voltage as instruments write them above their columns, each in seconds or volts. */
export const SECOND_SCALES: ReadonlyMap<string, number> = new Map([
  ['s', 1],
  ['sec', 1],
  ['second', 1],
  ['seconds', 1],
  ['ms', 1e-3],
  ['us', 1e-6],
  ['ns', 1e-9],
]);
export const VOLT_SCALES: ReadonlyMap<string, number> = new Map([
  ['V', 1],
  ['v', 1],
  ['volt', 1],
  ['volts', 1],
  ['Volt', 1],
  ['Volts', 1],
  ['mV', 1e-3],
  ['mv', 1e-3],
  ['uV', 1e-6],
  ['kV', 1e3],
]);

/** The unit that a text is, brackets aside; empty where it is none. Both signs for micro (U+00B5, U+03BC) stand for "u". */
export function unitOf(text: string): string {
  const unit = text
    .trim()
    .replace(/^[([](.*)[)\]]$/, '$1')
    .trim()
    .replace(/^[µμ]/, 'u');
  return SECOND_SCALES.has(unit) || VOLT_SCALES.has(unit) ? unit : '';
}

/** The unit at the end of a column's name: "Time (ms)", "CH1 [mV]", "time_s", "t/us"; empty where there is none. */
export function unitInName(name: string): string {
  return unitOf(/(?:[_/\s]|(?=[([]))([([]?[^\s_/([]+)$/.exec(name.trim())?.[1] ?? name);
}
