/** Where a source that may stand up to infinity is hit hardest by jitter, against plain sums over a wide grid. */
import assert from 'node:assert/strict';
import { analyse, channelPath } from '../../src/analysis';
import { jitteredRange } from '../../src/analysis/jittered-range';
import { stageFilter } from '../../src/analysis/stage-filter';
import type { MeasuredForm, StageForm } from '../../src/spec/channel';
import { band, capture, family, limit, plusMinus, rate, rectangleSeconds, stage, wanted } from '../support/channel-builder';
import { inDb, inSeries, largest, plainGain } from '../support/plain-path';
import { assertWithin } from '../support/tolerance';

type PlainForm = Exclude<StageForm, MeasuredForm>;

const endless = { low: 10e3, high: Infinity };
const parts = { wanted: [wanted(0, 1e3)], rate: rate(10e3), referenceHz: 500 };

const forms: Readonly<Record<string, readonly PlainForm[]>> = {
  'a low-pass': [family('butterworth', 2, 30e3)],
  'a high-pass in front of an amplifier': [
    family('butterworth', 2, 200, { filterKind: 'highpass' }),
    { kind: 'bandwidth', cornerHz: 300e3 },
  ],
  'a notch and an amplifier': [
    { kind: 'second-order', sectionKind: 'notch', frequencyHz: 80e3, q: 1 },
    { kind: 'bandwidth', cornerHz: 300e3 },
  ],
  'a stop band that comes back': [
    family('elliptic', 4, 20e3, { rippleDb: 0.5, attenuationDb: 30 }),
    { kind: 'bandwidth', cornerHz: 500e3 },
  ],
  'roots whose turning points nobody knows': [
    {
      kind: 'roots',
      poles: [
        { re: -2e3, im: 150e3 },
        { re: -2e3, im: -150e3 },
      ],
      zeros: [{ re: -40e3, im: 0 }],
      gain: 1,
      gainAtHz: 0,
    },
  ],
};

const grid = (low: number, high: number): readonly number[] =>
  Array.from({ length: 15_001 }, (_, index) => low * (high / low) ** (index / 15_000));

describe('what jitter acts on', () => {
  for (const [title, stages] of Object.entries(forms)) {
    it(`reaches its largest in the part that is searched, without an aperture and with one: ${title}`, () => {
      const gain = inSeries(stages.map((form) => plainGain(stageFilter(form, 1))));
      for (const width of [0, 1e-6]) {
        const pulse = width === 0 ? {} : { pulse: rectangleSeconds(width) };
        const path = channelPath(capture({ ...parts, ...pulse, stages: stages.map((form) => stage(form)) }));
        const range = jitteredRange(endless, path);
        assert.ok(range.high < Infinity);
        const sinc = (x: number): number => (x === 0 ? 1 : Math.abs(Math.sin(Math.PI * x) / (Math.PI * x)));
        const change = (f: number): number => inDb(f * gain(f) * sinc(f * width));
        const beyond = largest(grid(range.high, 1e3 * range.high), change);
        const within = largest(grid(range.low, range.high), change);
        assertWithin(Math.max(within, beyond), within, 1e-3);
      }
    });
  }

  it('grows without end where nothing stops it', () => {
    const high = family('butterworth', 2, 200, { filterKind: 'highpass' });
    assert.equal(jitteredRange(endless, channelPath(capture({ ...parts, stages: [stage(high)] }))).high, Infinity);
    const rising: StageForm = {
      kind: 'measured',
      path: 'a.csv',
      table: { frequenciesHz: [0, 100e3], gainsDb: [0, -20], phasesRad: null },
      below: 'hold',
      beyond: { slopeDbPerDecade: -10 },
    };
    assert.equal(jitteredRange(endless, channelPath(capture({ ...parts, stages: [stage(rising)] }))).high, Infinity);
    const falling: StageForm = { ...rising, beyond: { slopeDbPerDecade: -20 } };
    assert.ok(jitteredRange(endless, channelPath(capture({ ...parts, stages: [stage(falling)] }))).high < Infinity);
  });

  it('counts in the noise that the limit with unwanted sources holds', () => {
    const stages = forms['a notch and an amplifier'] ?? [];
    const channel = capture({
      ...parts,
      pulse: rectangleSeconds(1e-6),
      jitterSeconds: 1e-9,
      protect: [{ lowHz: 4.9e3, highHz: 5e3 }],
      stages: stages.map((form) => stage(form)),
      unwanted: [band(20e3, Infinity, 0)],
      limits: [limit('snr', 20, { withUnwanted: true })],
    });
    const loose = { ...channel, stages: stages.map((form) => stage(form, { cornerTolerance: plusMinus(0.05) })) };
    const [still, moved] = [channel, loose].map((one) => analyse(one).limits[0]?.value ?? NaN);
    assert.ok(still !== undefined && moved !== undefined && Number.isFinite(still) && moved <= still && moved > still - 2);
  });
});
