/** What must hold of every channel whatever its stages are made of: answers scale, tolerances only hurt, everything is proved and finite. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { analyse } from '../../src/analysis';
import type { Channel, FamilyForm, Stage, StageForm } from '../../src/spec/channel';
import {
  band,
  capture,
  exact,
  family,
  generate,
  limit,
  rate,
  rectangleSeconds,
  rectangleShare,
  stage,
  tone,
  wanted,
} from '../support/channel-builder';

const share = fc.double({ min: 0, max: 1, noNaN: true });
const between = (low: number, high: number): fc.Arbitrary<number> => share.map((x) => low + x * (high - low));
const around = (low: number, high: number): fc.Arbitrary<number> => between(Math.log(low), Math.log(high)).map(Math.exp);
const tolerance = fc.oneof(fc.constant(exact), fc.record({ low: between(-0.08, 0), high: between(0, 0.08) }));

const shapes = [
  ['butterworth', {}],
  ['chebyshev', { rippleDb: 0.7 }],
  ['inverse-chebyshev', { attenuationDb: 40 }],
  ['elliptic', { rippleDb: 0.4, attenuationDb: 45 }],
  ['bessel', {}],
  ['legendre', {}],
  ['gaussian', {}],
] as const;

const familyForm: fc.Arbitrary<FamilyForm> = fc
  .record({
    shape: fc.constantFrom(...shapes),
    order: fc.integer({ min: 1, max: 5 }),
    filterKind: fc.constantFrom('lowpass', 'highpass', 'bandpass', 'bandstop'),
    low: around(20, 900),
    high: around(9e3, 40e3),
  })
  .map(({ shape: [name, options], order, filterKind, low, high }) => {
    const edges = {
      lowpass: { cornerHz: high, upperCornerHz: null },
      highpass: { cornerHz: low, upperCornerHz: null },
      bandpass: { cornerHz: low, upperCornerHz: high },
      bandstop: { cornerHz: high, upperCornerHz: 1.5 * high },
    }[filterKind];
    return family(name, order, edges.cornerHz, { ...options, ...edges, filterKind });
  });

const otherForm: fc.Arbitrary<StageForm> = fc.oneof(
  fc
    .record({
      sectionKind: fc.constantFrom('lowpass', 'highpass', 'bandpass', 'notch', 'allpass'),
      f: around(100, 60e3),
      q: around(0.3, 8),
    })
    .map(({ sectionKind, f, q }): StageForm => ({ kind: 'second-order', sectionKind, frequencyHz: f, q })),
  around(20, 500).map((f): StageForm => ({ kind: 'cr', ohm: 1e4, farad: 1 / (2 * Math.PI * f * 1e4) })),
  fc.record({ f: around(8e3, 50e3), q: around(0.4, 5) }).map(({ f, q }): StageForm => {
    const [henry, farad] = [100 / (2 * Math.PI * f), 1 / (2 * Math.PI * f * 100)];
    return { kind: 'rlc', ohm: 100 / q, henry, farad };
  }),
  fc.record({ f: around(8e3, 50e3), zero: around(30e3, 80e3) }).map(({ f, zero }): StageForm => ({
    kind: 'roots',
    poles: [
      { re: -0.6 * f, im: 0.8 * f },
      { re: -0.6 * f, im: -0.8 * f },
    ],
    zeros: [{ re: zero, im: 0 }],
    gain: 1,
    gainAtHz: 0,
  })),
  fc.array(between(-3, 1), { minLength: 3, maxLength: 8 }).map((steps): StageForm => ({
    kind: 'measured',
    path: 'a.csv',
    table: {
      frequenciesHz: steps.map((_, index) => 100 * 5 ** index),
      gainsDb: steps.map((_, index) => steps.slice(0, index + 1).reduce((a, b) => a + b, 0)),
      phasesRad: steps.map((step, index) => -0.3 * index * index + 0.1 * step),
    },
    below: 'hold',
    beyond: { slopeDbPerDecade: -40 },
  })),
);

const oneStage = fc
  .record({ form: fc.oneof(familyForm, otherForm), corner: tolerance, q: tolerance, gain: tolerance })
  .map(({ form, corner, q, gain }): Omit<Stage, 'name' | 'label'> => {
    const parts =
      form.kind === 'rlc'
        ? [
            { part: 'r' as const, value: form.ohm, tolerance: q },
            { part: 'l' as const, value: form.henry, tolerance: corner },
            { part: 'c' as const, value: form.farad, tolerance: gain },
          ]
        : [];
    const hasQ = form.kind === 'second-order' || (form.kind === 'family' && form.filterKind === 'lowpass');
    return {
      form,
      gain: 1,
      parts,
      cornerTolerance: form.kind === 'rlc' ? exact : corner,
      qTolerance: hasQ ? q : exact,
      gainTolerance: gain,
    };
  });

const channel: fc.Arbitrary<Channel> = fc
  .record({
    direction: fc.constantFrom('capture', 'generate'),
    stages: fc.array(oneStage, { minLength: 1, maxLength: 2 }),
    pulse: fc.oneof(between(0.05, 1).map(rectangleShare), between(1e-7, 1e-5).map(rectangleSeconds)),
    hz: between(25e3, 2e5),
    clock: fc.constantFrom(0, 5e-5),
    unit: fc.constantFrom('dBFS', 'dBc'),
    from: between(12e3, 2e5),
  })
  .map(({ direction, stages, pulse, hz, clock, unit, from }) => {
    const common = {
      wanted: [wanted(1e3, 8e3, -3)],
      rate: rate(hz, { tolerance: { low: -clock, high: clock }, clockJitterSeconds: 1e-9 }),
      stages: [
        ...stages.map((one, index) => stage(one.form, { ...one, label: `stage ${String(index + 1)}` })),
        stage({ kind: 'bandwidth', cornerHz: 300e3 }, { label: 'amplifier' }),
      ],
      pulse,
      bits: 14,
      limits: [
        limit(direction === 'capture' ? 'alias' : 'image', -60, { unit }),
        limit('flatness', 1),
        limit('snr', 60),
        limit('headroom', 1),
      ],
    };
    return direction === 'capture'
      ? capture({ ...common, unwanted: [band(from, Infinity, -20), tone(1.7 * from, -10)] })
      : generate(common);
  });

function scaledForm(form: StageForm, by: number): StageForm {
  switch (form.kind) {
    case 'family':
      return {
        ...form,
        cornerHz: form.cornerHz * by,
        upperCornerHz: form.upperCornerHz === null ? null : form.upperCornerHz * by,
      };
    case 'second-order':
      return { ...form, frequencyHz: form.frequencyHz * by };
    case 'rc':
    case 'cr':
      return { ...form, farad: form.farad / by };
    case 'rlc':
      return { ...form, henry: form.henry / by, farad: form.farad / by };
    case 'bandwidth':
      return { ...form, cornerHz: form.cornerHz * by };
    case 'roots': {
      const moved = (root: { re: number; im: number }) => ({ re: root.re * by, im: root.im * by });
      return { ...form, poles: form.poles.map(moved), zeros: form.zeros.map(moved), gainAtHz: form.gainAtHz * by };
    }
    case 'measured':
      return { ...form, table: { ...form.table, frequenciesHz: form.table.frequenciesHz.map((f) => f * by) } };
  }
}

/** Every frequency multiplied, every time divided. */
function scaled(one: Channel, by: number): Channel {
  const { pulse } = one;
  return {
    ...one,
    wanted: one.wanted.map((from) => ({ ...from, lowHz: from.lowHz * by, highHz: from.highHz * by })),
    referenceHz: one.referenceHz * by,
    unwanted: one.unwanted.map((source) => {
      if (source.kind === 'tone') return { ...source, frequencyHz: source.frequencyHz * by };
      return source.kind === 'band' ? { ...source, lowHz: source.lowHz * by, highHz: source.highHz * by } : source;
    }),
    rate: rate(one.rate.hz * by, { tolerance: one.rate.tolerance, clockJitterSeconds: 1e-9 / by }),
    pulse: pulse.shape === 'rectangle' && 'seconds' in pulse.width ? rectangleSeconds(pulse.width.seconds / by) : pulse,
    stages: one.stages.map((from) => ({ ...from, form: scaledForm(from.form, by) })),
    testTone: { ...one.testTone, frequencyHz: one.testTone.frequencyHz * by },
  };
}

