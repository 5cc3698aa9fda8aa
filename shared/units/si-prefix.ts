/** SI prefixes as powers of ten (BIPM SI Brochure, 9th edition); micro by its sign, by the Greek letter and by u. */
export const SI_PREFIX_EXPONENT: ReadonlyMap<string, number> = new Map([
  ['f', -15],
  ['p', -12],
  ['n', -9],
  ['µ', -6],
  ['μ', -6],
  ['u', -6],
  ['m', -3],
  ['', 0],
  ['k', 3],
  ['M', 6],
  ['G', 9],
  ['T', 12],
]);

/** The prefix printed for each power of ten. */
export const PREFIX_FOR_EXPONENT: ReadonlyMap<number, string> = new Map([
  [-15, 'f'],
  [-12, 'p'],
  [-9, 'n'],
  [-6, 'µ'],
  [-3, 'm'],
  [0, ''],
  [3, 'k'],
  [6, 'M'],
  [9, 'G'],
  [12, 'T'],
]);
