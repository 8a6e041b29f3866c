/** The editor features as pure functions of a judged spec and a position; the server adds the wire and the schedule. */
export type { ClientAbilities } from './client-abilities';
export { asksForQuickFixes, codeActions } from './code-actions';
export type { ActionQuestion } from './code-actions';
export { completion } from './completion';
export { diagnostics } from './diagnostics';
export type { DiagnosticOptions } from './diagnostics';
export { documentSymbols, flatSymbols } from './document-symbols';
export { drawable } from './drawable';
export type { Drawable } from './drawable';
export { hover } from './hover';
export { openSpec } from './live-spec';
export type { LiveSpec, SpecCounts } from './live-spec';
export { channelAt, locate, placeNameAt } from './locate';
export { unproved, unprovedIn } from './proving';
export type { SpecDocument } from './spec-document';
export type { Finding } from '../findings';
export { largestTable } from '../spec';
export type { FileContent, FileSource } from '../spec';
