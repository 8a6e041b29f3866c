/** What a source sends: itself, its harmonics, the lines of its table or the envelope over it, each with its level and where it may stand. */
import { envelopeResponse } from '../signal/envelope';
import type { Enclosure, Response } from '../signal/response';
import type { Harmonics, Source, SpectrumPoint } from '../spec/channel';
import { decibelsPerNeper } from './decibels';
import { toneRange, varies } from './tolerances';

/** One tone of a source, which stands still or may stand anywhere in a range. */
export interface Arrival {
  /** 1 for the source itself. */
  readonly harmonic: number;
  /** Every frequency at which it may stand. */
  readonly range: Enclosure;
  /** Where it stands when nothing deviates; null for what may stand anywhere in its range. */
  readonly stillHz: number | null;
  /** Where its source states it, dBFS; the highest of an envelope. */
  readonly levelDb: number;
  /** How far the level lies below that over frequency; null where it is the same everywhere. */
  readonly envelope: Response | null;
}

/** Everything that a source sends, harmonics and rows in rising order. */
export function arrivalsOf(source: Source): readonly Arrival[] {
  switch (source.kind) {
    case 'tone':
      return withHarmonics(source, toneRange(source), source.frequencyHz);
    case 'band':
      return withHarmonics(source, { low: source.lowHz, high: source.highHz }, null);
    case 'anything':
      return [arrival({ low: 0, high: Infinity }, source.levelDb)];
    case 'spectrum':
      return source.lines ? source.points.map(lineArrival) : [envelopeArrival(source.points, source.levelDb)];
  }
}

/** An arrival's level at a frequency at which it may stand, dBFS. */
export function arrivalDb({ levelDb, envelope }: Arrival, frequencyHz: number): number {
  return envelope === null ? levelDb : levelDb + decibelsPerNeper * envelope.logGain(frequencyHz);
}

/** The same with nothing deviating: what stands still does so where it is stated. */
export function nominalArrivals(source: Source): readonly Arrival[] {
  const arrivals = arrivalsOf(source);
  if (!mayMove(source)) return arrivals;
  return arrivals.map((one) => (one.stillHz === null ? one : { ...one, range: { low: one.stillHz, high: one.stillHz } }));
}

/** Whether a tone of the source may stand elsewhere than where it is stated. */
export function mayMove(source: Source): boolean {
  return source.kind === 'tone' && varies(source.tolerance);
}

/** Whether every tone of the source stands still, whatever deviates. */
export function standsStill(source: Source): boolean {
  return (source.kind === 'tone' && !varies(source.tolerance)) || (source.kind === 'spectrum' && source.lines);
}

function arrival(range: Enclosure, levelDb: number): Arrival {
  return { harmonic: 1, range, stillHz: null, levelDb, envelope: null };
}

/** Harmonic m stands at m times the frequency, `slope`·log10(m) from the level of the first. */
function withHarmonics(
  source: { readonly levelDb: number; readonly harmonics: Harmonics | null },
  range: Enclosure,
  stillHz: number | null,
): readonly Arrival[] {
  return harmonicNumbers(source.harmonics).map((harmonic) => ({
    harmonic,
    range: { low: harmonic * range.low, high: harmonic * range.high },
    stillHz: stillHz === null ? null : harmonic * stillHz,
    levelDb: source.levelDb + (source.harmonics?.slopeDbPerDecade ?? 0) * Math.log10(harmonic),
    envelope: null,
  }));
}

function harmonicNumbers(harmonics: Harmonics | null): readonly number[] {
  if (harmonics === null) return [1];
  const step = harmonics.odd ? 2 : 1;
  return Array.from({ length: Math.floor((harmonics.to - 1) / step) + 1 }, (_, index) => 1 + index * step);
}

function lineArrival({ frequencyHz, levelDb }: SpectrumPoint): Arrival {
  return { ...arrival({ low: frequencyHz, high: frequencyHz }, levelDb), stillHz: frequencyHz };
}

function envelopeArrival(points: readonly SpectrumPoint[], levelDb: number): Arrival {
  const frequenciesHz = points.map((point) => point.frequencyHz);
  const envelope = envelopeResponse(
    frequenciesHz,
    points.map((point) => (point.levelDb - levelDb) / decibelsPerNeper),
  );
  return { ...arrival({ low: frequenciesHz[0] ?? 0, high: frequenciesHz.at(-1) ?? 0 }, levelDb), envelope };
}
