/** Parses one slice of YAML into our own tree, and lists what stands in it that is no part of the language; the only file that knows the `yaml` package. */
import { isAlias, isMap, isScalar, isSeq, parseDocument } from 'yaml';
import type { Node, Pair as YamlPair, Scalar } from 'yaml';
import type { Pair, TreeNode } from './tree';

/** Something legal in YAML that the language does without. */
export interface Oddity {
  readonly kind: 'alias' | 'anchor' | 'tag' | 'explicit-key' | 'empty-key' | 'odd-key' | 'too-deep';
  readonly start: number;
  readonly end: number;
  /** The name of an alias, an anchor or a tag; else empty. */
  readonly name: string;
}

/** The parser's first complaint, by its own code; its wording is never shown. */
export interface ParserError {
  readonly code: string;
  readonly start: number;
  readonly end: number;
  /** Which of several complaints with the same code it is. */
  readonly detail: string;
}

/** What one slice holds. */
export interface ParsedSlice {
  readonly tree: TreeNode | null;
  readonly error: ParserError | null;
  readonly oddities: readonly Oddity[];
}

/** No legal spec nests deeper than a dozen levels; beyond this many nothing is read, so that no walk can run out of stack. */
const deepest = 64;

// Running bracket depth that the parser still takes in its stride.
const deepestBrackets = 200;

/** Parses a text that has no document markers; never throws. */
export function parseSlice(text: string): ParsedSlice {
  const tooDeep = bracketsTooDeep(text);
  if (tooDeep !== null) return { tree: null, error: null, oddities: [tooDeep] };
  try {
    return parsed(text);
  } catch (thrown) {
    // The parser's recursion is the only thing here that can throw.
    if (!(thrown instanceof RangeError)) throw thrown;
    return { tree: null, error: null, oddities: [{ kind: 'too-deep', start: 0, end: 1, name: '' }] };
  }
}

