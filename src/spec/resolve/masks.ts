/** Resolves the limits that are masks, by name or in place. */
import type { MaskEdge, MaskLimit, MaskSegment } from '../channel';
import type { LimitsModel } from '../declaration/limits';
import type { MaskModel, MaskSegmentModel, SegmentsModel } from '../declaration/mask';
import type { Path } from '../place';
import type { Quantity } from '../../units/quantity';
import type { Lookup } from './resolution';
import type { Report } from './report';
import { bandBetween } from './sources';

const keys = ['response', 'through', 'output'] as const;

/** The masks in the order of their keys, or null where one is faulty. */
export function resolveMasks(stated: LimitsModel, lookup: Lookup, report: Report): readonly MaskLimit[] | null {
  const found = keys.flatMap((key) => {
    const written = stated[key];
    return written === undefined ? [] : [written === null ? null : maskOf(key, written, lookup, report)];
  });
  const whole = found.flatMap((mask) => mask ?? []);
  return whole.length === found.length ? whole : null;
}

type Written = NonNullable<LimitsModel['response']>;

function maskOf(key: MaskLimit['key'], written: Written, lookup: Lookup, report: Report): MaskLimit | null {
  if (isMask(written)) return named(key, written, ['limits', key], { ref: null, margin: null }, lookup, report);
  if (!written.at || written.ref === null || written.margin === null) return null;
  const rest = { ref: written.ref ?? null, margin: written.margin?.value ?? null };
  return named(key, written.at, ['limits', key, 'at'], rest, lookup, report);
}

function isMask(written: Written): written is MaskModel {
  return Array.isArray(written) || 'refersTo' in written;
}

function named(
  key: MaskLimit['key'],
  mask: MaskModel,
  path: Path,
  rest: Pick<MaskLimit, 'ref' | 'margin'>,
  lookup: Lookup,
  report: Report,
): MaskLimit | null {
  if (!('refersTo' in mask)) return withSegments(key, mask, path, { mask: null, ...rest }, report);
  const name = mask.refersTo;
  report.use('masks', name);
  const found = lookup.mask(name);
  if (found === undefined) return report.unknownName(path, { space: 'masks', name }, lookup);
  if (found === null) return report.leansOnFaultOf({ space: 'masks', name }, path, lookup);
  return withSegments(key, found, path, { mask: name, ...rest }, report);
}

function withSegments(
  key: MaskLimit['key'],
  models: SegmentsModel,
  path: Path,
  rest: Pick<MaskLimit, 'mask' | 'ref' | 'margin'>,
  report: Report,
): MaskLimit | null {
  const found = models.map((model, index) => (model === null ? null : segmentOf(key, model, [...path, index], report)));
  const segments = found.flatMap((segment) => segment ?? []);
  return segments.length === found.length ? { key, segments, ...rest } : null;
}

function segmentOf(key: MaskLimit['key'], model: MaskSegmentModel, path: Path, report: Report): MaskSegment | null {
  const { band, within, below, above, to, along } = model;
  if (!band || to === null || along === null) return null;
  const common = { ...bandBetween(band), along: along ?? 'linear' };
  if (within) {
    if (key === 'output')
      return report.fault([...path, 'within'], 'wrong-unit', '`output` takes `below` or `above` in dBFS, not a range of gain');
    return { ...common, sense: 'within', lower: flat(within.low.value), upper: flat(within.high.value) };
  }
  const sense = below === undefined ? 'above' : 'below';
  const from = below ?? above;
  if (!from || !fits(key, from, [...path, sense], report) || (to && !fits(key, to, [...path, 'to'], report))) return null;
  const edge: MaskEdge = { fromDb: from.value, toDb: to?.value ?? from.value };
  return { ...common, sense, lower: sense === 'above' ? edge : null, upper: sense === 'below' ? edge : null };
}

const flat = (db: number): MaskEdge => ({ fromDb: db, toDb: db });

/** `output` is a level, the others are gains. */
function fits(key: MaskLimit['key'], { unit, value }: Quantity, path: Path, report: Report): boolean {
  const wanted = key === 'output' ? 'dBFS' : 'dB';
  if (unit === wanted) return true;
  report.fault(path, 'wrong-unit', `\`${key}\` is measured in ${wanted}, and this bound is in ${unit}`, `${value} ${wanted}`);
  return false;
}
