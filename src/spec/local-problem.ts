/** Faults as a slice sees them: spans count from the slice's start, and the channel is not known. */
import type { Span } from './place';
import type { Problem, ProblemCode } from './reading';

/** A fault of the text inside one slice. */
export type LocalProblem = Omit<Problem, 'channel'>;

/** A change that cures a fault. */
export type LocalCure = LocalProblem['cures'][number];

/** An error at a span of a slice. */
export function errorAt(span: Span, code: ProblemCode, message: string, cures: readonly LocalCure[] = []): LocalProblem {
  return { code, severity: 'error', span: { start: span.start, end: span.end }, message: sentence(message), cures };
}

/** A message as a sentence: a capital at its start, unless code stands there, and a point at its end. */
export function sentence(message: string): string {
  const whole = message.charAt(0).toUpperCase() + message.slice(1);
  return /[.?!]$/.test(whole) ? whole : `${whole}.`;
}

/** A cure that writes another text in place of a span. */
export function writeInstead(span: Span, newText: string): LocalCure {
  return { title: `Write it as \`${newText}\``, edits: [{ span: { start: span.start, end: span.end }, newText }] };
}
