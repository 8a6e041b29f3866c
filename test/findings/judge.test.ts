import assert from 'node:assert/strict';
import { createFigureStore } from '../../src/analysis';
import { createJudgeStore, judge, judging, spanOfFinding } from '../../src/findings';
import { read } from '../../src/spec';
import { bearingSpec, bearingWith } from '../support/whole-file';

const second = `  bearing-y:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 90 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits: { flatness: 0.8 dB }
`;

describe('a judgement', () => {
  it('has the findings in the order of the text', () => {
    const { reading, findings } = judge(read(bearingWith(['flatness: 0.8 dB', 'flatness: 0.3 dB'])), createJudgeStore());
    assert.deepEqual(
      findings.map(({ code }) => code),
      ['alias-over-limit', 'flatness-over-limit'],
    );
    const starts = findings.map((finding) => spanOfFinding(reading, finding).start);
    assert.deepEqual(
      starts,
      [...starts].sort((a, b) => a - b),
    );
  });

  it('says of each channel whether it passes', () => {
    const { channels } = judge(read(`${bearingSpec}${second}`), createJudgeStore());
    assert.deepEqual(
      channels.map(({ entry, passes }) => [entry.name, passes]),
      [
        ['bearing-x', false],
        ['bearing-y', true],
      ],
    );
  });

  it('leaves the verdict open for a channel that is not whole, and judges the others', () => {
    const { channels, findings } = judge(read(`${bearingSpec.replace('bits: 16', 'bits: many')}${second}`), createJudgeStore());
    assert.deepEqual(
      channels.map(({ figures, passes }) => [figures === null, passes]),
      [
        [true, null],
        [false, true],
      ],
    );
    assert.ok(findings.every((finding) => 'span' in finding.at));
  });

  it('keeps faults of the text as they were read', () => {
    const reading = read(bearingSpec.replace('bits: 16', 'bitz: 16'));
    const [finding] = judge(reading, createJudgeStore()).findings;
    const [problem] = reading.problems;
    assert.deepEqual([finding?.code, finding?.message, finding?.at], ['unknown-key', problem?.message, { span: problem?.span }]);
  });

  it('analyses one channel after an edit in one, and finds afresh only there', () => {
    const store = createJudgeStore();
    const first = read(`${bearingSpec}${second}`);
    const before = judge(first, store);
    assert.equal(store.analysed, 2);
    const after = judge(read(first.text.replace('rate: 96 kHz', 'rate: 98 kHz'), first), store);
    assert.equal(store.analysed, 3);
    assert.equal(after.findings[0], before.findings[0]);
  });

  it('is the same with a plain figure store and with one that keeps findings', () => {
    const reading = read(`${bearingSpec}${second}`);
    assert.deepEqual(judge(reading, createFigureStore()), judge(reading, createJudgeStore()));
  });

  it('pauses after each channel that it analyses, and not for those it knows', () => {
    const store = createJudgeStore();
    const reading = read(`${bearingSpec}${second}`);
    const pauses = (): number => {
      const steps = judging(reading, store);
      let count = 0;
      while (steps.next().done !== true) count += 1;
      return count;
    };
    assert.deepEqual([pauses(), pauses()], [2, 0]);
  });

  it('holds its tongue about unused names while a channel that may use them has a fault', () => {
    const unused = bearingSpec.replace('    filter: pick-up guard\n', '    filter: { bandwidth: 30 kHz }\n');
    const codes = (text: string): readonly string[] => judge(read(text), createJudgeStore()).findings.map(({ code }) => code);
    assert.ok(codes(unused).includes('unused-name'));
    assert.ok(!codes(unused.replace('bits: 16', 'bits: many')).includes('unused-name'));
  });
});
