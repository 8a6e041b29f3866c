/** Folds everything that is read alike (spaces, minus signs, ±, .., µ, Ω, °C) into one spelling. */

/** The text with every alike spelling replaced by its plain one, and the outer spaces gone. */
export function oneSpelling(text: string): string {
  // Most quantities are plain ASCII and have nothing to fold.
  if (/^[ -*,-~]*$/.test(text)) return text.trim();
  return text
    .replace(/[\u00a0\u2007\u2009\u200a\u202f\t]/g, ' ')
    .replace(/\u2212/g, '-')
    .replace(/\+ ?\/ ?-|\+-/g, '±')
    .replace(/…/g, '..')
    .replace(/μ/g, 'µ')
    .replace(/\u2126/g, 'Ω')
    .replace(/℃/g, '°C')
    .trim();
}
