/** The magnitude of a measured table as a response, with exact bounds from an index of extremes. */
import { RangeExtremes } from '../range-extremes';
import type { Enclosure, Response } from '../response';
import { countUpTo, type GainTable } from './gain-table';

/** ln of an amplitude ratio in one dB. */
const nepersPerDb = Math.LN10 / 20;

/** Bounds are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/**
 * The gain of a table: straight in dB over frequency between two points; below the first its gain, beyond the last its gain falling (or
 * rising) by the slope over the logarithm of frequency.
 *
 * Bounds over an interval are the gains at its ends and at the points inside; the slope is that of the pieces it touches. Both take
 * O(log n) steps.
 *
 * @param table at least two points.
 * @returns at Infinity the limit: −Infinity where it falls on, the last gain where that holds.
 * @throws RangeError for fewer than two points, lists of different lengths, or frequencies that do not rise.
 * Source: elementary; the index is a segment tree, common practice.
 * @example tableResponse({ frequenciesHz: [0, 100], gainsDb: [0, -20], phasesRad: null, beyondDbPerDecade: 0 }).logGain(50) // -1.15129255
 */
export function tableResponse(table: GainTable): Response {
  const { frequenciesHz, gainsDb } = table;
  if (frequenciesHz.length < 2 || frequenciesHz.length !== gainsDb.length)
    throw new RangeError(
      `A table needs two points or more, not ${gainsDb.length} gains for ${frequenciesHz.length} frequencies.`,
    );
  const fault = frequenciesHz.findIndex((hz, index) => !(hz > (frequenciesHz[index - 1] ?? -1)));
  if (fault >= 0) throw new RangeError(`The frequencies of a table must rise, not to ${frequenciesHz[fault]}.`);
  return new TableResponse(table);
}

class TableResponse implements Response {
  private readonly logGains: readonly number[];
  /** Of each piece, in 1/Hz. */
  private readonly slopes: readonly number[];
  private readonly gainExtremes: RangeExtremes;
  private readonly slopeExtremes: RangeExtremes;
  private readonly lastHz: number;
  private readonly lastLog: number;
  /** d ln|H| / d ln f beyond the last point. */
  private readonly beyond: number;

  constructor(private readonly table: GainTable) {
    const { frequenciesHz, gainsDb, beyondDbPerDecade } = table;
    this.logGains = gainsDb.map((gain) => gain * nepersPerDb);
    this.slopes = frequenciesHz
      .slice(1)
      .map((hz, index) => ((this.logGains[index + 1] ?? 0) - (this.logGains[index] ?? 0)) / (hz - (frequenciesHz[index] ?? 0)));
    this.gainExtremes = new RangeExtremes(this.logGains);
    this.slopeExtremes = new RangeExtremes(this.slopes);
    this.lastHz = frequenciesHz.at(-1) ?? 0;
    this.lastLog = this.logGains.at(-1) ?? 0;
    this.beyond = beyondDbPerDecade / 20;
  }

  logGain(frequencyHz: number): number {
    if (frequencyHz > this.lastHz) {
      return this.beyond === 0 ? this.lastLog : this.lastLog + this.beyond * Math.log(frequencyHz / this.lastHz);
    }
    const index = countUpTo(this.table.frequenciesHz, frequencyHz, 'at most') - 1;
    if (index < 0) return Number.isNaN(frequencyHz) ? NaN : (this.logGains[0] ?? 0);
    return (this.logGains[index] ?? 0) + (this.slopes[index] ?? 0) * (frequencyHz - (this.table.frequenciesHz[index] ?? 0));
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    const { frequenciesHz } = this.table;
    const inside = this.gainExtremes.between(
      countUpTo(frequenciesHz, lowHz, 'at most'),
      countUpTo(frequenciesHz, highHz, 'below'),
    );
    const atLow = this.logGain(lowHz);
    const atHigh = this.logGain(highHz);
    return { low: Math.min(inside.low, atLow, atHigh) - logSlack, high: Math.max(inside.high, atLow, atHigh) + logSlack };
  }

  slope(lowHz: number, highHz: number): Enclosure {
    const { frequenciesHz } = this.table;
    const first = Math.max(0, countUpTo(frequenciesHz, lowHz, 'at most') - 1);
    const end = Math.max(countUpTo(frequenciesHz, highHz, 'below'), first + 1);
    const within = this.slopeExtremes.between(first, end);
    const outside = [
      ...(lowHz < (frequenciesHz[0] ?? 0) ? [0] : []),
      ...(highHz > this.lastHz ? [this.beyond / Math.max(lowHz, this.lastHz), this.beyond / highHz] : []),
    ];
    return { low: Math.min(within.low, ...outside), high: Math.max(within.high, ...outside) };
  }
}
