/** Turns levels in volts, dBV, dBu and dBm into dBFS, by full scale and impedance. */
import type { Quantity, QuantityRange, Unit } from '../../units/quantity';
import type { Path } from '../place';
import type { Report } from './report';

/** What volts and powers are measured against; undefined where the channel does not say, null where what it says is faulty. */
export interface Scale {
  readonly fullScaleVpp: number | null | undefined;
  readonly impedanceOhm: number | null | undefined;
}

/** 0 dBu is 1 mW into 600 Ω, √0.6 V (IEC 60268-17). */
const dbuReferenceVolts = Math.sqrt(0.6);

/** 0 dBm in watts. */
const dbmReferenceWatts = 1e-3;

/** A level in dBFS, or null with a fault where it cannot be one. */
export function levelDb(quantity: Quantity, scale: Scale, path: Path, report: Report): number | null {
  if (quantity.unit === 'dBFS') return quantity.value;
  if (scale.fullScaleVpp === null) return null;
  if (scale.fullScaleVpp === undefined) {
    return report.fault(
      path,
      'wrong-unit',
      `a level in ${quantity.unit} needs the channel's \`full-scale\`; without it levels are in dBFS`,
    );
  }
  if (quantity.unit === 'dBm' && scale.impedanceOhm === undefined) {
    return report.fault(path, 'wrong-unit', "a level in dBm needs the channel's `impedance`");
  }
  const volts = rmsVolts(quantity, scale.impedanceOhm ?? null);
  return volts === null ? null : 20 * Math.log10(volts / fullScaleRms(scale.fullScaleVpp));
}

/** The rms voltage of a sine whose peaks just reach full scale. */
export const fullScaleRms = (fullScaleVpp: number): number => fullScaleVpp / (2 * Math.SQRT2);

/** The peak-to-peak span that `full-scale` states, or null with a fault. */
export function fullScaleVpp(stated: Quantity | QuantityRange, path: Path, report: Report): number | null {
  const span = 'low' in stated ? stated.high.value - stated.low.value : peakToPeak(stated);
  if (Number.isFinite(span) && span >= leastFullScale) return span;
  return report.fault(
    path,
    'out-of-range',
    'full scale is a span of more than 0 V between two ends, such as `4 V`, `± 10 V` or `0 V .. 5 V`',
  );
}

const leastFullScale = 1e-12;

function peakToPeak({ value, unit }: Quantity): number {
  if (unit === 'Vpk') return 2 * value;
  return unit === 'Vrms' ? 2 * Math.SQRT2 * value : value;
}

function rmsVolts({ value, unit }: Quantity, impedanceOhm: number | null): number | null {
  const fromPower = () => (impedanceOhm === null ? null : Math.sqrt(impedanceOhm * dbmReferenceWatts) * 10 ** (value / 20));
  const sizes: Readonly<Partial<Record<Unit, () => number | null>>> = {
    V: () => value,
    Vrms: () => value,
    Vpk: () => value / Math.SQRT2,
    Vpp: () => value / (2 * Math.SQRT2),
    dBV: () => 10 ** (value / 20),
    dBu: () => dbuReferenceVolts * 10 ** (value / 20),
    dBm: fromPower,
  };
  return sizes[unit]?.() ?? null;
}
