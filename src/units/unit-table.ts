/** Every unit of the spec language: how it is spelled, what it measures and which prefixes it takes. */
import type { Kind, Unit } from './quantity';

/** What is known of one unit. */
export interface UnitEntry {
  readonly unit: Unit;
  /** The kinds of quantity it can express. */
  readonly kinds: readonly Kind[];
  /** Spellings that are read alike (without spaces); the first is the one we print. */
  readonly spellings: readonly string[];
  /** `all`: SI prefixes but f; `femto`: f too; `none`. */
  readonly prefixes: 'none' | 'all' | 'femto';
  /** Power of ten from the written to the stored number: −2 for %, −6 for ppm. */
  readonly power: number;
}

const entry = (
  unit: Unit,
  kinds: readonly Kind[],
  prefixes: UnitEntry['prefixes'] = 'none',
  spellings: readonly string[] = [unit],
) => ({
  unit,
  kinds,
  spellings,
  prefixes,
  power: unit === '%' ? -2 : unit === 'ppm' ? -6 : 0,
});

/** All units; the first one of a kind stands for a zero that is written without a unit. */
export const unitTable: readonly UnitEntry[] = [
  entry('Hz', ['frequency', 'sample-rate'], 'all'),
  entry('S/s', ['sample-rate'], 'all'),
  entry('s', ['time'], 'femto'),
  entry('dBFS', ['level', 'full-scale-level']),
  entry('V', ['voltage', 'level'], 'all'),
  entry('Vrms', ['voltage', 'level'], 'all', ['V rms']),
  entry('Vpk', ['voltage', 'level'], 'all', ['V pk']),
  entry('Vpp', ['voltage', 'level'], 'all', ['V pp']),
  entry('dBV', ['level']),
  entry('dBu', ['level']),
  entry('dBm', ['level']),
  entry('dBc', ['relative-level']),
  entry('dB', ['decibel', 'ratio']),
  entry('V/V', ['ratio'], 'all'),
  entry('%', ['share', 'ratio']),
  entry('ppm', ['share', 'ratio']),
  entry('V/√Hz', ['density'], 'all', ['V/√Hz', 'V/rtHz', 'V/sqrt(Hz)']),
  entry('dBFS/√Hz', ['density'], 'none', ['dBFS/√Hz', 'dBFS/Hz']),
  entry('dBm/Hz', ['density']),
  entry('dB/decade', ['slope'], 'none', ['dB/decade', 'dB/dec']),
  entry('LSB', ['code']),
  entry('Ω', ['resistance'], 'all', ['Ω', 'ohm']),
  entry('F', ['capacitance'], 'femto'),
  entry('H', ['inductance'], 'all'),
  entry('deg', ['angle']),
  entry('°C', ['temperature']),
];

/** What a kind is called in a message, and an example of how it is written. */
export const kindProse: Readonly<Record<Kind, { readonly called: string; readonly example: string }>> = {
  frequency: { called: 'a frequency', example: '20 kHz' },
  'sample-rate': { called: 'a rate', example: '48 kHz' },
  time: { called: 'a time', example: '300 ns' },
  voltage: { called: 'a voltage', example: '2.5 V' },
  level: { called: 'a level', example: '-3 dBFS' },
  'full-scale-level': { called: 'a level', example: '-96 dBFS' },
  'relative-level': { called: 'a level', example: '-60 dBc' },
  decibel: { called: 'a ratio', example: '0.5 dB' },
  ratio: { called: 'a ratio', example: '0.5 dB' },
  share: { called: 'a percentage', example: '5 %' },
  density: { called: 'a noise density', example: '40 nV/√Hz' },
  slope: { called: 'a slope', example: '-20 dB/decade' },
  code: { called: 'a value in LSB', example: '0.5 LSB' },
  resistance: { called: 'a resistance', example: '4.7 kΩ' },
  capacitance: { called: 'a capacitance', example: '2.2 nF' },
  inductance: { called: 'an inductance', example: '10 µH' },
  angle: { called: 'an angle', example: '45 deg' },
  temperature: { called: 'a temperature', example: '25 °C' },
};

/** The units that can express any of these kinds. */
export function unitsOf(kinds: readonly Kind[]): readonly UnitEntry[] {
  return unitTable.filter((known) => known.kinds.some((kind) => kinds.includes(kind)));
}

/** The entry of a unit. */
export function entryOf(unit: Unit): UnitEntry {
  const found = unitTable.find((known) => known.unit === unit);
  if (found === undefined) throw new RangeError(`no such unit: ${unit}`);
  return found;
}
