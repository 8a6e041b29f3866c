/** What `import … from 'bandkeep'` gives: a spec's text in, its findings and figures out. Nothing here reads a file or prints. */
export { checkText, type CheckOptions } from './jobs';
export { explain } from './findings';
export type { Finding, Judgement } from './findings';
export { tally, toResult, toText } from './output';
export type { CheckedFile, InputFile, ResultFile, Tally } from './output';
export { read } from './spec';
export type { Reading } from './spec';