function assertSame(one: number | null | undefined, other: number | null | undefined, difference: number, what: string): void {
  if (typeof one !== 'number' || typeof other !== 'number') assert.equal(one, other, what);
  else assert.ok(one === other || Math.abs(one - other) <= difference, `${what}: ${String(one)} and ${String(other)}`);
}

describe('a channel of any stages', () => {
  it('gives the same levels when all frequencies and times are scaled', () => {
    fc.assert(
      fc.property(channel, fc.constantFrom(1e-3, 0.37, 1e6), (one, by) => {
        const [figures, moved] = [analyse(one), analyse(scaled(one, by))];
        // Each proved value may lie up to its gap above the truth.
        figures.limits.forEach((found, index) => {
          assertSame(found.value, moved.limits[index]?.value, 0.002, found.limit);
        });
        assertSame(figures.droop, moved.droop, 1e-6, 'droop');
        assertSame((figures.delay ?? 0) / by / (moved.delay ?? 1), 1, 1e-6, 'delay');
      }),
      { seed: 11, numRuns: 30 },
    );
  });

  it('has no better margin with a wider tolerance', () => {
    const wider = ({ low, high }: Stage['cornerTolerance']) => ({ low: low - 0.02, high: high + 0.02 });
    const widened = (one: Stage): Stage => ({
      ...one,
      parts: one.parts.map((part) => ({ ...part, tolerance: wider(part.tolerance) })),
      cornerTolerance: one.form.kind === 'rlc' ? exact : wider(one.cornerTolerance),
      qTolerance: one.form.kind === 'second-order' ? wider(one.qTolerance) : one.qTolerance,
      gainTolerance: wider(one.gainTolerance),
    });
    fc.assert(
      fc.property(channel, (one) => {
        const [narrow, wide] = [analyse(one), analyse({ ...one, stages: one.stages.map(widened) })];
        narrow.limits.forEach((found, index) => {
          const margin = wide.limits[index]?.margin ?? null;
          if (found.margin !== null && margin !== null)
            assert.ok(margin <= found.margin + 0.002, `${found.limit}: ${String(margin)} after ${String(found.margin)}`);
        });
      }),
      { seed: 12, numRuns: 25 },
    );
  });

  it('has proved maxima with a gap of at most 0.001 dB, no number that is none, and is nominally never worse than at its worst', () => {
    fc.assert(
      fc.property(channel, (one) => {
        const figures = analyse(one);
        for (const { limit: key, sense, value, nominal, gap } of figures.limits) {
          assert.ok((gap ?? 0) <= 0.001 + 1e-12, `${key}: gap ${String(gap)}`);
          if (value === null || nominal === null) continue;
          assert.ok(
            sense === 'at-most' ? nominal <= value : nominal >= value,
            `${key}: ${String(nominal)}, worst ${String(value)}`,
          );
        }
        assert.ok(!JSON.stringify(figures, (_, value: unknown) => (Number.isNaN(value) ? 'NaN' : value)).includes('NaN'));
      }),
      { seed: 13, numRuns: 50 },
    );
  });
});
