/** The machine-readable result: every field of every channel is there, numbers are JSON, places are right. */
import assert from 'node:assert/strict';
import { checkText } from '../../src/library';
import { toResult, toText, type ResultFile } from '../../src/output';
import { resultNumber } from '../../src/output/result-number';
import { exampleText } from '../support/examples';

function resultOf(text: string): ResultFile {
  const file = checkText('gate.bandkeep.yaml', text);
  return toResult([file], [{ path: file.path, sha256: '0'.repeat(64) }], '1.2.3');
}

const channelFields = [
  'name direction ref passes rate outputRate halfRate zone inverted reference rateWindow wanted protected limits droop delay',
  'delaySpread aliases alias aliasSum images image masks spurs noise testTone snr sinad enob enobFullScale headroom settling',
  'crosstalk copyWeights parts',
]
  .join(' ')
  .split(' ')
  .sort();

describe('the JSON result', () => {
  const result = resultOf(exampleText('gate-bearing-broken'));
  const [file] = result.files;

  it('carries its own version and that of the tool', () => {
    assert.equal(result.bandkeep, 1);
    assert.equal(result.tool, '1.2.3');
  });

  it('has every field of a channel, also of one that is not whole', () => {
    const faulty = resultOf('bandkeep: 1\nchannels:\n  a: { direction: capture }\n');
    for (const channel of [file?.channels[0], faulty.files[0]?.channels[0]]) {
      assert.deepEqual(Object.keys(channel ?? {}).sort(), channelFields);
    }
    const { passes, rate } = faulty.files[0]?.channels[0] ?? assert.fail('no channel');
    assert.deepEqual([passes, rate], [null, null]);
  });

  it('names both violations at the values that they are about, with figures and proved fixes', () => {
    const text = exampleText('gate-bearing-broken').split('\n');
    const errors = file?.findings.filter((finding) => finding.severity === 'error') ?? [];
    assert.deepEqual(errors.map((finding) => finding.code).sort(), ['alias-over-limit', 'flatness-over-limit']);
    for (const finding of errors) {
      assert.ok(finding.fixes.length > 0, `${finding.code} has no fix`);
      assert.ok(Number(finding.figures?.margin) < 0);
    }
    const alias = errors.find((finding) => finding.code === 'alias-over-limit');
    const { start, end } = alias?.range ?? assert.fail('no alias finding');
    assert.equal(text[start.line]?.slice(start.character, end.character), '40 kHz .. 3 MHz');
  });

  it('survives JSON and says the same numbers twice', () => {
    const again = resultOf(exampleText('gate-bearing-broken'));
    assert.deepEqual(JSON.parse(JSON.stringify(result)), JSON.parse(JSON.stringify(again)));
  });

  it('gives each limit its own range in the text', () => {
    const lines = exampleText('gate-bearing-broken').split('\n');
    const limit = file?.channels[0]?.limits?.find((entry) => entry.limit === 'flatness');
    const { start, end } = limit?.range ?? assert.fail('no flatness limit');
    assert.equal(lines[start.line]?.slice(start.character, end.character), '0.8 dB');
  });
});

describe('limits of gain and time', () => {
  const text = `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 60 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits:
      delay: 25 µs
      level: -4 dBFS .. -2 dBFS
      response: [{ band: 5 Hz .. 10 kHz, within: ± 1 dB }, { band: 60 kHz .., below: -80 dB }]
`;
  const [file] = resultOf(text).files;
  const [channel] = file?.channels ?? [];

  it('give each segment of a mask its worst point', () => {
    const [inside, stop] = channel?.masks ?? [];
    assert.deepEqual([inside?.limit, inside?.segment, inside?.frequency, inside?.bound], ['response', 0, 10e3, -1]);
    assert.deepEqual([stop?.segment, stop?.frequency, stop?.bound], [1, 60e3, -80]);
    assert.ok(Math.abs(Number(stop?.value) + 40 * Math.log10(60 / 14) * 2) < 0.001 && Number(stop?.margin) < 0);
    assert.deepEqual([channel?.crosstalk, channel?.copyWeights], [null, null]);
  });

  it('say what a time and a range are', () => {
    const limits = channel?.limits?.map(({ limit, unit, sense, passes }) => [limit, unit, sense, passes]);
    assert.deepEqual(limits, [
      ['delay', 's', 'at-most', false],
      ['level', 'dBFS', 'inside', true],
      ['response', 'dB', 'inside', false],
    ]);
  });

  it('place a broken segment on the segment, with the mask and the filter beside it', () => {
    const finding = file?.findings.find(({ code }) => code === 'response-over-mask');
    const { start, end } = finding?.range ?? assert.fail('no finding');
    assert.equal(text.split('\n')[start.line]?.slice(start.character, end.character), '{ band: 60 kHz .., below: -80 dB }');
    assert.deepEqual(
      finding?.related.map(({ message }) => message),
      ['the limit', 'the filter'],
    );
  });

  it('are printed in their own units', () => {
    // 10·log10(1 + (10/14)⁸) = 0.285 dB below −3 dBFS; 2.6131/(2π·14 kHz) = 29.71 µs (closed forms).
    const printed = toText([checkText('gate.bandkeep.yaml', text)]);
    assert.match(printed, /delay 29\.71 µs \(4\.71 µs short\) · level −3\.28 dBFS \(0\.72 dB in hand\)/u);
  });
});

describe('numbers of the result', () => {
  it('write infinities as words and what cannot be computed as null', () => {
    assert.deepEqual([Infinity, -Infinity, NaN, null, undefined, -96.5].map(resultNumber), [
      'inf',
      '-inf',
      null,
      null,
      null,
      -96.5,
    ]);
  });
});
