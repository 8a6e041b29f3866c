/** What the other layers use of findings: the list of codes, the judgement, help. */
export { acceptability, kinds as codes, remediesOf } from './kinds';
export type { Code, Finding, RemedyKind, Severity } from './finding';
export type { Example } from './kind';
export { counts, judge, judging, type ChannelJudgement, type Judgement } from './judge';
export { explain, pageName } from './page';
export { thinBelow } from './limits';
export { same as sameRate } from './rate-choices';
export { spanOfFinding } from './span';
export { windowWords, zoneWords } from './window-words';
export { decimalsFor, limitWords } from './wording';
export { createJudgeStore, type JudgeStore, type Store } from './store';
