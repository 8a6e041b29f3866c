/** What must hold of every channel: answers scale, sources only add, tolerances only hurt, nominal is never worse than the worst case. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { analyse } from '../../src/analysis';
import type { Figures } from '../../src/analysis';
import type { Channel, Pulse, Source, Stage } from '../../src/spec/channel';
import {
  anything,
  band,
  butterworthForm,
  capture,
  chebyshevForm,
  exact,
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
const tolerance = fc.record({ low: between(-0.08, 0), high: between(0, 0.08) });

const stages: fc.Arbitrary<readonly Stage[]> = fc
  .array(
    fc.record({
      form: fc.oneof(
        fc
          .record({ order: fc.integer({ min: 1, max: 7 }), corner: between(8e3, 40e3) })
          .map((f) => butterworthForm(f.order, f.corner)),
        fc
          .record({ order: fc.integer({ min: 2, max: 7 }), corner: between(8e3, 40e3), ripple: between(0.05, 2) })
          .map((f) => chebyshevForm(f.order, f.corner, f.ripple, 'ripple')),
      ),
      cornerTolerance: fc.oneof(fc.constant(exact), tolerance),
      gainTolerance: fc.oneof(fc.constant(exact), tolerance),
    }),
    { maxLength: 2 },
  )
  .map((found) => found.map((one, index) => stage(one.form, { ...one, label: `stage ${String(index + 1)}` })));

const source: fc.Arbitrary<Source> = fc.oneof(
  fc
    .record({ f: between(1e3, 3e5), level: between(-80, 0), tolerance: fc.oneof(fc.constant(exact), tolerance) })
    .map((one) => tone(one.f, one.level, { tolerance: one.tolerance })),
  fc
    .record({ f: between(12e3, 3e5), width: between(1e2, 1e6), level: between(-80, 0) })
    .map((one) => band(one.f, one.f + one.width, one.level)),
  between(-80, 0).map((level) => anything(level)),
);

const pulse: fc.Arbitrary<Pulse> = fc.oneof(between(0.05, 1).map(rectangleShare), between(1e-7, 1.5e-5).map(rectangleSeconds));

const parts = fc.record({
  low: fc.constantFrom(0, 20, 500),
  top: between(2e3, 1e4),
  hz: between(25e3, 2e5),
  clock: fc.constantFrom(0, 0, 5e-5),
  stages,
  pulse,
  sources: fc.array(source, { minLength: 1, maxLength: 3 }),
  sampler: fc.boolean(),
  unit: fc.constantFrom('dBFS', 'dBc'),
});

function build(direction: 'capture' | 'generate', one: Parameters<Parameters<typeof parts.map>[0]>[0]): Channel {
  const limits = [
    limit(direction === 'capture' ? 'alias' : 'image', -60, { unit: one.unit }),
    limit('flatness', 1),
    limit('snr', 60),
    limit('headroom', 1),
  ];
  const common = {
    wanted: [wanted(one.low, one.top, -3)],
    rate: rate(one.hz, { tolerance: { low: -one.clock, high: one.clock }, clockJitterSeconds: 1e-9 }),
    stages: one.stages,
    pulse: one.pulse,
    bits: 14,
    limits,
  };
  return direction === 'capture'
    ? capture({ ...common, unwanted: one.sources, levelsAt: one.sampler ? 'sampler' : 'input' })
    : generate(common);
}

const channel = fc.oneof(
  parts.map((one) => build('capture', one)),
  parts.map((one) => build('generate', one)),
);

/** Every frequency multiplied, every time divided. */
function scaled(one: Channel, by: number): Channel {
  const formOf = (form: Stage['form']): Stage['form'] => ('cornerHz' in form ? { ...form, cornerHz: form.cornerHz * by } : form);
  const sourceOf = (from: Source): Source => {
    if (from.kind === 'tone') return { ...from, frequencyHz: from.frequencyHz * by };
    return from.kind === 'band' ? { ...from, lowHz: from.lowHz * by, highHz: from.highHz * by } : from;
  };
  const { pulse: shape } = one;
  return {
    ...one,
    wanted: one.wanted.map((from) => ({ ...from, lowHz: from.lowHz * by, highHz: from.highHz * by })),
    referenceHz: one.referenceHz * by,
    unwanted: one.unwanted.map(sourceOf),
    rate: rate(one.rate.hz * by, { tolerance: one.rate.tolerance, clockJitterSeconds: 1e-9 / by }),
    pulse: shape.shape === 'rectangle' && 'seconds' in shape.width ? rectangleSeconds(shape.width.seconds / by) : shape,
    stages: one.stages.map((from) => ({ ...from, form: formOf(from.form) })),
    testTone: { ...one.testTone, frequencyHz: one.testTone.frequencyHz * by },
  };
}

