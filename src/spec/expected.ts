/** Says in words what may stand at a place, for messages about what stands there instead. */
import { kindProse } from '../units/unit-table';
import { orList } from '../units/fault';
import type { Scalar, Shape } from './shape';

/** "a rate such as `48 kHz`, or a map with `clock`, …". */
export function expected(shape: Shape<unknown>): string {
  const parts = shape.scalar === undefined ? [] : [...scalarParts(shape.scalar)];
  if (shape.map !== undefined && 'fields' in shape.map) parts.push(`a map with ${mapKeys(shape.map)}`);
  if (shape.map !== undefined && !('fields' in shape.map)) parts.push('a map of names');
  if (shape.list !== undefined)
    parts.push(parts.length > 0 ? 'a list of such' : `a list, each item ${expected(shape.list.each)}`);
  return orList([...new Set(parts)]);
}

function mapKeys({ fields, decidedBy }: { readonly fields: object; readonly decidedBy?: readonly string[] }): string {
  const entries = Object.entries(fields as Readonly<Record<string, { later?: true; required?: true }>>);
  const now = entries.filter(([, key]) => key.later !== true);
  const telling =
    decidedBy === undefined ? now.filter(([, key]) => key.required) : now.filter(([name]) => decidedBy.includes(name));
  const shown = (telling.length > 0 ? telling : now).map(([name]) => `\`${name}\``);
  return decidedBy === undefined ? shown.slice(0, 4).join(', ') : orList(shown);
}

function* scalarParts(scalar: Scalar): Generator<string> {
  if (scalar.name !== undefined) yield `a name from \`${scalar.name}\``;
  for (const known of Object.keys(scalar.words ?? {})) yield `\`${known}\``;
  if (scalar.quantity !== undefined)
    yield* scalar.quantity.map((kind) => `${kindProse[kind].called} such as \`${kindProse[kind].example}\``);
  if (scalar.range !== undefined)
    yield `a range \`LOW .. HIGH\` of ${orList(scalar.range.map((kind) => kindProse[kind].called))}`;
  if (scalar.whole !== undefined) yield `a whole number from ${scalar.whole[0]} to ${scalar.whole[1]}`;
  if (scalar.wholeRange !== undefined) yield 'a range of whole numbers such as `120 .. 480`';
  if (scalar.number !== undefined) yield 'a plain number without a unit';
  if (scalar.root !== undefined) yield `a ${scalar.root} such as \`-800 ± 600j Hz\``;
  if (scalar.text === true) yield scalar.path === true ? 'the path of a file' : 'text';
}
