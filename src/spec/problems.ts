/** Brings the faults of a file together: of its cuts, its slices, its channels and its names, each with its channel and its span in the file. */
import type { Inside } from './inside';
import type { LocalProblem } from './local-problem';
import { locate, spanOfLocated } from './locate';
import type { Located } from './locate';
import type { Problem } from './reading';
import type { Resolved } from './resolver';
import { sliceAt } from './slices/slice-at';
import type { ResolveProblem } from './resolve/resolution';
import { problemOf } from './slips/fault';
import type { Fault } from './slips/fault';

/** All problems in the order of the text. `ofFile` are those whose offsets count from the file's start. */
export function problemsOf(text: string, inside: Inside, faults: readonly Fault[], ofFile: readonly LocalProblem[]): Problem[] {
  const problems = [...faults.map(problemOf), ...ofFile, ...missingVersion(text, inside)].map((problem) => ({
    ...problem,
    channel: channelAt(inside, problem.span.start),
  }));
  for (const { slice, reading } of inside.slices) {
    for (const { problem, channel } of reading.problems) problems.push({ ...shifted(problem, slice.start), channel });
  }
  for (const [name, resolved] of inside.resolved) problems.push(...resolutionProblems(inside, name, resolved));
  return problems.sort((a, b) => a.span.start - b.span.start || a.span.end - b.span.end);
}

/** A problem with its offsets moved. */
function shifted(problem: LocalProblem, by: number): LocalProblem {
  const span = ({ start, end }: LocalProblem['span']): LocalProblem['span'] => ({ start: start + by, end: end + by });
  const cures = problem.cures.map(({ title, edits }) => ({
    title,
    edits: edits.map(({ span: at, newText }) => ({ span: span(at), newText })),
  }));
  return { ...problem, span: span(problem.span), cures };
}

function channelAt({ slices }: Inside, offset: number): string | null {
  const placed = sliceAt(slices, offset);
  if (placed === null) return null;
  const within = offset - placed.slice.start;
  const { channels } = placed.reading;
  if (placed.slice.kind === 'channel') return channels[0]?.name ?? null;
  return channels.find(({ pair }) => pair.keyStart <= within && within < (pair.value?.end ?? pair.keyEnd))?.name ?? null;
}

function resolutionProblems(inside: Inside, channel: string, { resolution }: Resolved): Problem[] {
  if (resolution.problems.length === 0) return [];
  const own = inside.names.channels.get(channel);
  const lossy = own !== undefined && sliceAt(inside.slices, own.base)?.reading.lossy === true;
  return resolution.problems
    .filter(({ code }) => !(lossy && code === 'missing-key'))
    .map((problem) => placed(inside, channel, problem));
}

function placed(inside: Inside, channel: string, { path, part, code, message, cures }: ResolveProblem): Problem {
  const located = locate(inside, { channel, path });
  const span = located === null ? { start: 0, end: 0 } : spanOfLocated(nameItself(located), path.length === 0 ? 'key' : part);
  return {
    code,
    severity: 'error',
    channel,
    span,
    message,
    cures: cures.map(({ title, newText }) => ({ title, edits: [{ span, newText }] })),
  };
}

/** What cannot be followed into another file stands at the name that leads there. */
function nameItself(located: Located): Located {
  return located.node?.form === 'scalar' ? { ...located, missing: [] } : located;
}

/** A spec says which version of the language it is written in. */
function missingVersion(text: string, { slices }: Inside): LocalProblem[] {
  if (slices.some(({ slice, reading }) => slice.kind === 'top' && reading.pairs.some(({ key }) => key === 'bandkeep'))) return [];
  const first = slices[0];
  const pair = first?.reading.pairs[0];
  const start = first?.slice.start ?? (text.startsWith('\uFEFF') ? 1 : 0);
  const span = pair === undefined ? { start, end: start } : { start: start + pair.keyStart, end: start + pair.keyEnd };
  const lineEnd = text.includes('\r\n') ? '\r\n' : '\n';
  const edits = [{ span: { start, end: start }, newText: `bandkeep: 1${lineEnd}` }];
  const message = 'The key `bandkeep` is missing: a spec begins with `bandkeep: 1`, the version of its language.';
  return [{ code: 'missing-key', severity: 'error', span, message, cures: [{ title: 'Put `bandkeep: 1` in front', edits }] }];
}
