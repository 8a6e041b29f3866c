import assert from 'node:assert/strict';
import fc from 'fast-check';
import { createJudgeStore, judge } from '../../src/findings';
import { cure } from '../../src/remedies';
import { analysesAllowed } from '../../src/remedies/session';
import { applyEdits, read } from '../../src/spec';
import { bearingWith } from '../support/whole-file';

const designs = fc.record({
  order: fc.integer({ min: 2, max: 8 }),
  cornerKHz: fc.integer({ min: 105, max: 240 }).map((tenths) => tenths / 10),
  divide: fc.integer({ min: 240, max: 700 }),
  choices: fc.constantFrom(
    '{ clock: board, divide: 120 .. 700 }',
    '{ clock: board, divide: [256, 384, 512] }',
    '40 kHz .. 120 kHz',
  ),
  alias: fc.integer({ min: -120, max: -70 }),
  flatness: fc.constantFrom('0.1 dB', '0.5 dB', '1 dB', '{ at: 0.3 dB, margin: 0 dB }'),
});

const specOf = (design: typeof designs extends fc.Arbitrary<infer T> ? T : never): string =>
  bearingWith(
    ['order: 4', `order: ${design.order}`],
    ['corner: 14 kHz', `corner: ${design.cornerKHz} kHz`],
    ['divide: 480 }     ', `divide: ${design.divide} }     `],
    ['{ clock: board, divide: 120 .. 480 }', design.choices],
    ['alias: -96 dBFS', `alias: ${design.alias} dBFS`],
    ['flatness: 0.8 dB', `flatness: ${design.flatness}`],
  );

describe('every fix that is offered', () => {
  it('clears its code in the channel, adds no error, keeps its promise of a margin, and costs no more than it may', () => {
    fc.assert(
      fc.property(designs, (design) => {
        const text = specOf(design);
        const store = createJudgeStore();
        const judgement = judge(read(text), store);
        const errors = new Set(judgement.findings.filter(({ severity }) => severity === 'error').map(({ code }) => code));
        for (const finding of judgement.findings) {
          const { fixes, analyses, blockedBy } = cure(judgement, finding, store);
          assert.ok(fixes.length <= 5 && analyses <= analysesAllowed);
          assert.ok(fixes.length === 0 || blockedBy === null);
          for (const fix of fixes) {
            const after = judge(read(applyEdits(text, fix.edits)), createJudgeStore());
            const left = after.findings.filter(({ code, limit }) => code === finding.code && limit === finding.limit);
            const added = after.findings.filter(({ severity, code }) => severity === 'error' && !errors.has(code));
            assert.deepEqual([left, added], [[], []], `${fix.title}\n${text}`);
            const figure = after.channels[0]?.figures?.limits.find(({ limit }) => limit === finding.limit);
            assert.equal(fix.margin, figure?.margin ?? null, fix.title);
          }
        }
      }),
      { seed: 7, numRuns: 12 },
    );
  });
});
