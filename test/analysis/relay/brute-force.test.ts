/** Aliases, images and the output mask of relays against sums over every copy on a plain grid that shares nothing with the program. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { analyse } from '../../../src/analysis';
import type { Channel, MaskSegment, Stage } from '../../../src/spec/channel';
import {
  band,
  limit,
  plusMinus,
  rate,
  rectangleSeconds,
  rectangleShare,
  relay,
  stage,
  tone,
  wanted,
  anything,
} from '../../support/channel-builder';
import {
  plainGainDb,
  plainPole,
  plainStrongest,
  plainWeight,
  type PlainRelay,
  type PlainSampling,
} from '../../support/plain-relay';
import { assertWithin, provedGapDb } from '../../support/tolerance';

/** What the grids here may miss of a smooth maximum. */
const gridDb = 0.02;

const pole = (cornerHz: number, options: Parameters<typeof stage>[1] = {}): readonly Stage[] =>
  cornerHz === Infinity ? [] : [stage({ kind: 'bandwidth', cornerHz }, options)];

function samplingOf({ kind, share }: PlainSampling): Partial<Channel> {
  if (kind === 'flat-top') return { pulse: rectangleShare(share) };
  const gate =
    kind === 'natural' ? { kind: 'pulse' as const, pulse: rectangleShare(share) } : { kind: 'track' as const, track: { share } };
  return { pulse: { shape: 'instant' }, gate };
}

function channelOf(plain: PlainRelay, parts: Parameters<typeof relay>[0]): Channel {
  return {
    ...relay({ ...parts, inputStages: pole(plain.inputHz), outputStages: pole(plain.outputHz) }),
    ...samplingOf(plain.sampling),
  };
}

const samplings: fc.Arbitrary<PlainSampling> = fc.record({
  kind: fc.constantFrom('natural' as const, 'flat-top' as const, 'track-and-hold' as const),
  share: fc.double({ min: 0.08, max: 0.92, noNaN: true }),
});

const relays: fc.Arbitrary<PlainRelay> = fc.record({
  rateHz: fc.constant(10e3),
  sampling: samplings,
  inputHz: fc.constantFrom(1e3, 4e3, 30e3),
  outputHz: fc.constantFrom(700, 5e3, 30e3),
});

const zone = { low: 200, high: 1500 };
const copies = 40;

