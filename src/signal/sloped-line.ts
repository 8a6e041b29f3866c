/** A bound that is straight in dB over frequency or over its logarithm: what a mask's segment draws. */
import type { Response } from './response';

/** Where a line runs from and to. */
export interface SlopedLine {
  /** ≥ 0; above 0 along the logarithm. */
  readonly lowHz: number;
  /** > low, finite. */
  readonly highHz: number;
  /** ln of the gain at the lower end. */
  readonly fromLog: number;
  /** ln of the gain at the upper end. */
  readonly toLog: number;
  readonly along: 'linear' | 'log';
}

/**
 * The line as a response; outside its ends it stays as it is there.
 *
 * @param line in Hz and nepers.
 * Source: elementary; it is monotone, so bounds are its ends.
 * @example slopedLine({ lowHz: 100, highHz: 10000, fromLog: 0, toLog: -2, along: 'log' }).logGain(1000) // -1
 */
export function slopedLine(line: SlopedLine): Response {
  const { lowHz, highHz, fromLog, toLog, along } = line;
  const checked = along === 'log' ? lowHz > 0 : lowHz >= 0;
  if (!checked || !(highHz > lowHz && highHz < Infinity))
    throw new RangeError(`A line cannot slope from ${lowHz} to ${highHz} Hz.`);
  const rise = (toLog - fromLog) / (along === 'log' ? Math.log(highHz / lowHz) : highHz - lowHz);
  const at = (frequencyHz: number): number => {
    if (frequencyHz <= lowHz) return fromLog;
    if (frequencyHz >= highHz) return toLog;
    return fromLog + rise * (along === 'log' ? Math.log(frequencyHz / lowHz) : frequencyHz - lowHz);
  };
  return {
    logGain: at,
    bounds: (low, high) => ({ low: Math.min(at(low), at(high)), high: Math.max(at(low), at(high)) }),
    slope: (low, high) => {
      const steepest = along === 'log' ? rise / Math.max(low, lowHz) : rise;
      const flattest = low < lowHz || high > highHz ? 0 : along === 'log' ? rise / high : rise;
      return { low: Math.min(steepest, flattest), high: Math.max(steepest, flattest) };
    },
  };
}
