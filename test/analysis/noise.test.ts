/** Noise and signal-to-noise ratio against closed forms; jitter behind holds against values simulated elsewhere, named beside each. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import type { Channel, Pulse } from '../../src/spec/channel';
import {
  anything,
  band,
  butterworthForm,
  capture,
  generate,
  limit,
  plusMinus,
  rate,
  rectangleShare,
  stage,
  tone,
  wanted,
} from '../support/channel-builder';
import { plainHold } from '../support/plain-pulse';
import { assertWithin } from '../support/tolerance';

const db = (power: number): number => 10 * Math.log10(power);

function audio(parts: Partial<Channel>): Channel {
  return capture({ wanted: [wanted(0, 20e3)], rate: rate(96e3), ...parts });
}

describe('noise of a capture channel', () => {
  it('is that of its bits, in the share of half the rate that the band takes', () => {
    // 16 bits: 98.0905 dB (W. R. Bennett, 1948: 20·N·log10 2 + 10·log10 1.5).
    const { noise, snr } = analyse(audio({ bits: 16 }));
    assertWithin(noise.quantisation ?? NaN, -98.0905 + db(20 / 48), 1e-4);
    assertWithin(snr ?? NaN, 98.0905 - db(20 / 48), 1e-4);
  });

  it('does not fall with the signal where it is quantisation, and does where it is jitter', () => {
    const quiet = (levelDb: number): Channel =>
      audio({ testTone: { frequencyHz: 10e3, levelDb }, bits: 16, jitterSeconds: 1e-9 });
    const [loud, soft] = [analyse(quiet(0)).noise, analyse(quiet(-20)).noise];
    assertWithin((loud.quantisation ?? NaN) - (soft.quantisation ?? NaN), 0, 1e-9);
    assertWithin((loud.jitter ?? NaN) - (soft.jitter ?? NaN), 20, 1e-9);
  });

  it('from jitter takes the input frequency, also of a band sampled below twice its frequency', () => {
    // 100 MHz and 100 fs rms: 84.0364 dB (common practice, −20·log10 2πfσ; exact for a Gaussian 84.036403).
    const channel = capture({
      wanted: [wanted(96e6, 104e6)],
      rate: rate(61.44e6, { clockJitterSeconds: 60e-15 }),
      jitterSeconds: 80e-15,
      testTone: { frequencyHz: 100e6, levelDb: 0 },
    });
    assertWithin(analyse(channel).snr ?? NaN, 84.0364 - db(8 / 30.72), 1e-4);
  });

  it('gives effective bits at the tone and referred to full scale', () => {
    // 12 bits and −12 dBFS over the whole half rate: 10.007 and 12.000 bits (closed form).
    const figures = analyse(
      capture({ wanted: [wanted(0, 48e3)], rate: rate(96e3), bits: 12, testTone: { frequencyHz: 1e3, levelDb: -12 } }),
    );
    assertWithin(figures.enob ?? NaN, 12 - 12 / (20 * Math.log10(2)), 1e-9);
    assertWithin(figures.enobFullScale ?? NaN, 12, 1e-9);
    assert.equal(figures.sinad, figures.snr);
  });

  it('is given in volts where full scale is', () => {
    const { noise } = analyse(audio({ bits: 16, fullScaleVpp: 4 }));
    assertWithin(noise.volts ?? NaN, (4 / 2 / Math.SQRT2) * 10 ** ((noise.total ?? NaN) / 20), 1e-15);
    assert.equal(analyse(audio({ bits: 16 })).noise.volts, null);
  });

  it('is null where there is none', () => {
    const { noise, snr, enob } = analyse(audio({}));
    assert.deepEqual(
      [noise.quantisation, noise.jitter, noise.jitterUnwanted, noise.total, snr, enob],
      [null, null, null, null, null, null],
    );
  });

  it('grows against the tone where the path lets less of it through', () => {
    const stages = [
      stage(butterworthForm(1, 20e3), { label: 'filter', cornerTolerance: plusMinus(0.1), gainTolerance: plusMinus(0.02) }),
    ];
    const [snr] = analyse(audio({ bits: 16, stages, limits: [limit('snr', 80)] })).limits;
    const at = (corner: number, gain: number): number =>
      -db(1 + (20 / corner) ** 2) + 20 * Math.log10(gain) + 98.0905 - db(20 / 48);
    assertWithin(snr?.nominal ?? NaN, at(20, 1), 1e-4);
    assertWithin(snr?.value ?? NaN, at(18, 0.98), 1e-4);
    assert.deepEqual(snr?.worstAt, { 'filter, corner': -0.1, 'filter, gain': -0.02 });
  });

  it('of unwanted tones by jitter is listed apart, and counts only where it is asked for', () => {
    const sources = [tone(300e3, -20), anything()];
    const channel = audio({
      jitterSeconds: 1e-9,
      unwanted: sources,
      testTone: { frequencyHz: 1e3, levelDb: 0 },
      limits: [limit('snr', 10)],
    });
    const { noise, limits } = analyse(channel);
    const own = 20 * Math.log10(2 * Math.PI * 1e3 * 1e-9) + db(20 / 48);
    const other = -20 + 20 * Math.log10(2 * Math.PI * 300e3 * 1e-9) + db(20 / 48);
    assertWithin(noise.jitterUnwanted ?? NaN, other, 1e-6);
    assertWithin(limits[0]?.value ?? NaN, -own, 1e-6);
    const counted = analyse({ ...channel, unwanted: [tone(300e3, -20)], limits: [limit('snr', 10, { withUnwanted: true })] });
    // 300 kHz lands on 12 kHz, in the band, so its own level counts as well.
    assertWithin(counted.limits[0]?.value ?? NaN, -db(10 ** (own / 10) + 10 ** (other / 10) + 10 ** -2), 1e-6);
  });

  it('of an unwanted band by jitter counts at worst where it changes fastest', () => {
    const channel = audio({
      jitterSeconds: 1e-9,
      testTone: { frequencyHz: 1e3, levelDb: 0 },
      wanted: [wanted(0, 1e3)],
      unwanted: [band(40e3, 45e3, -3)],
      limits: [limit('snr', 10, { withUnwanted: true })],
    });
    const share = db(1 / 48);
    const own = 20 * Math.log10(2 * Math.PI * 1e3 * 1e-9) + share;
    const other = -3 + 20 * Math.log10(2 * Math.PI * 45e3 * 1e-9) + share;
    const [snr] = analyse(channel).limits;
    assertWithin(snr?.value ?? NaN, -db(10 ** (own / 10) + 10 ** (other / 10)), 1e-3);
    assertWithin(snr?.nominal ?? NaN, -own, 1e-6);
  });

  it('counts in the wanted band that the test tone stands in', () => {
    const two = capture({
      wanted: [wanted(0, 1e3), wanted(5e3, 9e3)],
      rate: rate(48e3),
      bits: 16,
      testTone: { frequencyHz: 500, levelDb: 0 },
    });
    assertWithin(analyse(two).noise.quantisation ?? NaN, -98.0905 + db(1 / 24), 1e-4);
  });
});

describe('noise of a generate channel', () => {
  const hz = 1e6;
  /** Jitter of 1e−3 periods, counted over one whole zone against the tone's own copy there. */
  function jittered(zone: number, tonePeriods: number, pulse: Pulse): number | null {
    const channel = generate({
      wanted: [wanted(((zone - 1) * hz) / 2, (zone * hz) / 2)],
      rate: rate(hz),
      pulse,
      jitterSeconds: 1e-3 / hz,
      testTone: { frequencyHz: tonePeriods * hz, levelDb: -6 },
      referenceHz: tonePeriods * hz,
    });
    return analyse(channel).snr;
  }

  it('from jitter of a zero-order hold is 20·log10(2π·f_out·σ) below the tone in every zone', () => {
    // Simulated edge by edge: 58.01580, 45.97460 and 42.45278 dB in zones 1 to 3 for a tone of 0.2 times the rate.
    assertWithin(jittered(1, 0.2, rectangleShare(1)) ?? NaN, 58.0158, 1e-4);
    assertWithin(jittered(2, 0.8, rectangleShare(1)) ?? NaN, 45.9746, 1e-4);
    assertWithin(jittered(3, 1.2, rectangleShare(1)) ?? NaN, 42.45278, 1e-4);
  });

  it('from jitter of a narrower rectangle does not fall with frequency', () => {
    // Simulated edge by edge: 50.82575 and 44.91275 dB for 50 % and 25 %, 48.54903 dB for 50 % in zone 2.
    assertWithin(jittered(1, 0.2, rectangleShare(0.5)) ?? NaN, 50.82575, 1e-4);
    assertWithin(jittered(1, 0.2, rectangleShare(0.25)) ?? NaN, 44.91275, 1e-4);
    assertWithin(jittered(2, 0.8, rectangleShare(0.5)) ?? NaN, 48.54903, 1e-4);
  });

  it('from jitter of a split hold counts its middle edge, and adds the steps of two pulses that share one', () => {
    // Simulated edge by edge: 49.86147 dB for a full-width split and a tone of 0.3 times the rate that is wanted in zone 2.
    const full: Pulse = { shape: 'split', width: { share: 1 } };
    assertWithin(jittered(2, 0.7, full) ?? NaN, 49.86147, 1e-4);
    // 6X² where no edge is shared, against the tone's own copy of sin²(πz)/(πz), z = f·w/2.
    const narrow: Pulse = { shape: 'split', width: { share: 0.6 } };
    const gain = 0.6 * (Math.sin(Math.PI * 0.7 * 0.3) ** 2 / (Math.PI * 0.7 * 0.3));
    assertWithin(jittered(2, 0.7, narrow) ?? NaN, db(gain ** 2 / (6 * 1e-6)), 1e-4);
  });

  it('from jitter of a hold without steps is that of the whole pulse moving', () => {
    // Simulated: 55.43749 dB for a raised cosine of one period, a tone of 0.2 times the rate and noise over 0 .. half the rate.
    assertWithin(jittered(1, 0.2, { shape: 'raised-cosine', width: { share: 1 }, edge: { share: 0.5 } }) ?? NaN, 55.43749, 1e-4);
  });

  it('from jitter of an exponential hold counts the step at its start and what is left of it at its end', () => {
    const decayed = Math.exp(-2);
    const pulse: Pulse = { shape: 'exponential', width: { share: 0.5 }, decay: { share: 0.25 } };
    const gain = plainHold(pulse, 1, 0.2);
    assertWithin(jittered(1, 0.2, pulse) ?? NaN, db(gain ** 2 / ((1 + decayed ** 2) * 1e-6)), 1e-4);
  });

  it('from quantisation is shaped by the hold at the output frequency', () => {
    // ∫ sinc² over 0 … 1/2 is 0.3869 of the rate (numerical, 2e−4), so 0.7738 of an even spread.
    const { noise } = analyse(generate({ wanted: [wanted(0, 24e3)], rate: rate(48e3), bits: 16 }));
    let integral = 0;
    for (let index = 0; index < 20_000; index++) integral += (Math.sin(Math.PI * x(index)) / (Math.PI * x(index))) ** 2 / 40_000;
    assertWithin(noise.quantisation ?? NaN, -98.0905 + db(2 * integral), 2e-4);
    function x(index: number): number {
      return (index + 0.5) / 40_000;
    }
  });

  it('moves against the tone with the corner, and not with the gain', () => {
    const loose = { label: 'filter', cornerTolerance: plusMinus(0.1), gainTolerance: plusMinus(0.1) };
    const channel = generate({
      wanted: [wanted(0, 20e3)],
      rate: rate(96e3),
      bits: 16,
      stages: [stage(butterworthForm(4, 24e3), loose)],
      limits: [limit('snr', 80)],
    });
    const at = (corner: number): number => {
      const moved = { ...channel, stages: [stage(butterworthForm(4, corner))] };
      return analyse(moved).limits[0]?.value ?? NaN;
    };
    const [snr] = analyse(channel).limits;
    assertWithin(snr?.value ?? NaN, at(24e3 * 0.9), 1e-6);
    assertWithin(snr?.nominal ?? NaN, at(24e3), 1e-6);
    assert.deepEqual(snr?.worstAt, { 'filter, corner': -0.1 });
  });
});
