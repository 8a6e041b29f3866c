/** The output mask of generate channels: against a plain grid of every copy, with edges that meet, holds in higher zones, and tolerances. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import type { Channel, MaskSegment } from '../../src/spec/channel';
import {
  butterworthForm,
  generate,
  plusMinus,
  rate,
  rectangleSeconds,
  rectangleShare,
  stage,
  wanted,
} from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';

const segment = (
  lowHz: number,
  highHz: number,
  fromDb: number,
  toDb = fromDb,
  along: MaskSegment['along'] = 'linear',
): MaskSegment => ({
  lowHz,
  highHz,
  sense: 'below',
  lower: null,
  upper: { fromDb, toDb },
  along,
});

const masked = (channel: Channel, segments: readonly MaskSegment[]): Channel => ({
  ...channel,
  masks: [{ key: 'output', mask: null, segments, ref: null, margin: null }],
});

/** A third-order Butterworth and a rectangular hold of some width, in dB. */
function plainDb(f: number, { rateHz, cornerHz, width }: { rateHz: number; cornerHz: number; width: number }): number {
  const x = Math.PI * f * width;
  return 20 * Math.log10(width * rateHz * Math.abs(Math.sin(x) / x)) - 10 * Math.log10(1 + (f / cornerHz) ** 6);
}

describe('the output mask of a generate channel', () => {
  const parts = { wanted: [wanted(100, 2e3, -6)], rate: rate(16e3), stages: [stage(butterworthForm(3, 4e3))] };
  const plain = { rateHz: 16e3, cornerHz: 4e3, width: 1 / 16e3 };

  it('finds the worst of all copies in each segment, along bounds that slope', () => {
    const segments = [segment(10e3, 40e3, -50, -90), segment(40e3, 1e6, -80, -150, 'log'), segment(1e6, Infinity, -160)];
    const { masks } = analyse(masked(generate(parts), segments));
    segments.forEach((one, index) => {
      let worst = { over: -Infinity, f: 0 };
      for (let k = 0; k <= 200; k += 1) {
        for (let i = 0; i <= 400; i += 1) {
          const x = 100 + (1900 * i) / 400;
          for (const f of k === 0 ? [x] : [k * 16e3 - x, k * 16e3 + x]) {
            if (f < one.lowHz || f > one.highHz || k === 0) continue;
            const share =
              one.highHz === Infinity
                ? 0
                : one.along === 'log'
                  ? Math.log(f / one.lowHz) / Math.log(one.highHz / one.lowHz)
                  : (f - one.lowHz) / (one.highHz - one.lowHz);
            const bound = (one.upper?.fromDb ?? 0) + share * ((one.upper?.toDb ?? 0) - (one.upper?.fromDb ?? 0));
            const over = -6 + plainDb(f, plain) - bound;
            if (over > worst.over) worst = { over, f };
          }
        }
      }
      const figure = masks[index];
      assertWithin(-(figure?.margin ?? NaN), worst.over, 0.02, `segment ${String(index)}:`);
      assertWithin(figure?.frequency ?? NaN, worst.f, 10, `segment ${String(index)}:`);
      assert.equal(figure?.from?.source, null);
    });
  });

  it('leaves the wanted band itself out where a segment begins at its edge, whatever the clock does', () => {
    for (const tolerance of [plusMinus(0), plusMinus(1e-3)]) {
      for (const [low, high] of [
        [100, 2e3],
        [9e3, 15e3],
        [17e3, 23e3],
      ] as const) {
        const channel = generate({ wanted: [wanted(low, high)], rate: rate(16e3, { tolerance }) });
        const { masks } = analyse(
          masked(channel, [segment(0, low, -10), segment(high, high + 500, -10), segment(low, high, -10)]),
        );
        const nearest = [16e3, 32e3].flatMap((k) => [k - high, k - low, k + low, k + high]);
        const touches = nearest.some((hz) => hz > high && hz < high + 500);
        assert.equal(masks[1]?.value === -Infinity, !touches, String(low));
        // Nothing of the mask lies outside the wanted band.
        assert.equal(masks[2]?.margin, Infinity);
      }
    }
  });

  it('takes the ends of the corner and of the clock, for a hold that follows it and one that does not', () => {
    for (const pulse of [rectangleShare(1), rectangleSeconds(50e-6)]) {
      const channel = generate({
        ...parts,
        pulse,
        rate: rate(16e3, { tolerance: plusMinus(0.01) }),
        stages: [stage(butterworthForm(3, 4e3), { cornerTolerance: plusMinus(0.05) })],
      });
      const found = analyse(masked(channel, [segment(13.5e3, 20e3, -50)]));
      let worst = -Infinity;
      for (const clock of [0.99, 1, 1.01]) {
        for (const x of [100, 500, 1000, 1500, 1900, 2000]) {
          const rateHz = 16e3 * clock;
          const width = pulse.shape === 'rectangle' && 'share' in pulse.width ? 1 / rateHz : 50e-6;
          for (const f of [rateHz - x, rateHz + x]) {
            if (f >= 13.5e3) worst = Math.max(worst, -6 + plainDb(f, { rateHz, cornerHz: 4.2e3, width }));
          }
        }
      }
      assertWithin(found.masks[0]?.value ?? NaN, worst, 0.05);
      assert.ok((found.masks[0]?.nominal ?? 0) < worst);
      assert.equal(found.masks[0]?.worstAt?.['stage 1, corner'], 0.05);
      assert.equal(found.limits[0]?.limit, 'output');
      assert.equal(found.limits[0].passes, worst <= -50);
    }
  });

  it('does not judge a mask that only asks for more', () => {
    const above: MaskSegment = {
      lowHz: 10e3,
      highHz: 20e3,
      sense: 'above',
      lower: { fromDb: -90, toDb: -90 },
      upper: null,
      along: 'linear',
    };
    const { masks, limits } = analyse(masked(generate(parts), [above]));
    assert.deepEqual(masks, []);
    assert.equal(limits[0]?.judged, false);
  });
});