describe('a relay against a plain grid', () => {
  it('lands a band of drive noise at the strongest of all copies of both signs', () => {
    fc.assert(
      fc.property(
        relays,
        fc.double({ min: 1600, max: 60e3, noNaN: true }),
        fc.double({ min: 100, max: 40e3, noNaN: true }),
        (plain, low, width) => {
          const source = band(low, low + width, -20);
          const figure = analyse(channelOf(plain, { wanted: [wanted(200, 1500)], rate: rate(10e3), unwanted: [source] }))
            .aliases[0];
          const grid = plainStrongest(
            plain,
            { arrives: { low, high: low + width }, leaves: [zone], first: 0, last: copies },
            4000,
          );
          if (figure === undefined || figure.level === null) {
            assert.equal(grid, -Infinity);
            return;
          }
          assert.ok(figure.level >= -20 + grid - 1e-9, `${String(figure.level)} below the grid's ${String(grid - 20)}`);
          assertWithin(figure.level, -20 + grid, gridDb + provedGapDb, `${plain.sampling.kind}:`);
          // The place that is named gives the level that is claimed.
          const { frequency, lands, fold, inverted } = figure;
          assert.ok(frequency !== null && lands !== null && fold !== null && (figure.gap ?? 1) <= provedGapDb);
          const copy = inverted === true || frequency > lands ? -fold : fold;
          assertWithin(Math.abs(frequency + copy * 10e3), lands, 1e-6);
          assertWithin(figure.level, -20 + plainGainDb(plain, copy, frequency), provedGapDb + 1e-6);
          const wantedDb = plainGainDb(plain, 0, Math.sqrt(200 * 1500));
          assertWithin(figure.relative ?? NaN, figure.level - wantedDb, 1e-6);
        },
      ),
      { seed: 5, numRuns: 60 },
    );
  });

  it('counts k = 0 where more is protected than is wanted, and copies of 0 Hz onto the band', () => {
    const plain: PlainRelay = { rateHz: 10e3, sampling: { kind: 'natural', share: 0.3 }, inputHz: 4e3, outputHz: Infinity };
    const wide = channelOf(plain, {
      wanted: [wanted(200, 1500)],
      rate: rate(10e3),
      unwanted: [tone(2e3, -30), tone(10.5e3, -30), tone(8e3, -30), tone(23e3, -30)],
      protect: [{ lowHz: 100, highHz: 2500 }],
    });
    const found = analyse(wide).aliases;
    const expected: readonly (readonly [number, number])[] = [
      [0, 2e3],
      [-1, 10.5e3],
      [-1, 8e3],
    ];
    expected.forEach(([copy, hz], index) => {
      assertWithin(found[index]?.level ?? NaN, -30 + plainGainDb(plain, copy, hz), 1e-9);
      assert.equal(found[index]?.fold, Math.abs(copy));
    });
    assert.equal(found[3]?.level, null);
    assert.deepEqual(
      found.map((figure) => figure.inverted),
      [false, false, true, null],
    );
  });

  it('proves the worst of a source that may stand anywhere, however far out', () => {
    const plain: PlainRelay = { rateHz: 10e3, sampling: { kind: 'flat-top', share: 1 }, inputHz: 20e3, outputHz: 2e3 };
    const figure = analyse(channelOf(plain, { wanted: [wanted(0, 1500)], rate: rate(10e3), unwanted: [anything(-10)] })).alias;
    const grid = plainStrongest(
      plain,
      { arrives: { low: 8.5e3, high: 31.5e3 }, leaves: [{ low: 0, high: 1500 }], first: 1, last: 5 },
      40_000,
    );
    assertWithin(figure?.level ?? NaN, -10 + grid, gridDb);
  });

  it('reports every copy of the wanted band at its own strongest point, as a level and against the same tone', () => {
    fc.assert(
      fc.property(relays, (plain) => {
        const parts = { wanted: [wanted(200, 1500, -3)], rate: rate(10e3) };
        const levels = analyse(channelOf(plain, { ...parts, limits: [limit('image', -60, { unit: 'dBFS' })] }));
        const ratios = analyse(channelOf(plain, { ...parts, limits: [limit('image', -60)] }));
        assert.equal(levels.images.length, 16);
        for (const side of ['lower', 'upper'] as const) {
          for (let k = 1; k <= 8; k += 1) {
            const copy = side === 'upper' ? k : -k;
            const [level, ratio] = [levels, ratios].map(({ images }) =>
              images.find((image) => image.copy === k && image.side === side),
            );
            const grid = { level: -Infinity, ratio: -Infinity };
            for (let i = 0; i <= 800; i += 1) {
              const f = 200 + (1300 * i) / 800;
              const gain = plainGainDb(plain, copy, f);
              grid.level = Math.max(grid.level, -3 + gain);
              grid.ratio = Math.max(grid.ratio, gain - plainGainDb(plain, 0, f));
            }
            assertWithin(level?.level ?? NaN, grid.level, gridDb, `${plain.sampling.kind} ${side} ${String(k)}:`);
            assertWithin(ratio?.relative ?? NaN, grid.ratio, gridDb, `${plain.sampling.kind} ${side} ${String(k)} dBc:`);
            assertWithin(level?.frequency ?? NaN, Math.abs((level?.from ?? NaN) + copy * 10e3), 1e-6);
            // Both measures describe their own point whole.
            const at = ratio?.from ?? NaN;
            assertWithin(ratio?.level ?? NaN, -3 + plainGainDb(plain, copy, at), 0.002);
          }
        }
      }),
      { seed: 6, numRuns: 12 },
    );
  });

  it('gives a copy that vanishes as nothing, and the strongest of those that do not', () => {
    // A gate of half the period: every even copy is nothing, the first 2/π of the wanted path.
    const gate = { kind: 'pulse' as const, pulse: rectangleShare(0.5) };
    const { images, image } = analyse(relay({ wanted: [wanted(0, 1e3)], rate: rate(10e3), gate, limits: [limit('image', -3)] }));
    assert.equal(images.find((one) => one.copy === 2)?.relative, -Infinity);
    assert.equal(image?.copy, 1);
    assertWithin(image.relative, 20 * Math.log10(2 / Math.PI), 1e-9);
  });

  it('holds everything that leaves to the output mask, sources and images, with a bound that slopes', () => {
    const segments: readonly MaskSegment[] = [
      segment(1500, 9e3, -40, -70, 'linear'),
      segment(9e3, 60e3, -50, -80, 'log'),
      segment(60e3, Infinity, -75, -75, 'linear'),
    ];
    fc.assert(
      fc.property(relays, (plain) => {
        const channel = channelOf(plain, {
          wanted: [wanted(200, 1500, -3)],
          rate: rate(10e3),
          unwanted: [band(12e3, 15e3, -20, 'drive'), tone(3e3, -45)],
          masks: [{ key: 'output', mask: null, segments, ref: null, margin: null }],
        });
        const { masks, limits } = analyse(channel);
        assert.equal(masks.length, 3);
        segments.forEach((one, index) => {
          const arrivals = [
            { low: 200, high: 1500, levelDb: -3, first: 1 },
            { low: 12e3, high: 15e3, levelDb: -20, first: 0 },
            { low: 3e3, high: 3e3, levelDb: -45, first: 0 },
          ];
          const worst = Math.max(...arrivals.map((arrival) => plainOver(plain, arrival, one)));
          const figure = masks[index];
          assertWithin(-(figure?.margin ?? NaN), worst, gridDb, `${plain.sampling.kind} segment ${String(index)}:`);
          assertWithin((figure?.value ?? NaN) - (figure?.bound ?? NaN), worst, gridDb);
        });
        const least = Math.min(...masks.map((mask) => mask.margin));
        assert.equal(limits.find((one) => one.limit === 'output')?.margin, least);
      }),
      { seed: 8, numRuns: 10 },
    );
  });

  it('takes the ends of the tolerances of both filters and of the clock, with gates that follow it and gates that do not', () => {
    for (const gate of [rectangleShare(0.3), rectangleSeconds(30e-6)]) {
      const channel = relay({
        wanted: [wanted(200, 1500)],
        rate: rate(10e3, { tolerance: plusMinus(0.01) }),
        gate: { kind: 'pulse', pulse: gate },
        inputStages: pole(4e3, { cornerTolerance: plusMinus(0.1), label: 'input' }),
        outputStages: pole(5e3, { cornerTolerance: plusMinus(0.2), label: 'output' }),
        unwanted: [band(18.5e3, 19.5e3, -20)],
        limits: [limit('image', -30)],
      });
      const { aliases, image } = analyse(channel);
      let alias = -Infinity;
      let worstImage = -Infinity;
      for (const clock of [0.99, 0.995, 1, 1.005, 1.01]) {
        const rateHz = 10e3 * clock;
        const share = gate.shape === 'rectangle' && 'share' in gate.width ? gate.width.share : 30e-6 * rateHz;
        for (const input of [0.9, 1, 1.1]) {
          for (const output of [0.8, 1, 1.2]) {
            const plain: PlainRelay = {
              rateHz,
              sampling: { kind: 'natural', share },
              inputHz: 4e3 * input,
              outputHz: 5e3 * output,
            };
            alias = Math.max(
              alias,
              plainStrongest(plain, { arrives: { low: 18.5e3, high: 19.5e3 }, leaves: [zone], first: 0, last: 4 }, 1000),
            );
            for (let i = 0; i <= 200; i += 1) {
              const f = 200 + (1300 * i) / 200;
              for (let k = -8; k <= 8; k += 1) {
                if (k !== 0) worstImage = Math.max(worstImage, plainGainDb(plain, k, f) - plainGainDb(plain, 0, f));
              }
            }
          }
        }
      }
      // Input and output are stretched by the clock each for itself, which is at most a bound: 1 % of one pole is less than 0.1 dB.
      const found = aliases[0]?.level ?? NaN;
      assert.ok(found >= -20 + alias - gridDb && found <= -20 + alias + 0.1, `${String(found)} against ${String(alias - 20)}`);
      assertWithin(image?.relative ?? NaN, worstImage, 0.03);
      assert.equal(aliases[0]?.worstAt?.['input, corner'], 0.1);
      assert.equal(aliases[0].worstAt['output, corner'], 0.2);
      assert.ok((aliases[0].nominal ?? 0) < found);
    }
  });
});

