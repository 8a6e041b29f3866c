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
export class Proofs {
  /** What is left to prove of each document. */
  private readonly queues = new WeakMap<SpecDocument, Set<Finding>>();
  private readonly running = new Map<Finding, Promise<void>>();
  /** What requests wait for; the background makes way for it. */
  private readonly awaited = new Set<Finding>();
  private looked: { readonly uri: string; readonly position: Position } | null = null;
  private awake = false;

  /** `report` hears of a search that failed; it is not tried again on the same version. */
  constructor(
    private readonly specs: OpenSpecs,
    private readonly platform: Platform,
    private readonly report: (fault: unknown) => void,
  ) {}

  /** Goes on proving whatever is open; called when something may have become provable. */
  wake(): void {
    if (!this.awake && this.awaited.size === 0) void this.work();
  }

  /** Remembers where the user is. */
  lookAt(uri: string, position: Position): void {
    this.looked = { uri, position };
  }

  /** Proves these findings now, ahead of everything else, until a newer version or the caller's cancellation comes. */
  async prove(document: SpecDocument, findings: readonly Finding[], cancelled: () => boolean): Promise<void> {
    const over = (): boolean => cancelled() || !this.specs.isNewest(document);
    const queue = this.queueOf(document);
    for (const finding of findings) queue.add(finding);
    for (const finding of findings) {
      this.awaited.add(finding);
      // Another request may have begun the same search and been cancelled, so it is asked for until it is made.
      while (queue.has(finding) && !over()) await this.search({ document, finding }, cancelled);
      this.awaited.delete(finding);
    }
    this.wake();
  }

  private async work(): Promise<void> {
    this.awake = true;
    await this.platform.yieldControl();
    for (let job = this.next(); job !== null && this.awaited.size === 0; job = this.next()) {
      const { finding } = job;
      await this.search(job, () => this.awaited.size > 0 && !this.awaited.has(finding));
      await this.platform.yieldControl();
    }
    this.awake = false;
  }

  private next(): Search | null {
    const { looked } = this;
    const inOrder = [...this.specs.all()].sort((a, b) => Number(b.uri === looked?.uri) - Number(a.uri === looked?.uri));
    for (const { document } of inOrder) {
      if (document === null) continue;
      const near = looked?.uri === document.uri ? channelAt(document, looked.position) : null;
      const queue = [...this.queueOf(document)];
      const finding = queue.find((candidate) => candidate.channel === near) ?? queue[0];
      if (finding !== undefined) return { document, finding };
    }
    return null;
  }

  private queueOf(document: SpecDocument): Set<Finding> {
    const queue = this.queues.get(document) ?? new Set(unproved(document));
    this.queues.set(document, queue);
    return queue;
  }

  /** Makes a search, or joins the one that is being made. */
  private async search(search: Search, cancelled: () => boolean): Promise<void> {
    const { finding } = search;
    const end = this.running.get(finding) ?? this.begin(search, cancelled);
    this.running.set(finding, end);
    await end;
    this.running.delete(finding);
  }

  private async begin({ document, finding }: Search, cancelled: () => boolean): Promise<void> {
    const spec = this.specs.get(document.uri);
    if (spec === undefined) return;
    const dropped = (): boolean => cancelled() || !this.specs.isNewest(document);
    try {
      const outcome = await runInSlices(spec.curing(document, finding), { ...this.platform, cancelled: dropped });
      if (outcome.kind === 'done') this.queueOf(document).delete(finding);
    } catch (fault) {
      this.queueOf(document).delete(finding);
      this.report(fault);
    }
  }
}
