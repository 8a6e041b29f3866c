/** Resolves `aperture`, `hold` and `gate`. */
import type { Gate, Pulse, PulseWidth } from '../channel';
import { pulseShares } from '../declaration/bounds';
import type { GateModel, PulseModel, ShapedModel } from '../declaration/pulse';
import type { Path } from '../place';
import type { Quantity } from '../../units/quantity';
import { formatPercent } from '../../units/format';
import type { Report } from './report';

/** A zero-order hold: the whole period, flat. */
export const zeroOrder: Pulse = { shape: 'rectangle', width: { share: 1 } };

/** The most periods that an aperture, a hold or a gate may last; an aperture's time may exceed any period. */
const mostPeriods: Readonly<Record<'aperture' | 'hold' | 'gate', number>> = {
  aperture: Infinity,
  hold: pulseShares['%']?.high ?? Infinity,
  gate: 1,
};

/** What a pulse belongs to. */
export interface PulseContext {
  readonly key: 'aperture' | 'hold' | 'gate';
  readonly rateHz: number | null;
  readonly report: Report;
}

/** The pulse that was written, or null where it is faulty. */
export function resolvePulse(stated: PulseModel, context: PulseContext): Pulse | null {
  if (stated === 'instant') return { shape: 'instant' };
  if (stated === 'linear') return { shape: 'linear' };
  if (stated === 'zero-order') return zeroOrder;
  if (!('unit' in stated)) return shapedPulse(stated, context);
  const width = resolveWidth(stated, [context.key], context);
  return width === null ? null : { shape: 'rectangle', width };
}

/** The gate that was written, or null where it is faulty. */
export function resolveGate(stated: GateModel, context: PulseContext): Gate | null {
  if ('unit' in stated) {
    const width = resolveWidth(stated, ['gate'], context);
    return width === null ? null : { kind: 'pulse', pulse: { shape: 'rectangle', width } };
  }
  if (stated.track) {
    const track = resolveWidth(stated.track, ['gate', 'track'], context);
    return track === null ? null : { kind: 'track', track };
  }
  if (stated.shape === 'split') {
    return context.report.fault(['gate', 'shape'], 'contradiction', 'a `split` gate passes nothing of the wanted path itself');
  }
  const pulse = shapedPulse(stated, context);
  return pulse === null ? null : { kind: 'pulse', pulse };
}

function shapedPulse(stated: ShapedModel, context: PulseContext): Pulse | null {
  const width = stated.width ? resolveWidth(stated.width, [context.key, 'width'], context) : null;
  if (!stated.shape || width === null) return null;
  switch (stated.shape) {
    case 'trapezoid':
    case 'raised-cosine':
      return edgedPulse(stated, stated.shape, width, context);
    case 'exponential':
      return stated.decay ? { shape: 'exponential', width, decay: lengthOf(stated.decay) } : null;
    default:
      return { shape: stated.shape, width };
  }
}

function edgedPulse(
  { edge: stated }: ShapedModel,
  shape: 'trapezoid' | 'raised-cosine',
  width: PulseWidth,
  context: PulseContext,
): Pulse | null {
  if (stated === null || (stated === undefined && shape === 'trapezoid')) return null;
  const edge = stated === undefined ? halfOf(width) : lengthOf(stated);
  const periodS = context.rateHz === null ? null : 1 / context.rateHz;
  const [edgeS, widthS] = [secondsOf(edge, periodS), secondsOf(width, periodS)];
  if (edgeS === null || widthS === null || edgeS <= widthS / 2 + 1e-12 * widthS) return { shape, width, edge };
  return context.report.fault(
    [context.key, 'edge'],
    'contradiction',
    'two edges do not fit: each may last at most half the width',
  );
}

function resolveWidth(stated: Quantity, path: Path, { key, rateHz, report }: PulseContext): PulseWidth | null {
  const width = lengthOf(stated);
  const periods = 'share' in width ? width.share : rateHz === null ? null : width.seconds * rateHz;
  const most = mostPeriods[key];
  if (periods === null || periods <= most * (1 + 1e-12)) return width;
  const allowed = most === 1 ? 'one period' : `${most} periods`;
  return report.fault(
    path,
    'out-of-range',
    `a ${key} lasts at most ${allowed} of the rate: this is ${formatPercent(periods)} of one`,
  );
}

const lengthOf = ({ value, unit }: Quantity): PulseWidth => (unit === 's' ? { seconds: value } : { share: value });

const halfOf = (width: PulseWidth): PulseWidth =>
  'share' in width ? { share: width.share / 2 } : { seconds: width.seconds / 2 };

/** A length in seconds; null where it is a share of an unknown period. */
export function secondsOf(width: PulseWidth, periodS: number | null): number | null {
  if ('seconds' in width) return width.seconds;
  return periodS === null ? null : width.share * periodS;
}
