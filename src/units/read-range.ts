/** Reads `LOW .. HIGH` with ends left out or a shared unit, and `centre ± half-width`. */
import { notAQuantity } from './fault';
import type { QuantityFault } from './fault';
import { numberAhead } from './number-text';
import { oneSpelling } from './one-spelling';
import type { Kind, Quantity, QuantityRange } from './quantity';
import { readSingle } from './read-single';

/** A range, or why there is none. Whether it runs the right way round is the caller's to judge. */
export type RangeReading = { readonly range: QuantityRange } | { readonly fault: QuantityFault };

/**
 * Reads a range.
 * @param text a scalar's source text; all alike spellings are read alike
 * @param kinds the kinds of quantity that its ends may be
 */
export function readRange(text: string, kinds: readonly Kind[]): RangeReading {
  const plain = oneSpelling(text);
  const [low = '', high, ...more] = plain.split('..');
  if (high !== undefined && more.length === 0) return readEnds(low.trim(), high.trim(), kinds);
  if (high !== undefined) return { fault: notAQuantity(`\`${plain}\` has more than one \`..\``) };
  const at = plain.indexOf('±');
  if (at >= 0) return readCentred(plain.slice(0, at).trim(), plain.slice(at + 1).trim(), kinds);
  return { fault: notARange(plain, kinds) };
}

function readEnds(lowText: string, highText: string, kinds: readonly Kind[]): RangeReading {
  if (lowText === '' && highText === '') return { fault: notAQuantity('a range needs at least one of its ends') };
  const slip = thirdPoint(lowText, highText);
  if (slip !== null) return { fault: slip };
  const high = highText === '' ? null : readSingle(highText, kinds);
  if (high !== null && 'fault' in high) return { fault: inRange(high.fault, (end) => `${lowText} .. ${end}`.trim()) };
  const low = lowText === '' ? null : readSingle(withUnitOf(lowText, highText), kinds);
  if (low !== null && 'fault' in low) return { fault: inRange(low.fault, (end) => `${end} .. ${highText}`.trim()) };
  return {
    range: {
      low: low ?? { value: -Infinity, unit: (high ?? { unit: 'Hz' }).unit },
      high: high ?? { value: Infinity, unit: (low ?? { unit: 'Hz' }).unit },
    },
  };
}

/** A unit at the upper end serves both. */
function withUnitOf(lowText: string, highText: string): string {
  const low = numberAhead(lowText);
  const high = numberAhead(highText);
  return low?.rest === '' && high !== null ? lowText + high.rest : lowText;
}

function thirdPoint(lowText: string, highText: string): QuantityFault | null {
  if (!/^\.(?!\d)/.test(highText)) return null;
  return notAQuantity('a range is written with two points, not three', `${lowText} .. ${highText.slice(1).trim()}`);
}

function inRange(fault: QuantityFault, whole: (end: string) => string): QuantityFault {
  return { ...fault, suggestions: fault.suggestions.map(whole) };
}

function readCentred(centreText: string, halfText: string, kinds: readonly Kind[]): RangeReading {
  const half = readSingle(halfText, ['share', ...kinds]);
  if ('fault' in half) return { fault: inRange(half.fault, (end) => `${centreText} ± ${end}`.trim()) };
  if (centreText === '') return { range: { low: { value: 0 - half.value, unit: half.unit }, high: half } };
  const centre = readSingle(withUnitOf(centreText, halfText), kinds);
  if ('fault' in centre) return { fault: inRange(centre.fault, (end) => `${end} ± ${halfText}`) };
  const share = half.unit === '%' || half.unit === 'ppm';
  const width = share ? Math.abs(centre.value) * half.value : half.value;
  const end = (value: number): Quantity => ({ value, unit: centre.unit });
  return { range: { low: end(centre.value - width), high: end(centre.value + width) } };
}

function notARange(plain: string, kinds: readonly Kind[]): QuantityFault {
  const single = readSingle(plain, kinds);
  if (!('fault' in single)) {
    // A ratio in decibels that stands where a range is needed was meant either way.
    const eitherWay = kinds.every((kind) => kind === 'decibel') && single.value > 0 ? [`± ${plain}`] : [];
    return notAQuantity(`\`${plain}\` is one value, where a range \`LOW .. HIGH\` is needed`, ...eitherWay);
  }
  const ends = /^(.*\d.*?) *(?:[-–]| to ) *(\.?\d.*)$/.exec(plain);
  if (ends === null) return single.fault;
  return notAQuantity(`\`${plain}\` is no range: two points stand between its ends`, `${ends[1] ?? ''} .. ${ends[2] ?? ''}`);
}
