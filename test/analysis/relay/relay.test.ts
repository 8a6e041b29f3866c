/** A relay as a whole: where its levels hold, what its wanted path is, when its band lies over its own copy, and how it scales. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { analyse } from '../../../src/analysis';
import type { Channel, Gate } from '../../../src/spec/channel';
import {
  anything,
  band,
  limit,
  plusMinus,
  rate,
  rectangleShare,
  relay,
  stage,
  tone,
  wanted,
} from '../../support/channel-builder';
import { plainGainDb, plainPole, plainWeight, type PlainRelay } from '../../support/plain-relay';
import { assertClose, assertWithin } from '../../support/tolerance';

const pole = (cornerHz: number): NonNullable<Channel['stages']> => [stage({ kind: 'bandwidth', cornerHz })];
const open = (share: number): Gate => ({ kind: 'pulse', pulse: rectangleShare(share) });
const dB = (gain: number): number => 20 * Math.log10(gain);

const filters = { inputStages: pole(4e3), outputStages: pole(2e3) };
const base = { wanted: [wanted(100, 900, -6)], rate: rate(10e3), referenceHz: 300, ...filters };
const natural: PlainRelay = { rateHz: 10e3, sampling: { kind: 'natural', share: 0.3 }, inputHz: 4e3, outputHz: 2e3 };

describe('the wanted path of a relay', () => {
  it('is both filters and c₀ of a gate, which bends nothing and delays nothing', () => {
    const found = analyse(relay({ ...base, gate: open(0.3) }));
    const loss = (hz: number): number => dB(plainPole(hz, 4e3) * plainPole(hz, 2e3));
    assertWithin(found.droop ?? NaN, loss(300) - loss(900), 1e-9);
    const delay = (hz: number): number => [4e3, 2e3].reduce((sum, fc) => sum + 1 / (2 * Math.PI * fc * (1 + (hz / fc) ** 2)), 0);
    assertClose(found.delay ?? NaN, delay(300), 1e-9);
    assertWithin(found.delaySpread ?? NaN, delay(100) - delay(900), 1e-9);
  });

  it('has the droop and half the width of a hold at the output frequency', () => {
    const found = analyse(relay({ ...base, pulse: rectangleShare(0.8) }));
    const loss = (hz: number): number =>
      dB(plainPole(hz, 4e3) * plainPole(hz, 2e3)) + dB(Math.sin(0.8e-4 * Math.PI * hz) / (Math.PI * hz));
    assertWithin(found.droop ?? NaN, loss(300) - loss(900), 1e-9);
    const poles = [4e3, 2e3].reduce((sum, fc) => sum + 1 / (2 * Math.PI * fc * (1 + (300 / fc) ** 2)), 0);
    assertClose(found.delay ?? NaN, poles + 40e-6, 1e-9);
  });

  it('of a track and hold is copy 0, delayed by e²·T/2 at 0 Hz', () => {
    const found = analyse(relay({ wanted: [wanted(0, 900)], rate: rate(10e3), gate: { kind: 'track', track: { share: 0.4 } } }));
    const plain: PlainRelay = {
      rateHz: 10e3,
      sampling: { kind: 'track-and-hold', share: 0.4 },
      inputHz: Infinity,
      outputHz: Infinity,
    };
    assertWithin(found.droop ?? NaN, -dB(plainWeight(plain, 0, 900)), 1e-9);
    assertClose(found.delay ?? NaN, (0.6 ** 2 * 1e-4) / 2, 1e-9);
  });

  it('leaves at the level that the limit `level` holds it to, stated at either place', () => {
    const level = { lowDb: -60, highDb: 0, ref: null, margin: null };
    const atInput = analyse(relay({ ...base, gate: open(0.3), levelLimit: level }));
    // The nearer end of the range is the upper one: the strongest output, at 100 Hz.
    assertWithin(atInput.limits[0]?.value ?? NaN, -6 + plainGainDb(natural, 0, 100), 0.001);
    const atSampler = analyse(relay({ ...base, gate: open(0.3), levelLimit: level, levelsAt: 'sampler' }));
    assertWithin(atSampler.limits[0]?.value ?? NaN, -6 + plainGainDb(natural, 0, 100) - dB(plainPole(300, 4e3)), 0.001);
  });
});

describe('levels of a relay stated at its sampler', () => {
  const parts = {
    ...base,
    gate: open(0.3),
    unwanted: [tone(10.5e3, -30), band(19.2e3, 19.6e3, -30)],
    levelsAt: 'sampler' as const,
  };
  const inputDb = dB(plainPole(300, 4e3));

  it('are divided by the gain of the input filter at the reference, and by nothing behind it', () => {
    const { aliases, images, headroom, testTone } = analyse(relay({ ...parts, limits: [limit('image', -20, { unit: 'dBFS' })] }));
    assertWithin(aliases[0]?.level ?? NaN, -30 + plainGainDb(natural, -1, 10.5e3) - inputDb, 1e-9);
    const wantedDb = -6 + plainGainDb(natural, 0, 300) - inputDb;
    assertWithin(aliases[0]?.relative ?? NaN, -30 + plainGainDb(natural, -1, 10.5e3) - inputDb - wantedDb, 1e-9);
    const image = images.find((one) => one.copy === 2 && one.side === 'lower');
    assertWithin(image?.level ?? NaN, -6 + plainGainDb(natural, -2, image?.from ?? NaN) - inputDb, 0.001);
    assertWithin(testTone.atSampler, -6 + dB(plainPole(900, 4e3)) - inputDb, 1e-9);
    const peaks = [
      -6 + dB(plainPole(100, 4e3)) - inputDb,
      -30 + dB(plainPole(10.5e3, 4e3)) - inputDb,
      -30 + dB(plainPole(19.2e3, 4e3)) - inputDb,
    ];
    assertWithin(headroom ?? NaN, -dB(peaks.reduce((sum, level) => sum + 10 ** (level / 20), 0)), 0.001);
  });

  it('give the same ratio in dBc as levels stated at the input', () => {
    const limits = [limit('alias', -20, { unit: 'dBc' })];
    const at = (levelsAt: Channel['levelsAt']): number => analyse(relay({ ...parts, levelsAt, limits })).limits[0]?.value ?? NaN;
    // Stated at the sampler, source and wanted tone are divided by the same gain.
    assertWithin(at('sampler'), at('input'), 1e-9);
  });
});

describe('sources of a relay', () => {
  it('count with every harmonic, each in its own copy, and added as powers where the limit holds the sum', () => {
    const source = { ...tone(3.5e3, -20), harmonics: { to: 9, slopeDbPerDecade: -20, odd: false } } as const;
    const limits = [limit('alias', -40, { sum: true })];
    const found = analyse(relay({ ...base, gate: open(0.3), unwanted: [source], limits }));
    // In 100 .. 900 Hz only harmonic 3 (10.5 kHz, copy −1) and harmonic 6 (21 kHz) come near; 21 kHz leaves at 1 kHz, outside.
    const third = -20 - 20 * Math.log10(3) + plainGainDb(natural, -1, 10.5e3);
    const others = [1, 2, 4, 5, 6, 7, 8, 9].flatMap((m) =>
      [-4, -3, -2, -1].flatMap((k) => {
        const out = Math.abs(m * 3.5e3 + k * 10e3);
        return out >= 100 && out <= 900 ? [-20 - 20 * Math.log10(m) + plainGainDb(natural, k, m * 3.5e3)] : [];
      }),
    );
    const sum = 10 * Math.log10([third, ...others].reduce((power, level) => power + 10 ** (level / 10), 0));
    assert.equal(found.alias?.harmonic, 3);
    assertWithin(found.alias.level ?? NaN, third, 1e-9);
    assertWithin(found.limits[0]?.value ?? NaN, sum, 1e-9);
    assertWithin(found.aliasSum ?? NaN, sum, 1e-9);
  });

  it('pass only what stands behind where they enter', () => {
    const at = (enters: 'input' | 'sampler'): number =>
      analyse(relay({ ...base, gate: open(0.3), unwanted: [{ ...tone(10.5e3, -30), enters }] })).aliases[0]?.level ?? NaN;
    assertWithin(at('input'), -30 + plainGainDb(natural, -1, 10.5e3), 1e-9);
    assertWithin(at('sampler') - at('input'), -dB(plainPole(10.5e3, 4e3)), 1e-9);
  });
});

describe('the wanted band of a relay', () => {
  it('stays where it is, and must not lie over its own copies', () => {
    const faults = (low: number, high: number): readonly string[] =>
      analyse(relay({ wanted: [wanted(low, high)], rate: rate(10e3), gate: open(0.3) })).faults.map(({ kind }) => kind);
    assert.deepEqual(faults(100, 4.9e3), []);
    assert.deepEqual(faults(100, 5e3), ['wanted-touches']);
    assert.deepEqual(faults(100, 5.1e3), ['wanted-folds']);
    assert.deepEqual(faults(6e3, 9e3), []);
    const [figure] = analyse(relay({ wanted: [wanted(6e3, 9e3)], rate: rate(10e3), gate: open(0.3) })).wanted;
    assert.equal(figure?.appearsLow, 6e3);
    assert.equal(figure.appearsHigh, 9e3);
  });

  it('above half the rate is protected where it is, copies of 0 Hz and of itself included', () => {
    const zone2 = { ...base, wanted: [wanted(6e3, 9e3, 0)], referenceHz: 7e3, gate: open(0.3) };
    const found = analyse(relay({ ...zone2, unwanted: [tone(2e3, -30), tone(500, -30)] }));
    // 2 kHz leaves at 8 kHz by copy −1, 500 Hz nowhere between 6 and 9 kHz.
    assertWithin(found.aliases[0]?.level ?? NaN, -30 + plainGainDb(natural, -1, 2e3), 1e-9);
    assert.equal(found.aliases[0]?.lands, 8e3);
    assert.equal(found.aliases[1]?.level, null);
    assert.deepEqual(found.protected, [{ low: 6e3, high: 9e3 }]);
  });
});

describe('a clock that varies', () => {
  it('moves copies, but not what leaves where it arrives: what stands beside the wanted band is no alias', () => {
    const alias = (tolerance: number): number =>
      analyse(
        relay({ ...base, gate: open(0.3), rate: rate(10e3, { tolerance: plusMinus(tolerance) }), unwanted: [anything(-10)] }),
      ).alias?.level ?? NaN;
    assert.ok(alias(1e-4) >= alias(0) - 1e-9);
    assertWithin(alias(1e-4), alias(0), 0.01);
    // Beside the band the same tone would leave more than 5 dB stronger.
    assert.ok(-10 + plainGainDb(natural, 0, 901) > alias(1e-4) + 5);
  });

  it('leaves an output mask that begins at the wanted band to what is not wanted', () => {
    const segment = {
      lowHz: 900,
      highHz: 4e3,
      sense: 'below',
      lower: null,
      upper: { fromDb: -20, toDb: -20 },
      along: 'linear',
    } as const;
    const masks = [{ key: 'output', mask: null, segments: [segment], ref: null, margin: null }] as const;
    const varying = rate(10e3, { tolerance: plusMinus(1e-3) });
    const nothing = analyse(relay({ ...base, gate: open(0.3), rate: varying, masks }));
    assert.equal(nothing.masks[0]?.value, -Infinity);
    const beside = analyse(relay({ ...base, gate: open(0.3), rate: varying, masks, unwanted: [tone(1e3, -30)] }));
    assertWithin(beside.masks[0]?.value ?? NaN, -30 + plainGainDb(natural, 0, 1e3), 0.02);
    assert.deepEqual(beside.masks[0]?.from?.source, 'tone at 1000 Hz');
  });
});

describe('scaling every frequency of a relay', () => {
  it('scales its frequencies and delays, and leaves its levels as they are', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(1e-3, 0.37, 12, 1e5),
        fc.double({ min: 0.1, max: 0.9, noNaN: true }),
        fc.boolean(),
        (scale, share, tracks) => {
          const at = (s: number) =>
            analyse(
              relay({
                wanted: [wanted(100 * s, 900 * s, -6)],
                rate: rate(10e3 * s, { tolerance: plusMinus(1e-4) }),
                referenceHz: 300 * s,
                inputStages: [stage({ kind: 'bandwidth', cornerHz: 4e3 * s }, { cornerTolerance: plusMinus(0.05) })],
                outputStages: pole(2e3 * s),
                gate: tracks ? { kind: 'track', track: { share } } : open(share),
                unwanted: [band(5e3 * s, 300e3 * s, -30)],
                jitterSeconds: 1e-7 / s,
                limits: [limit('alias', -60), limit('image', -40), limit('snr', 40)],
              }),
            );
          const [one, other] = [at(1), at(scale)];
          one.limits.forEach((figure, index) => {
            assertWithin(other.limits[index]?.value ?? NaN, figure.value ?? NaN, 0.0021, figure.limit);
          });
          assertClose(other.delay ?? NaN, (one.delay ?? NaN) / scale, 1e-9);
          assertWithin(other.droop ?? NaN, one.droop ?? NaN, 1e-9);
          one.copyWeights?.forEach((weight, k) => {
            assertWithin(other.copyWeights?.[k] ?? NaN, weight, 1e-9);
          });
        },
      ),
      { seed: 3, numRuns: 25 },
    );
  });
});
