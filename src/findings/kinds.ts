/** The list of all finding codes, in the order of the documentation. */
import { aliasOverLimit } from './alias-over-limit';
import { beyondData } from './beyond-data';
import { contradiction } from './contradiction';
import { crosstalkOverLimit } from './crosstalk-over-limit';
import { delayOverLimit } from './delay-over-limit';
import { delaySpreadOverLimit } from './delay-spread-over-limit';
import { duplicateName } from './duplicate-name';
import { fileNotRead } from './file-not-read';
import type { Code, RemedyKind } from './finding';
import { flatnessOverLimit } from './flatness-over-limit';
import { headroomShort } from './headroom-short';
import { imageOverLimit } from './image-over-limit';
import type { FindingKind } from './kind';
import { levelOverLimit } from './level-over-limit';
import { missingKey } from './missing-key';
import { noFilter } from './no-filter';
import { noLimits } from './no-limits';
import { notAQuantity } from './not-a-quantity';
import { notJudged } from './not-judged';
import { nothingUnwanted } from './nothing-unwanted';
import { outOfRange } from './out-of-range';
import { outputOverMask } from './output-over-mask';
import { overdriven } from './overdriven';
import { overlapsWanted } from './overlaps-wanted';
import { rateUnavailable } from './rate-unavailable';
import { responseOverMask } from './response-over-mask';
import { snrShort } from './snr-short';
import { staleAcceptance } from './stale-acceptance';
import { syntax } from './syntax';
import { textCutShort } from './text-cut-short';
import { thinMargin } from './thin-margin';
import { tooLarge } from './too-large';
import { unknownKey } from './unknown-key';
import { unknownName } from './unknown-name';
import { unusedName } from './unused-name';
import { wantedFolds } from './wanted-folds';
import { wantedTouches } from './wanted-touches';
import { wrongUnit } from './wrong-unit';

/** Every finding code with its help, its check and the changes that may cure it. */
export const kinds: readonly FindingKind[] = [
  syntax,
  unknownKey,
  missingKey,
  duplicateName,
  unknownName,
  wrongUnit,
  notAQuantity,
  outOfRange,
  contradiction,
  fileNotRead,
  tooLarge,
  textCutShort,
  wantedFolds,
  wantedTouches,
  rateUnavailable,
  aliasOverLimit,
  headroomShort,
  overdriven,
  imageOverLimit,
  outputOverMask,
  crosstalkOverLimit,
  flatnessOverLimit,
  responseOverMask,
  delayOverLimit,
  delaySpreadOverLimit,
  levelOverLimit,
  snrShort,
  beyondData,
  notJudged,
  thinMargin,
  nothingUnwanted,
  noLimits,
  noFilter,
  unusedName,
  staleAcceptance,
  overlapsWanted,
];

const byCode: ReadonlyMap<string, FindingKind> = new Map(kinds.map((kind) => [kind.code, kind]));

/** What there is to know about a code; null where there is no such code. */
export function kindOf(code: string): FindingKind | null {
  return byCode.get(code) ?? null;
}

/** Whether a comment may accept findings of a code: only those about figures, and never the comment's own. */
export function acceptability(code: string): 'acceptable' | 'no-such-code' | 'not-acceptable' {
  const kind = kindOf(code);
  if (kind === null) return 'no-such-code';
  return kind.group === 'the text' || kind.code === 'stale-acceptance' ? 'not-acceptable' : 'acceptable';
}

/** The kinds of change that may cure findings of a code, cheapest first. */
export function remediesOf(code: Code): readonly RemedyKind[] {
  return kindOf(code)?.remedies ?? [];
}
