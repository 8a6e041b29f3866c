/** An open spec over its versions: reads and judges the newest text, and reuses all that an edit left alone. */
import { createJudgeStore, judging, type Finding, type Judgement } from '../findings';
import { curing } from '../remedies';
import type { FileSource, Reading } from '../spec';
import { createCureShelf } from './cure-shelf';
import { NewestText } from './newest-text';
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
  /** Goes up with every newer text and with every change of a file that it leans on. */
  readonly revision: number;
  /** The other files that the text last read leans on, from its root. */
  readonly paths: readonly string[];
  /** The newest version, judged; null while it is not. */
  readonly document: SpecDocument | null;
  readonly counts: SpecCounts | null;
  /** Takes a newer text; nothing is computed until it is asked for. */
  change(version: number, text: string): void;
  /** Drops what was judged, since a file that the spec leans on has other contents now. */
  refresh(): void;
  /** Reads the newest text with the files as they are, and gives the paths of all that it leans on. */
  read(): readonly string[];
  /** Judges the newest version, yielding between channels. The caller drops it when a newer version arrives. */
  judging(): Generator<void, SpecDocument>;
  /** Searches for a finding's fixes and keeps the outcome with the document. */
  curing(document: SpecDocument, finding: Finding): Generator<void, void>;
}

/** Opens a spec. `files` are those that it names, as far as they have been loaded. */
export function openSpec(uri: string, version: number, text: string, files?: FileSource): LiveSpec {
  const store = createJudgeStore();
  const shelf = createCureShelf();
  const newest = new NewestText(version, text, files);
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
    get revision() {
      return newest.revision;
    },
    get paths() {
      return newest.paths;
    },
    get document() {
      return document;
    },
    get counts() {
      return counts;
    },
    change(nextVersion, nextText) {
      newest.change(nextVersion, nextText);
      document = null;
    },
    refresh() {
      newest.refresh();
      document = null;
    },
    read: () => newest.read().paths,
    *judging() {
      const before = store.analysed;
      const current = newest.current();
      const judgement = yield* judging(current, store);
      document = documentOf(judgement);
      counts = countsOf(current, store.analysed - before);
      return document;
    },
    *curing(on, finding) {
      // Another finding with the same target may have been searched for meanwhile.
      if (shelf.has(on.judgement, finding)) return;
      const cure = yield* curing(on.judgement, finding, store);
      shelf.keep(on.judgement, finding, cure);
    },
  };
}

function countsOf(reading: Reading, channelsAnalysed: number): SpecCounts {
  return { ...reading.counts, channels: reading.entries.length, channelsAnalysed };
}
