/** About how wide a text is in a common sans-serif face, for drawings that are made where no font can be measured. */

/** A function that measures texts of one size; on the wide side, so that labels keep apart. */
export function approximateWidth(fontPx: number): (text: string) => number {
  return (text) =>
    Array.from(text).reduce((sum, letter) => sum + (narrow.test(letter) ? 0.34 : wide.test(letter) ? 0.9 : 0.6), 0) * fontPx;
}

const narrow = /[ilj.,:;'|!()ft\u00a0 ]/;
const wide = /[mwMW%]/;
