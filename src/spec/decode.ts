/** Walks a tree along a shape: gives the decoded value and every fault in one pass, each at its own span. */
import { decodeFields } from './decode-fields';
import { decodeScalar } from './decode-scalar';
import { expected } from './expected';
import { errorAt, writeInstead } from './local-problem';
import type { LocalProblem } from './local-problem';
import type { Entries, List, Shape } from './shape';
import type { ListNode, MapNode, ScalarNode, TreeNode } from './tree';
import type { Home, Walk } from './walk';

/** What a tree decodes to. */
export interface Decoded<T> {
  /** Null where the value itself is faulty; inside maps and lists, what is faulty is null. */
  readonly value: T | null;
  readonly problems: readonly LocalProblem[];
}

/**
 * Decodes a tree against a shape; never throws.
 * @param node the tree, null where nothing stands
 * @param home where it stands, for faults that have no span of their own
 */
export function decode<T>(shape: Shape<T>, node: TreeNode | null, home: Home): Decoded<T> {
  const problems: LocalProblem[] = [];
  const value = walk(shape, node, home, problems);
  return { value: value as T | null, problems };
}

const walk: Walk = (shape, node, home, problems) => {
  if (node === null) {
    problems.push(errorAt(home.span, 'missing-key', `${home.called} has no value: it takes ${expected(shape)}`));
    return null;
  }
  if (node.form === 'scalar' && shape.scalar !== undefined) {
    const reading = decodeScalar(shape.scalar, node);
    if ('value' in reading) return reading.value;
    problems.push(reading.fault);
    return null;
  }
  if (node.form === 'list' && shape.list !== undefined) return decodeList(shape.list, node, home, problems);
  if (node.form === 'map' && shape.map !== undefined) {
    return 'fields' in shape.map ? decodeFields(shape.map, node, home, problems, walk) : decodeEntries(shape.map, node, problems);
  }
  problems.push(wrongForm(shape, node, home));
  return null;
};

function wrongForm(shape: Shape<unknown>, node: TreeNode, home: Home): LocalProblem {
  const { scalar } = shape;
  const measured = scalar?.quantity ?? scalar?.range ?? scalar?.whole;
  const stands = node.form === 'scalar' ? `\`${node.text}\`` : `a ${node.form}`;
  const message = `${home.called} takes ${expected(shape)}, but ${stands} stands here`;
  const meant = node.form === 'scalar' ? keyMissing(shape, node) : null;
  return errorAt(
    node,
    measured === undefined ? 'syntax' : 'not-a-quantity',
    message,
    meant === null ? [] : [writeInstead(node, meant)],
  );
}

/** A value that stands where a map is needed may only lack its key: `wanted: 5 Hz .. 10 kHz`. */
function keyMissing({ map }: Shape<unknown>, node: ScalarNode): string | null {
  if (map === undefined || !('fields' in map)) return null;
  const fitting = Object.entries(map.fields).find(([, { shape, later }]) => {
    if (later === true || shape.scalar === undefined || shape.scalar.text === true) return false;
    return 'value' in decodeScalar(shape.scalar, node);
  });
  return fitting === undefined ? null : `{ ${fitting[0]}: ${node.text} }`;
}

function decodeList(list: List, node: ListNode, home: Home, problems: LocalProblem[]): unknown {
  if (node.items.length < list.atLeast) {
    problems.push(errorAt(node, 'missing-key', `the list of ${home.called} is empty: it takes ${expected(list.each)}`));
    return null;
  }
  return node.items.map((item, index) =>
    walk(list.each, item, { span: item ?? node, called: `item ${index + 1} of ${home.called}` }, problems),
  );
}

/** A name whose value has any fault maps to null: it exists, but nothing may be built on it. */
function decodeEntries(map: Entries, node: MapNode, problems: LocalProblem[]): ReadonlyMap<string, unknown> {
  const found = new Map<string, unknown>();
  for (const pair of node.pairs) {
    const span = { start: pair.keyStart, end: pair.keyEnd };
    if (found.has(pair.key)) {
      problems.push(
        errorAt(span, 'duplicate-name', `the name \`${pair.key}\` stands twice: give ${map.called} a name of its own`),
      );
      continue;
    }
    const before = problems.length;
    const value = walk(map.each, pair.value, { span, called: `\`${pair.key}\`` }, problems);
    found.set(pair.key, problems.length > before ? null : value);
  }
  return found;
}
