/**
 * The SI prefixes in use here, as typed, with their power of ten. Both micro signs are written; u stands for them, and K
 * for k, where a keyboard or a part's marking (IEC 60062) has it so.
 */
export const PREFIX_PLACES: ReadonlyMap<string, number> = new Map([
  ['p', -12],
  ['n', -9],
  ['u', -6],
  ['\u00b5', -6],
  ['\u03bc', -6],
  ['m', -3],
  ['', 0],
  ['k', 3],
  ['K', 3],
  ['M', 6],
  ['G', 9],
]);