function parsed(text: string): ParsedSlice {
  const document = parseDocument(text, {
    schema: 'failsafe',
    uniqueKeys: false,
    prettyErrors: false,
    // Only they tell an explicit key; keeping them costs time.
    keepSourceTokens: /(?:^|[\s,[{])\?(?:\s|$)/m.test(text),
    logLevel: 'silent',
  });
  // In brackets that are never closed, the parser also complains of comments that begin their line.
  const errors = document.errors.filter(
    (error) => !(error.message.startsWith('Comments must') && /^\s?$/.test(text.charAt(error.pos[0] - 1))),
  );
  const first = errors.reduce<(typeof errors)[number] | null>(
    (best, error) => (best === null || error.pos[0] < best.pos[0] ? error : best),
    null,
  );
  const oddities: Oddity[] = [];
  const tree = new Converter(text, oddities).node(document.contents, 0);
  return {
    tree,
    oddities,
    error: first === null ? null : { code: first.code, start: first.pos[0], end: first.pos[1], detail: first.message },
  };
}

/** Quotes and comments are not looked at: a legal spec does not hold that many more opening than closing brackets in them either. */
function bracketsTooDeep(text: string): Oddity | null {
  let depth = 0;
  for (let at = 0; at < text.length; at += 1) {
    const code = text.charCodeAt(at);
    if (code === 0x5b || code === 0x7b) depth += 1;
    else if (code === 0x5d || code === 0x7d) depth = Math.max(0, depth - 1);
    if (depth > deepestBrackets) return { kind: 'too-deep', start: at, end: at + 1, name: '' };
  }
  return null;
}

/** One walk over the parser's tree. */
class Converter {
  constructor(
    private readonly text: string,
    private readonly oddities: Oddity[],
  ) {}

  node(node: unknown, depth: number): TreeNode | null {
    if (isAlias(node)) return this.alias(node);
    if (isScalar(node)) return this.scalar(node);
    if (!isMap(node) && !isSeq(node)) return null;
    this.props(node);
    const [start, end] = spanOf(node);
    if (depth >= deepest) {
      this.oddities.push({ kind: 'too-deep', start, end: start + 1, name: '' });
      return null;
    }
    if (isSeq(node)) return this.list(node.items, start, node.flow === true ? end : null, depth);
    return this.map(node.items, start, node.flow === true ? end : null, depth);
  }

  /** A flow collection's span takes in its brackets; a block's runs to the end of its last value. */
  private list(items: readonly unknown[], start: number, flowEnd: number | null, depth: number): TreeNode {
    const nodes = items.map((item) =>
      isPair(item) ? this.map([item], this.keyStart(item), null, depth) : this.node(item, depth + 1),
    );
    return { form: 'list', start, end: flowEnd ?? nodes.findLast((item) => item !== null)?.end ?? start + 1, items: nodes };
  }

  private map(items: readonly YamlPair[], start: number, flowEnd: number | null, depth: number): TreeNode {
    const pairs: Pair[] = [];
    for (const item of items) {
      const key = this.key(item);
      if (key === null) continue;
      pairs.push({ key: key.text, keyStart: key.start, keyEnd: key.end, value: this.node(item.value, depth + 1) });
    }
    const first = pairs[0];
    const last = pairs.at(-1);
    if (flowEnd !== null || first === undefined || last === undefined)
      return { form: 'map', start, end: flowEnd ?? start, pairs };
    return { form: 'map', start: first.keyStart, end: last.value?.end ?? last.keyEnd, pairs };
  }

  private keyStart(pair: YamlPair): number {
    const { key } = pair;
    return isScalar(key) || isMap(key) || isSeq(key) ? spanOf(key)[0] : 0;
  }

  /** The key, if it is a scalar and not empty. */
  private key(pair: YamlPair): { text: string; start: number; end: number } | null {
    const { key } = pair;
    const explicit = pair.srcToken?.start.find((token) => token.type === 'explicit-key-ind');
    if (explicit !== undefined) this.push('explicit-key', explicit.offset, explicit.offset + 1, '');
    if (isAlias(key)) this.alias(key);
    if (!isScalar(key)) {
      const start = this.keyStart(pair);
      if (explicit === undefined && !isAlias(key)) this.push('odd-key', start, start + 1, '');
      return null;
    }
    const node = this.scalar(key);
    if (node?.form !== 'scalar') {
      const start = this.colonFrom(spanOf(key)[0]);
      if (explicit === undefined) this.push('empty-key', start, start + 1, '');
      return null;
    }
    return node;
  }

  /** The parser puts an empty key where the text before it ends. */
  private colonFrom(start: number): number {
    return start + (/^(?:\s|#[^\n]*)*(?=:)/.exec(this.text.slice(start))?.[0].length ?? 0);
  }

  /** A scalar; null where nothing is written. */
  private scalar(node: Scalar): TreeNode | null {
    this.props(node);
    const [start, end] = spanOf(node);
    if (node.type === 'PLAIN' && end === start) return null;
    const quoted = node.type === 'QUOTE_DOUBLE' || node.type === 'QUOTE_SINGLE';
    return { form: 'scalar', start, end: this.withoutTrailingSpace(start, end), text: String(node.value), quoted };
  }

  /** A block scalar's range takes in its last line end; ours does not. */
  private withoutTrailingSpace(start: number, end: number): number {
    let last = end;
    while (last > start + 1 && /\s/.test(this.text.charAt(last - 1))) last -= 1;
    return last;
  }

  private alias(node: Node & { source: string }): null {
    this.props(node);
    const [start, end] = spanOf(node);
    this.push('alias', start, end, node.source);
    return null;
  }

  /** An anchor or a tag stands somewhere before the node that it belongs to. */
  private props(node: { anchor?: string; tag?: string; range?: Node['range'] }): void {
    const start = node.range?.[0] ?? 0;
    if (node.anchor !== undefined) {
      const at = this.text.lastIndexOf(`&${node.anchor}`, start);
      if (at >= 0) this.push('anchor', at, at + 1 + node.anchor.length, node.anchor);
    }
    if (node.tag !== undefined) {
      const from = this.tagStart(this.text.lastIndexOf('!', start - 1));
      const word = /^[^\s,[\]{}]*/.exec(this.text.slice(from))?.[0] ?? '';
      this.push('tag', from, from + word.length, word);
    }
  }

  private tagStart(bang: number): number {
    let from = Math.max(0, bang);
    while (from > 0 && !/[\s[{,]/.test(this.text.charAt(from - 1))) from -= 1;
    return from;
  }

  private push(kind: Oddity['kind'], start: number, end: number, name: string): void {
    this.oddities.push({ kind, start, end, name });
  }
}

function spanOf(node: { range?: Node['range'] }): [number, number] {
  return [node.range?.[0] ?? 0, node.range?.[1] ?? 0];
}

/** A `key: value` that stands as an item of a flow list. */
function isPair(item: unknown): item is YamlPair {
  return typeof item === 'object' && item !== null && 'key' in item && 'value' in item && !isScalar(item);
}
