/** Everything that leaves the program as text. */
export type { CheckedFile, InputFile } from './checked-file';
export type { ResultFile } from './result-file';
export { ansi, plain, type Paint } from './paint';
export { tally, toText, type Tally } from './text';
export { toResult } from './result';
