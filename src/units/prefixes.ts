/** The SI prefixes of the spec language and their powers of ten. */

/** Powers of ten by prefix, as read; both code points of micro, and `u`, mean the same. */
export const prefixPowers: Readonly<Record<string, number>> = {
  '': 0,
  f: -15,
  p: -12,
  n: -9,
  µ: -6,
  u: -6,
  m: -3,
  k: 3,
  M: 6,
  G: 9,
  T: 12,
};

/** The prefixes that we print, from small to large. */
export const printedPrefixes: readonly { readonly prefix: string; readonly power: number }[] = [
  { prefix: 'f', power: -15 },
  { prefix: 'p', power: -12 },
  { prefix: 'n', power: -9 },
  { prefix: 'µ', power: -6 },
  { prefix: 'm', power: -3 },
  { prefix: '', power: 0 },
  { prefix: 'k', power: 3 },
  { prefix: 'M', power: 6 },
  { prefix: 'G', power: 9 },
  { prefix: 'T', power: 12 },
];