function segment(lowHz: number, highHz: number, fromDb: number, toDb: number, along: MaskSegment['along']): MaskSegment {
  return { lowHz, highHz, sense: 'below', lower: null, upper: { fromDb, toDb }, along };
}

/** How far an arrival is above a segment's bound at most, on a grid. */
function plainOver(
  plain: PlainRelay,
  arrival: { readonly low: number; readonly high: number; readonly levelDb: number; readonly first: number },
  { lowHz, highHz, upper, along }: MaskSegment,
): number {
  let worst = -Infinity;
  for (let i = 0; i <= 1000; i += 1) {
    const f = arrival.low + ((arrival.high - arrival.low) * i) / 1000;
    for (let copy = -copies; copy <= copies; copy += 1) {
      const out = Math.abs(f + copy * plain.rateHz);
      if (Math.abs(copy) < arrival.first || out < lowHz || out > highHz) continue;
      const place =
        highHz === Infinity
          ? 0
          : along === 'log'
            ? Math.log(out / lowHz) / Math.log(highHz / lowHz)
            : (out - lowHz) / (highHz - lowHz);
      const bound = (upper?.fromDb ?? 0) + place * ((upper?.toDb ?? 0) - (upper?.fromDb ?? 0));
      const gain = plainPole(f, plain.inputHz) * plainWeight(plain, copy, f) * plainPole(out, plain.outputHz);
      worst = Math.max(worst, arrival.levelDb + 20 * Math.log10(gain) - bound);
    }
  }
  return worst;
}
