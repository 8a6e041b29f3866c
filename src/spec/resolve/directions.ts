/** Checks that every key of a channel belongs to its direction, and that nothing required is missing. */
import { channel } from '../declaration/channel';
import { orList } from '../../units/fault';
import { keyOf } from '../decode-fields';
import type { Direction, Fields, Shape } from '../shape';
import type { Path } from '../place';
import type { Merged } from './like';
import type { Report } from './report';

/** Adds a fault for each key (of the channel and of its limits) that a channel of this direction does not take. */
export function checkDirections(direction: Direction, merged: Merged, report: Report): void {
  const fields = fieldsOf(channel);
  for (const name of Object.keys(merged.model)) checkKey(direction, fields, [], name, report);
  const { limits } = merged.model;
  const shape = fields === null ? undefined : keyOf(fields, 'limits')?.shape;
  if (!limits || shape === undefined) return;
  for (const name of Object.keys(limits)) checkKey(direction, fieldsOf(shape), ['limits'], name, report);
}

/** Adds a fault for each required key that neither the channel nor `like` gives. */
export function checkRequired(name: string, merged: Merged, report: Report): void {
  const fields = fieldsOf(channel);
  if (fields === null || merged.from === null) return;
  for (const [key, { required }] of Object.entries(fields.fields)) {
    if (required !== true || Object.hasOwn(merged.model, key)) continue;
    report.keyFault([], 'missing-key', `channel \`${name}\` needs \`${key}\`, which \`${merged.from}\` does not have either`);
  }
}

function fieldsOf(shape: Shape<unknown>): Fields | null {
  return shape.map !== undefined && 'fields' in shape.map ? shape.map : null;
}

function checkKey(direction: Direction, fields: Fields | null, above: Path, name: string, report: Report): void {
  const only = fields === null ? undefined : keyOf(fields, name)?.only;
  if (only === undefined || only.includes(direction)) return;
  const owners = orList(only.map((owner) => `\`${owner}\``));
  report.keyFault([...above, name], 'contradiction', `\`${name}\` belongs to ${owners} channels: this one is \`${direction}\``);
}
