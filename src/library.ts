/** What `import … from 'bandkeep'` gives: a spec's text in, and the files that it names, its findings and figures out. Nothing here reads a file or prints. */
export { checkText, type CheckOptions } from './jobs';
export { explain } from './findings';
export type { Finding, Judgement } from './findings';
export { tally, toResult, toText } from './output';
export type { CheckedFile, InputFile, ResultFile, Tally } from './output';
export { read } from './spec';
export type { FileContent, FileFault, FileSource, Reading } from './spec';
