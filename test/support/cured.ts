/** Judges a text and searches for the fixes of one of its findings; and applies a fix, as an editor would. */
import assert from 'node:assert/strict';
import { createJudgeStore, judge, type Finding, type JudgeStore, type Judgement } from '../../src/findings';
import { cure, type Cure, type Fix } from '../../src/remedies';
import { applyEdits, read } from '../../src/spec';

/** A judged text, one of its findings, and what was found to cure it. */
export interface Cured {
  readonly judgement: Judgement;
  readonly finding: Finding;
  readonly cure: Cure;
  readonly store: JudgeStore;
}

/** The first finding of a code, in a channel if one is named, and its cure. */
export function cured(text: string, code: string, channel?: string): Cured {
  const store = createJudgeStore();
  const judgement = judge(read(text), store);
  const finding = judgement.findings.find((one) => one.code === code && (channel === undefined || one.channel === channel));
  assert.ok(finding !== undefined, `${code} is not among: ${judgement.findings.map((one) => one.message).join('\n')}`);
  return { judgement, finding, cure: cure(judgement, finding, store), store };
}

/** The titles of its fixes. */
export function titles({ cure: { fixes } }: Cured): readonly string[] {
  return fixes.map(({ title }) => title);
}

/** The text after a fix. */
export function after({ judgement }: Cured, fix: Fix): string {
  return applyEdits(judgement.reading.text, fix.edits);
}

/** The codes of the errors in a text, judged from nothing. */
export function errorsIn(text: string): readonly string[] {
  return judge(read(text), createJudgeStore())
    .findings.filter(({ severity }) => severity === 'error')
    .map(({ code, channel }) => `${code} in ${channel ?? 'the file'}`);
}
