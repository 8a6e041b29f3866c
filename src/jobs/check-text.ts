/** The whole check of one spec: read, judge, and prove fixes for what is wrong; the command line and the library run it. */
import { createJudgeStore, judging, remediesOf, type Finding } from '../findings';
import type { CheckedFile } from '../output';
import { curing, targetOf, type Cure } from '../remedies';
import { read, type FileSource } from '../spec';
import { drain } from './drain';

/** What a check may leave out. */
export interface CheckOptions {
  /** Whether fixes are searched for; the judgement is the same either way. */
  readonly fixes: boolean;
  /** The files that the spec names, loaded by the caller; without it a spec that names any is not whole. */
  readonly files?: FileSource;
}

/** Checks a text at once. `path` is what the result calls the file. */
export function checkText(path: string, text: string, options: CheckOptions = { fixes: true }): CheckedFile {
  return drain(checkingText(path, text, options));
}

/** The same check, yielding between steps so that a caller may stop it or share the thread. */
export function* checkingText(path: string, text: string, options: CheckOptions): Generator<void, CheckedFile> {
  const store = createJudgeStore();
  const judgement = yield* judging(read(text, undefined, options.files), store);
  const cures = new Map<Finding, Cure>();
  const searched = new Map<string, Cure>();
  for (const finding of options.fixes ? judgement.findings.filter(isCurable) : []) {
    const target = targetOf(finding);
    const cure = searched.get(target) ?? (yield* curing(judgement, finding, store));
    searched.set(target, cure);
    cures.set(finding, cure);
  }
  return { path, judgement, cures };
}

/** Faults of the text carry their own cures, an accepted finding asks for none, and advice has no kind of change to try. */
function isCurable(finding: Finding): boolean {
  return finding.accepted === null && 'place' in finding.at && remediesOf(finding.code).length > 0;
}
