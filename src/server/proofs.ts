/** Proves fixes in the background, one finding at a time: what a request waits for first, then the channel last looked at, then the rest. */
import type { Position } from 'vscode-languageserver';
import { runInSlices } from '../jobs';
import { channelAt, unproved, type Finding, type SpecDocument } from '../language';
import type { OpenSpecs } from './open-specs';
import type { Platform } from './platform';

/** A search that may be made. */
interface Search {
  readonly document: SpecDocument;
  readonly finding: Finding;
}

/** The proofs of all open specs. */
export interface Proofs {
  /** Goes on proving whatever is open; called when something may have become provable. */
  wake(): void;
  /** Remembers where the user is. */
  lookAt(uri: string, position: Position): void;
  /** Proves these findings now, ahead of everything else, until a newer version or the caller's cancellation comes. */
  prove(document: SpecDocument, findings: readonly Finding[], cancelled: () => boolean): Promise<void>;
}

/** Proofs for these specs; `report` hears of a search that failed, which is not tried again on the same version. */
export function createProofs(specs: OpenSpecs, platform: Platform, report: (fault: unknown) => void): Proofs {
  const queues = new WeakMap<SpecDocument, Set<Finding>>();
  let looked: { readonly uri: string; readonly position: Position } | null = null;
  let urgent = 0;
  let awake = false;

  const queueOf = (document: SpecDocument): Set<Finding> => {
    const queue = queues.get(document) ?? new Set(unproved(document));
    queues.set(document, queue);
    return queue;
  };

  const search = async ({ document, finding }: Search, cancelled: () => boolean): Promise<void> => {
    const spec = specs.get(document.uri);
    if (spec === undefined) return;
    const dropped = (): boolean => cancelled() || !specs.isNewest(document);
    try {
      const outcome = await runInSlices(spec.curing(document, finding), { ...platform, cancelled: dropped });
      if (outcome.kind === 'done') queueOf(document).delete(finding);
    } catch (fault) {
      queueOf(document).delete(finding);
      report(fault);
    }
  };

  const next = (): Search | null => {
    const inOrder = [...specs.all()].sort((a, b) => Number(b.uri === looked?.uri) - Number(a.uri === looked?.uri));
    for (const { document } of inOrder) {
      if (document === null) continue;
      const near = looked?.uri === document.uri ? channelAt(document, looked.position) : null;
      const queue = [...queueOf(document)];
      const finding = queue.find((candidate) => candidate.channel === near) ?? queue[0];
      if (finding !== undefined) return { document, finding };
    }
    return null;
  };

  const work = async (): Promise<void> => {
    awake = true;
    await platform.yieldControl();
    for (let job = next(); job !== null && urgent === 0; job = next()) {
      await search(job, () => urgent > 0);
      await platform.yieldControl();
    }
    awake = false;
  };

  const wake = (): void => {
    if (!awake && urgent === 0) void work();
  };

  return {
    wake,
    lookAt(uri, position) {
      looked = { uri, position };
    },
    async prove(document, findings, cancelled) {
      urgent += 1;
      for (const finding of findings) {
        if (!cancelled()) await search({ document, finding }, cancelled);
      }
      urgent -= 1;
      wake();
    },
  };
}
