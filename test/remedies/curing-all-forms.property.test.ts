/** The promises of every fix, on channels of all directions with stages, pulses and rate choices of all forms. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { createJudgeStore, judge, type Finding } from '../../src/findings';
import { cure } from '../../src/remedies';
import { analysesAllowed } from '../../src/remedies/session';
import { applyEdits, read } from '../../src/spec';

const order = fc.integer({ min: 1, max: 5 });
const corner = fc.integer({ min: 8, max: 40 });

const stage = fc.oneof(
  fc
    .tuple(fc.constantFrom('butterworth', 'bessel', 'legendre', 'gaussian'), order, corner)
    .map(([family, n, khz]) => `{ family: ${family}, order: ${n}, corner: ${khz} kHz }`),
  fc
    .tuple(order, corner, fc.constantFrom(', corner-at: ripple', ''))
    .map(
      ([n, khz, at]) => `{ family: chebyshev, order: ${n}, corner: ${khz} kHz, ripple: 1 dB${at}, tolerance: { corner: 2 % } }`,
    ),
  fc
    .tuple(order, fc.integer({ min: 1, max: 4 }), corner)
    .map(([n, low, high]) => `{ family: butterworth, kind: bandpass, order: ${n}, corners: ${low} kHz .. ${high} kHz }`),
  fc
    .tuple(order, fc.integer({ min: 1, max: 6 }))
    .map(([n, khz]) => `{ family: butterworth, kind: highpass, order: ${n}, corner: ${khz} kHz }`),
  fc.constantFrom('{ rc: { r: 1k ± 1 %, c: 10n ± 5 % } }', '{ cr: { r: 10 kΩ, c: 10 nF } }', '{ bandwidth: 50 kHz }'),
);
const filter = fc.array(stage, { minLength: 1, maxLength: 2 }).map((stages) => `[${stages.join(', ')}]`);

const unwanted = '[{ name: hash, band: 30 kHz .. 3 MHz, level: -30 dBFS }, { name: hum, tone: 50 Hz, level: -30 dBFS }]';

/** The lines that only one direction has. */
const forms = fc.record({
  filter,
  second: filter,
  width: fc.constantFrom('20 %', '50 %', '100 %'),
  alias: fc.integer({ min: -90, max: -30 }),
  image: fc.integer({ min: -70, max: -10 }),
});
const directions = {
  capture: forms.map((one) => [
    `aperture: ${one.width}`,
    `unwanted: ${unwanted}`,
    `filter: ${one.filter}`,
    `limits: { alias: ${one.alias} dBFS`,
  ]),
  generate: forms.map((one) => [`hold: ${one.width}`, `filter: ${one.filter}`, `limits: { image: ${one.image} dBc`]),
  relay: forms.map((one) => [
    `gate: ${one.width}`,
    `unwanted: ${unwanted}`,
    `input-filter: ${one.filter}`,
    `output-filter: ${one.second}`,
    `limits: { alias: ${one.alias} dBFS, image: ${one.image} dBc`,
  ]),
};

const design = fc.constantFrom('capture', 'generate', 'relay').chain((direction) =>
  fc
    .tuple(
      directions[direction],
      fc.integer({ min: 18, max: 120 }),
      fc.integer({ min: 5, max: 8 }),
      fc.constantFrom('0.2 dB', '1 dB', '3 dB'),
      fc.constantFrom(
        '',
        'rate-choices: [20 kHz, 32 kHz, 48 kHz, 96 kHz]',
        'rate-choices: { range: 20 kHz .. 80 kHz, step: 2.5 kHz }',
      ),
    )
    .map(([own, rate, low, flatness, choices]) => {
      const lines = [
        `direction: ${direction}`,
        `wanted: { band: ${low} kHz .. ${low + 2} kHz }`,
        `rate: ${rate} kHz`,
        choices,
        ...own,
      ];
      const kept = lines.filter((line) => line !== '');
      return `bandkeep: 1\nchannels:\n  one:\n    ${kept.join('\n    ')}, flatness: ${flatness}, delay-spread: 50 us }\n`;
    }),
);

/** Findings of one code and one limit are cured alike. */
function oneOfEachCode(findings: readonly Finding[]): readonly Finding[] {
  return [...new Map(findings.map((finding) => [`${finding.code} ${String(finding.limit)}`, finding])).values()];
}

describe('every fix that is offered for a channel of any form', () => {
  it('clears its code, adds no error, and is one of five at most', () => {
    const kinds = new Set<string>();
    fc.assert(
      fc.property(design, (text) => {
        const store = createJudgeStore();
        const judgement = judge(read(text), store);
        assert.ok(judgement.channels[0]?.figures, judgement.findings.map(({ message }) => message).join('\n'));
        const errors = new Set(judgement.findings.filter(({ severity }) => severity === 'error').map(({ code }) => code));
        for (const finding of oneOfEachCode(judgement.findings)) {
          const { fixes, analyses } = cure(judgement, finding, store);
          assert.ok(fixes.length <= 5 && analyses <= analysesAllowed);
          for (const fix of fixes) {
            kinds.add(fix.kind);
            const { findings } = judge(read(applyEdits(text, fix.edits)), createJudgeStore());
            const left = findings.filter(({ code, limit }) => code === finding.code && limit === finding.limit);
            const added = findings.filter(({ severity, code }) => severity === 'error' && !errors.has(code));
            assert.deepEqual([left, added], [[], []], `${fix.title}\n${text}`);
            assert.doesNotMatch(fix.title, /undefined|NaN|Infinity/);
          }
        }
      }),
      { seed: 61, numRuns: 6 },
    );
    assert.ok(kinds.size >= 4, [...kinds].join());
  });
});
