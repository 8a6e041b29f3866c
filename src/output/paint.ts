/** Colour for a terminal, by meaning; every meaning is also said in words, so nothing is lost without it. */

/** What a stretch of text means. */
export type Tone = 'bold' | 'dim' | 'error' | 'warning' | 'hint' | 'pass' | 'accepted';

/** Wraps a text in what shows its tone. */
export type Paint = (tone: Tone, text: string) => string;

/** No colour at all. */
export const plain: Paint = (_tone, text) => text;

/** ANSI escapes (ECMA-48, Select Graphic Rendition). */
export const ansi: Paint = (tone, text) => `\u001b[${codes[tone]}m${text}\u001b[0m`;

const codes: Readonly<Record<Tone, string>> = {
  bold: '1',
  dim: '2',
  error: '31',
  warning: '33',
  hint: '36',
  pass: '32',
  accepted: '36',
};
