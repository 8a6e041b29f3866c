/** Hovers of bits, full scale and jitter: the size of a step, and the noise that follows. */
import { jitterNoiseDb, quantisationSnrDb } from '../../analysis';
import { formatDb, formatTime, formatVoltage } from '../../units/format';
import { knownRows, type Answer } from './answer';
import type { Subject } from './subject';

/** The converter's step and quantisation noise, or null where bits are not known. */
export function bitsHover({ channel, figures }: Subject): Answer | null {
  const { bits, fullScaleVpp } = channel;
  if (bits === null) return fullScaleVpp === null ? null : fullScaleAnswer(fullScaleVpp);
  const snrDb = quantisationSnrDb(bits);
  const densityDb = -snrDb - 10 * Math.log10(figures.halfRate);
  const step = fullScaleVpp === null ? null : fullScaleVpp / 2 ** bits;
  return {
    headline: step === null ? `${bits} bits: ${formatDb(snrDb)} for a full-scale sine` : `One LSB is ${formatVoltage(step)}`,
    rows: knownRows(
      ['full scale', fullScaleVpp === null ? null : formatVoltage(fullScaleVpp, 'V pp')],
      ['0 dBFS', fullScaleVpp === null ? null : formatVoltage(rmsOf(fullScaleVpp), 'V rms')],
      ['full-scale sine to noise', formatDb(snrDb)],
      ['density up to half the rate', formatDb(densityDb, 'dBFS/√Hz')],
      ['in the wanted band', figures.noise.quantisation === null ? null : formatDb(figures.noise.quantisation, 'dBFS')],
      ['share of all noise', shareOf(figures.noise.quantisation, figures.noise.total)],
    ),
    formula: 'Quantisation noise: 6.02·N + 1.76 dB below a full-scale sine, spread evenly up to half the rate',
  };
}

function fullScaleAnswer(fullScaleVpp: number): Answer {
  return {
    headline: `0 dBFS is ${formatVoltage(rmsOf(fullScaleVpp), 'V rms')}`,
    rows: [['full scale', formatVoltage(fullScaleVpp, 'V pp')]],
    formula: null,
  };
}

/** The rms value of a sine that just fills the full scale. */
function rmsOf(fullScaleVpp: number): number {
  return fullScaleVpp / (2 * Math.SQRT2);
}

/** The jitter of sampler and clock together, and what it does to the test tone. */
export function jitterHover({ channel, figures }: Subject): Answer | null {
  const own = channel.jitterSeconds;
  const clock = channel.rate.clock?.jitterSeconds ?? 0;
  const both = Math.hypot(own, clock);
  if (both === 0) return { headline: 'No jitter', rows: [], formula: null };
  const { frequency } = figures.testTone;
  const toneDb = -jitterNoiseDb(frequency, both);
  return {
    headline: `${formatTime(both)} rms in all: ${formatDb(toneDb)} signal to jitter noise`,
    rows: knownRows(
      ['of the sampler', formatTime(own)],
      ['of the clock', formatTime(clock)],
      ['in the wanted band', figures.noise.jitter === null ? null : formatDb(figures.noise.jitter, 'dBFS')],
      ['share of all noise', shareOf(figures.noise.jitter, figures.noise.total)],
    ),
    formula: 'Noise of jitter: 20·log10(2π·f·σ) below a tone at f',
  };
}

function shareOf(partDb: number | null, totalDb: number | null): string | null {
  if (partDb === null || totalDb === null || !Number.isFinite(totalDb)) return null;
  const percent = 100 * 10 ** ((partDb - totalDb) / 10);
  return percent < 1 ? 'under 1 %' : `${Math.round(percent)} %`;
}
