/** An open spec over its versions: reads and judges the newest text, and reuses all that an edit left alone. */
import { createJudgeStore, judging, type Finding, type Judgement } from '../findings';
import { curing } from '../remedies';
import { read, type Reading } from '../spec';
import { createCureShelf } from './cure-shelf';
import type { SpecDocument } from './spec-document';

/** How much work the newest judged version was, for tests and benchmarks. */
export interface SpecCounts {
  readonly slices: number;
  readonly slicesRead: number;
  readonly channels: number;
  readonly channelsResolved: number;
  readonly channelsAnalysed: number;
}

/** An open spec. */
export interface LiveSpec {
  readonly uri: string;
  readonly version: number;
  /** The newest version, judged; null while it is not. */
  readonly document: SpecDocument | null;
  readonly counts: SpecCounts | null;
  /** Takes a newer text; nothing is computed until it is asked for. */
  change(version: number, text: string): void;
  /** Judges the newest version, yielding between channels. The caller drops it when a newer version arrives. */
  judging(): Generator<void, SpecDocument>;
  /** Searches for a finding's fixes and keeps the outcome with the document. */
  curing(document: SpecDocument, finding: Finding): Generator<void, void>;
}

/** Opens a spec. */
export function openSpec(uri: string, version: number, text: string): LiveSpec {
  const store = createJudgeStore();
  const shelf = createCureShelf();
  let newest = { version, text };
  let reading: Reading | null = null;
  let document: SpecDocument | null = null;
  let counts: SpecCounts | null = null;

  const documentOf = (judgement: Judgement): SpecDocument => ({
    uri,
    version: newest.version,
    reading: judgement.reading,
    judgement,
    store,
    hasCure: (finding) => shelf.has(judgement, finding),
    cureOf: (finding) => shelf.cureOf(judgement, finding),
  });

  return {
    uri,
    get version() {
      return newest.version;
    },
    get document() {
      return document;
    },
    get counts() {
      return counts;
    },
    change(nextVersion, nextText) {
      newest = { version: nextVersion, text: nextText };
      document = null;
    },
    *judging() {
      const before = store.analysed;
      reading = reading?.text === newest.text ? reading : read(newest.text, reading ?? undefined);
      const judgement = yield* judging(reading, store);
      document = documentOf(judgement);
      counts = countsOf(reading, store.analysed - before);
      return document;
    },
    *curing(on, finding) {
      const cure = yield* curing(on.judgement, finding, store);
      shelf.keep(on.judgement, finding, cure);
    },
  };
}

function countsOf(reading: Reading, channelsAnalysed: number): SpecCounts {
  return { ...reading.counts, channels: reading.entries.length, channelsAnalysed };
}
