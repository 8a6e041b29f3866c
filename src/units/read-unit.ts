/** Reads a unit with its prefix, and names slips of spelling for what they were meant to be. */
import { prefixPowers } from './prefixes';
import type { Kind, Unit } from './quantity';
import { unitsOf, unitTable } from './unit-table';
import type { UnitEntry } from './unit-table';

/** A unit that has been recognised. */
export interface UnitRead {
  readonly unit: Unit;
  readonly kinds: readonly Kind[];
  /** Power of ten from the written number to the base unit. */
  readonly power: number;
}

/** The unit that a text spells, of whatever kind, or null. Spaces inside do not count. */
export function readUnit(text: string): UnitRead | null {
  return unitsBySpelling.get(text) ?? unitsBySpelling.get(tighten(text)) ?? null;
}

/** Spellings of units of these kinds that the text may have been meant as, likeliest first; empty where nothing is near. */
export function meantUnits(text: string, kinds: readonly Kind[]): readonly string[] {
  const tight = tighten(text).toLowerCase();
  const units = unitsOf(kinds);
  const slip = Object.hasOwn(slips, tight) ? slips[tight] : undefined;
  const found = allSpellings(units).filter(
    (spelling) => tighten(spelling).toLowerCase() === (slip ?? tight).replace(/ /g, '').toLowerCase(),
  );
  return [...new Set(found)];
}

function tighten(text: string): string {
  return text.replace(/ /g, '');
}

// Every unit with every prefix it takes, without spaces. No spelling stands for two of them; a test holds that.
const unitsBySpelling: ReadonlyMap<string, UnitRead> = new Map(
  Object.entries(prefixPowers).flatMap(([prefix, power]) =>
    unitTable
      .filter((known) => takes(known, prefix))
      .flatMap((known) =>
        known.spellings.map((spelling): [string, UnitRead] => [
          prefix + tighten(spelling),
          { unit: known.unit, kinds: known.kinds, power: power + known.power },
        ]),
      ),
  ),
);

function takes(known: UnitEntry, prefix: string): boolean {
  if (prefix === '') return true;
  if (known.prefixes === 'none' || !Object.hasOwn(prefixPowers, prefix)) return false;
  return prefix !== 'f' || known.prefixes === 'femto';
}

// Large prefixes come first: of `mhz`, MHz is the likelier meaning.
const byLikelihood = ['', 'k', 'M', 'G', 'T', 'm', 'µ', 'n', 'p', 'f'];
const smallFirst = ['', 'm', 'µ', 'n', 'p', 'f', 'k', 'M', 'G', 'T'];

function allSpellings(units: readonly UnitEntry[]): readonly string[] {
  return units.flatMap((known) => {
    const order = known.unit === 'Hz' || known.unit === 'S/s' || known.unit === 'Ω' ? byLikelihood : smallFirst;
    return order
      .filter((prefix) => takes(known, prefix))
      .flatMap((prefix) => known.spellings.map((spelling) => prefix + spelling));
  });
}

/** What people write for a unit in other places, in lower case, and the unit it stands for here. */
const slips: Readonly<Record<string, string>> = {
  hertz: 'Hz',
  sps: 'S/s',
  ksps: 'kS/s',
  msps: 'MS/s',
  gsps: 'GS/s',
  'samples/s': 'S/s',
  sec: 's',
  second: 's',
  seconds: 's',
  msec: 'ms',
  usec: 'µs',
  µsec: 'µs',
  nsec: 'ns',
  volt: 'V',
  volts: 'V',
  vp: 'V pk',
  vpeak: 'V pk',
  'vp-p': 'V pp',
  'mvp-p': 'mV pp',
  vpkpk: 'V pp',
  ohms: 'Ω',
  kohms: 'kΩ',
  mohms: 'MΩ',
  r: 'Ω',
  farad: 'F',
  henry: 'H',
  percent: '%',
  pct: '%',
  dbfs: 'dBFS',
  c: '°C',
  degc: '°C',
  '°': 'deg',
  degrees: 'deg',
  'v/hz^0.5': 'V/√Hz',
  'nv/hz^0.5': 'nV/√Hz',
  'v/√(hz)': 'V/√Hz',
  'nv/√(hz)': 'nV/√Hz',
  'nv/sqrthz': 'nV/√Hz',
};
