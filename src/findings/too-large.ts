/** `too-large`: a file is larger than can be sensible. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A file is larger than can be sensible.',
  means: 'Specs over 16 MiB and tables over 64 MiB are refused, before anything of them is read.',
  matters: 'Such a file is nearly always not a spec at all, and reading it would block the editor.',
  cure: `Split the spec: one file for each station, say, \`gate-3.bandkeep.yaml\` and \`gate-4.bandkeep.yaml\`. Thin out a table: the curve
between its points is straight in any case.`,
  example: null,
};

/** The finding code `too-large`; reading the text brings it. */
export const tooLarge: FindingKind = {
  code: 'too-large',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
