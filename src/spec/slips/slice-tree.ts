/** Reads one slice: parses it, names the slips in it, puts them right and parses again, until nothing new is found. */
import { mend, unmended } from '../mend';
import type { Mend, Mended } from '../mend';
import type { Pair, TreeNode } from '../tree';
import { parseSlice } from '../yaml-tree';
import type { ParsedSlice } from '../yaml-tree';
import { badIndents, loneReturns } from './characters';
import { cutShort } from './cut-short';
import type { Diagnosis } from './diagnosis';
import { movedFault } from './fault';
import type { Fault } from './fault';
import { oddityFault } from './oddity-slips';
import { lineSlip } from './line-slips';
import { parserSlip } from './parser-slips';
import { treeSlips } from './tree-slips';

/** What a slice's text gives. All offsets count from the slice's start. */
export interface SliceTree {
  readonly tree: TreeNode | null;
  readonly faults: readonly Fault[];
  /** Whether something was passed over, so that what seems to be missing may stand there. */
  readonly lossy: boolean;
  /** Offset from which the parser could make nothing of the text; Infinity where it read everything. */
  readonly unreadFrom: number;
}

// A slice that needs more rounds than this is not worth more: each parses it once.
const mostRounds = 12;

/** Reads the text of a slice; `lead` is put in front of it for the parser. Never throws. */
export function sliceTree(lead: string, text: string): SliceTree {
  const reader = new SliceReader(mend(unmended(text), lead === '' ? [] : [{ start: 0, end: 0, newText: lead }]));
  return reader.read();
}

class SliceReader {
  private readonly faults: Fault[] = [];
  private readonly seen = new Set<string>();
  private lossy = false;
  private guessed = false;

  constructor(private mended: Mended) {}

  read(): SliceTree {
    this.admit(loneReturns(this.mended.text));
    let parsed = parseSlice(this.mended.text);
    if (this.admit(badIndents(this.mended.text, parsed))) parsed = parseSlice(this.mended.text);
    for (let round = 0; round < mostRounds; round += 1) {
      const slip = errorSlip(this.mended.text, parsed);
      const further = slip === null ? this.admitAll(slips(this.mended.text, parsed)) : this.admit(slip);
      this.guessed ||= slip?.certain === false;
      if (!further) break;
      parsed = parseSlice(this.mended.text);
    }
    return this.result(parsed);
  }

  private result({ tree, error }: ParsedSlice): SliceTree {
    const { text, toSource } = this.mended;
    const shortened = [...cutShort(text, tree)].map((found) => movedFault(found, toSource));
    if (tree !== null) move(tree, toSource);
    return {
      tree,
      faults: [...this.faults, ...shortened].sort((a, b) => a.start - b.start),
      lossy: this.lossy || error !== null,
      unreadFrom: error === null ? Infinity : toSource(text.lastIndexOf('\n', error.start) + 1),
    };
  }

  /** Takes one slip in and mends it; whether the text has changed. */
  private admit(slip: Diagnosis | null): boolean {
    return slip !== null && this.admitAll([slip]);
  }

  private admitAll(found: readonly Diagnosis[]): boolean {
    const mends: Mend[] = [];
    for (const { fault, mends: own, certain } of found) {
      if (!this.note(fault, certain) || own === null) continue;
      mends.push(...own);
    }
    const apart = sortedApart(mends);
    if (apart.length > 0) this.mended = mend(this.mended, apart);
    return apart.length > 0;
  }

  /** Whether the fault is new. Behind a guess only slips that are certain are worth telling: others may follow from it. */
  private note(found: Fault, certain: boolean): boolean {
    const fault = movedFault(found, this.mended.toSource);
    const mark = `${fault.start} ${fault.message}`;
    if (this.seen.has(mark)) return false;
    this.seen.add(mark);
    if (certain || !this.guessed) this.faults.push(fault);
    this.lossy ||= !certain;
    return true;
  }
}

/** What keeps the text from being the map that every slice is. */
function errorSlip(text: string, parsed: ParsedSlice): Diagnosis | null {
  const { error, tree } = parsed;
  if (error === null) return tree?.form === 'scalar' ? lineSlip(text, tree.start) : null;
  return (error.code === 'TAB_AS_INDENT' ? badIndents(text, parsed) : null) ?? parserSlip(text, { ...parsed, error });
}

function slips(text: string, parsed: ParsedSlice): Diagnosis[] {
  // The value of a merge key is nearly always an alias: the key is to blame.
  const merged = (start: number): boolean => /<<[ \t]*:[ \t]*$/.test(text.slice(Math.max(0, start - 20), start));
  const oddities = parsed.oddities.filter(({ kind, start }) => kind !== 'alias' || !merged(start));
  return [...oddities.map((oddity) => oddityFault(text, oddity)), ...treeSlips(text, parsed.tree)];
}

function sortedApart(mends: readonly Mend[]): Mend[] {
  const apart: Mend[] = [];
  for (const next of mends.toSorted((a, b) => a.start - b.start)) {
    if (next.start >= (apart.at(-1)?.end ?? 0)) apart.push(next);
  }
  return apart;
}

type Mutable<T> = { -readonly [K in keyof T]: T[K] };

/** Gives a tree the offsets of the source, in place: nobody else has it yet, and most slices need nothing but this. */
function move(node: TreeNode, toSource: (offset: number) => number): void {
  const own: Mutable<TreeNode> = node;
  own.start = toSource(node.start);
  own.end = toSource(node.end);
  if (node.form === 'list') for (const item of node.items) if (item !== null) move(item, toSource);
  if (node.form !== 'map') return;
  for (const pair of node.pairs) {
    const moved: Mutable<Pair> = pair;
    moved.keyStart = toSource(pair.keyStart);
    moved.keyEnd = toSource(pair.keyEnd);
    if (pair.value !== null) move(pair.value, toSource);
  }
}
