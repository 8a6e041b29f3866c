/** Resolves `rate` and `rate-choices`: a plain frequency, or a clock multiplied and divided. */
import type { ClockShare, Rate, RateChoices } from '../channel';
import type { ClockModel } from '../declaration/clock';
import type { RateChoicesModel, RateModel } from '../declaration/rate';
import { unitBounds } from '../declaration/bounds';
import type { Path } from '../place';
import type { QuantityRange } from '../../units/quantity';
import type { Named } from '../shape';
import { isList } from './one-or-many';
import type { Lookup } from './resolution';
import type { Report } from './report';
import { settledTolerance } from './tolerance';

/** The sampling rate, or null where it cannot be told. */
export function resolveRate(stated: RateModel, lookup: Lookup, report: Report): Rate | null {
  if ('value' in stated) return { hz: stated.value, tolerance: settledTolerance(stated.tolerance), clock: null };
  const clock = clockOf(stated.clock, ['rate', 'clock'], lookup, report);
  const share = clock === null ? null : shareOf(clock, stated.multiply, stated.divide);
  if (clock === null || share === null) return null;
  const hz = (share.frequencyHz * share.multiply) / share.divide;
  const { low, high } = unitBounds.Hz;
  if (hz < low || hz > high) {
    return report.fault(
      ['rate'],
      'out-of-range',
      `\`${share.name}\` · ${share.multiply} / ${share.divide} is not a rate between 1 nHz and 1000 THz`,
    );
  }
  return { hz, tolerance: settledTolerance(clock.model.frequency?.tolerance), clock: share };
}

/** What a fix may choose a rate from, or null where it cannot be told. */
export function resolveRateChoices(stated: RateChoicesModel, lookup: Lookup, report: Report): RateChoices | null {
  if ('low' in stated) return rangeChoice(stated, null);
  if (isList(stated)) return listChoice(stated);
  if (stated.range) return steppedChoice(stated.range, stated.step?.value ?? null, report);
  const clock = clockOf(stated.clock, ['rate-choices', 'clock'], lookup, report);
  const share = clock === null ? null : shareOf(clock, stated.multiply, undefined);
  if (share === null || !stated.divide) return null;
  const divides =
    typeof stated.divide === 'number' ? [stated.divide] : isList(stated.divide) ? whole(stated.divide) : stated.divide;
  return divides === null ? null : { kind: 'clock', clock: share, divides };
}

interface KnownClock {
  readonly name: string;
  readonly model: ClockModel;
}

function clockOf(named: Named | null | undefined, path: Path, lookup: Lookup, report: Report): KnownClock | null {
  if (!named) return null;
  report.use('clocks', named.refersTo);
  const model = lookup.clock(named.refersTo);
  if (model === undefined) return report.unknownName(path, { space: 'clocks', name: named.refersTo }, lookup);
  if (model === null) return report.leansOnFaultOf({ space: 'clocks', name: named.refersTo }, path, lookup);
  return { name: named.refersTo, model };
}

/** A missing factor is 1; a faulty one makes the share unknown. */
function shareOf(
  { name, model }: KnownClock,
  multiply: number | null | undefined,
  divide: number | null | undefined,
): ClockShare | null {
  if (!model.frequency || multiply === null || divide === null) return null;
  return {
    name,
    frequencyHz: model.frequency.value,
    jitterSeconds: model.jitter?.value ?? 0,
    multiply: multiply ?? 1,
    divide: divide ?? 1,
  };
}

/** More steps than this are a slip, not a choice. */
const mostSteps = 1_000_000;

function steppedChoice(range: QuantityRange, stepHz: number | null, report: Report): RateChoices | null {
  const choice = rangeChoice(range, stepHz);
  if (stepHz === null || choice.kind !== 'range' || (choice.highHz - choice.lowHz) / stepHz <= mostSteps) return choice;
  return report.fault(['rate-choices', 'step'], 'out-of-range', 'the step divides the range into more than a million rates');
}

function rangeChoice({ low, high }: QuantityRange, stepHz: number | null): RateChoices {
  const bounds = unitBounds.Hz;
  return { kind: 'range', lowHz: Math.max(low.value, bounds.low), highHz: Math.min(high.value, bounds.high), stepHz };
}

function listChoice(stated: readonly ({ readonly value: number } | null)[]): RateChoices | null {
  const ratesHz = stated.flatMap((item) => (item === null ? [] : [item.value]));
  return ratesHz.length === stated.length ? { kind: 'list', ratesHz } : null;
}

function whole(stated: readonly (number | null)[]): readonly number[] | null {
  const known = stated.flatMap((item) => (item === null ? [] : [item]));
  return known.length === stated.length ? known : null;
}