function assertSame(one: number | null | undefined, other: number | null | undefined, difference: number, what: string): void {
  if (typeof one !== 'number' || typeof other !== 'number') assert.equal(one, other, what);
  else assert.ok(one === other || Math.abs(one - other) <= difference, `${what}: ${String(one)} and ${String(other)}`);
}

const worstAlias = (figures: Figures): number => Math.max(-Infinity, ...figures.aliases.map((alias) => alias.level ?? -Infinity));

describe('every channel', () => {
  it('gives the same levels when all frequencies and times are scaled', () => {
    fc.assert(
      fc.property(channel, fc.constantFrom(1e-3, 0.37, 1024, 1e6), (one, by) => {
        const [figures, moved] = [analyse(one), analyse(scaled(one, by))];
        // Each proved value may lie up to its gap above the truth.
        figures.limits.forEach((found, index) => {
          assertSame(found.value, moved.limits[index]?.value, 0.002, found.limit);
        });
        assertSame(figures.droop, moved.droop, 1e-6, 'droop');
        assertSame((figures.delay ?? 0) / by / (moved.delay ?? 1), figures.delay === 0 ? 0 : 1, 1e-6, 'delay');
        assertSame(figures.noise.total, moved.noise.total, 1e-6, 'noise');
      }),
      { seed: 1, numRuns: 120 },
    );
  });

  it('has no weaker worst alias with one more source', () => {
    fc.assert(
      fc.property(parts, source, (one, more) => {
        const before = analyse(build('capture', one));
        const after = analyse(build('capture', { ...one, sources: [...one.sources, more] }));
        assert.ok(worstAlias(after) >= worstAlias(before));
        assert.ok((after.headroom ?? NaN) <= (before.headroom ?? NaN) + 1e-9);
      }),
      { seed: 2, numRuns: 80 },
    );
  });

  it('has no better margin with a wider tolerance', () => {
    const widened = (one: Stage): Stage => ({
      ...one,
      cornerTolerance: { low: one.cornerTolerance.low - 0.02, high: one.cornerTolerance.high + 0.02 },
      gainTolerance: { low: one.gainTolerance.low - 0.02, high: one.gainTolerance.high + 0.02 },
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
      { seed: 3, numRuns: 80 },
    );
  });

  it('is nominally never worse than at its worst', () => {
    fc.assert(
      fc.property(channel, (one) => {
        for (const { limit: key, sense, value, nominal } of analyse(one).limits) {
          if (value === null || nominal === null) continue;
          assert.ok(
            sense === 'at-most' ? nominal <= value : nominal >= value,
            `${key}: nominal ${String(nominal)}, worst ${String(value)}`,
          );
        }
      }),
      { seed: 4, numRuns: 120 },
    );
  });

  it('has proved maxima with a gap of at most 0.001 dB and finite numbers', () => {
    fc.assert(
      fc.property(channel, (one) => {
        const figures = analyse(one);
        for (const found of figures.limits) assert.ok((found.gap ?? 0) <= 0.001 + 1e-12, `${found.limit} ${String(found.gap)}`);
        assert.ok(!JSON.stringify(figures, (_, value: unknown) => (Number.isNaN(value) ? 'NaN' : value)).includes('NaN'));
      }),
      { seed: 5, numRuns: 120 },
    );
  });
});
