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
  const tight = tighten(text);
  for (const known of unitTable) {
    const power = powerIn(known, tight);
    if (power !== null) return { unit: known.unit, kinds: known.kinds, power };
  }
  return null;
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

const tighten = (text: string) => text.replace(/ /g, '');

function powerIn(known: UnitEntry, tight: string): number | null {
  for (const spelling of known.spellings.map(tighten)) {
    if (!tight.endsWith(spelling)) continue;
    const prefix = tight.slice(0, tight.length - spelling.length);
    if (takes(known, prefix)) return (prefixPowers[prefix] ?? 0) + known.power;
  }
  return null;
}

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
