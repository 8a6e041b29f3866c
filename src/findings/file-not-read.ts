/** `file-not-read`: a file could not be read. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A file could not be read.',
  means: `The file does not exist, is a folder, may not be read, is not UTF-8, or lies outside the folder that the check was given, or a
line of it cannot be understood. The message names the path and the reason.`,
  matters: 'What it holds is part of the answer.',
  cure: `Correct the path. Paths are relative to the spec and stay inside the workspace, or inside the root given on the command line: for a
spec in \`gates/\`, write \`../tables/pick-up.csv\`, not an absolute path.`,
  example: null,
};

/** The finding code `file-not-read`; reading the text brings it. */
export const fileNotRead: FindingKind = {
  code: 'file-not-read',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
