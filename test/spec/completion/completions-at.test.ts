/** Tests of completion: the cursor is marked `¦` in each text. */
import assert from 'node:assert/strict';
import { completionsAt } from '../../../src/spec/completion';
import { read } from '../../../src/spec/read';

function labelsAt(marked: string): readonly string[] {
  return at(marked).completions.map(({ label }) => label);
}

function at(marked: string) {
  const offset = marked.indexOf('¦');
  const text = marked.replace('¦', '');
  return { text, completions: completionsAt(read(text), offset) };
}

/** The text after choosing a completion by its label. */
function chosen(marked: string, label: string): string {
  const { text, completions } = at(marked);
  const found = completions.find((completion) => completion.label === label);
  assert.ok(found, `${label} is not offered: ${completions.map((completion) => completion.label).join(', ')}`);
  return text.slice(0, found.span.start) + found.newText + text.slice(found.span.end);
}

const head = `bandkeep: 1
clocks:
  board: { frequency: 24.576 MHz }
filters:
  pick-up guard: { bandwidth: 400 kHz }
channels:
  gate-x:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz }
    rate: 51.2 kHz
`;

describe('completion', () => {
  it('offers the keys of a file that do not stand yet', () => {
    assert.deepEqual(labelsAt(`${head}¦`), ['title', 'notes', 'use', 'sources', 'masks']);
    assert.deepEqual(labelsAt('¦'), ['bandkeep', 'title', 'notes', 'use', 'clocks', 'sources', 'filters', 'masks', 'channels']);
  });

  it('offers the keys of a channel that fit its direction and do not stand yet', () => {
    const labels = labelsAt(`${head}    ¦\n`);
    for (const label of ['like', 'unwanted', 'aperture', 'filter', 'limits', 'bits']) assert.ok(labels.includes(label), label);
    for (const label of ['direction', 'wanted', 'rate', 'hold', 'gate', 'converter']) assert.ok(!labels.includes(label), label);
  });

  it('offers the same while a key is half typed', () => {
    assert.equal(chosen(`${head}    ap¦\n`, 'aperture'), `${head}    aperture: \n`);
    assert.equal(chosen(`${head}    ap¦: 300 ns\n`, 'aperture'), `${head}    aperture: 300 ns\n`);
  });

  it('offers words and names where a value stands', () => {
    assert.deepEqual(labelsAt(`${head}    levels-at: ¦\n`), ['input', 'sampler']);
    assert.equal(chosen(`${head}    levels-at:¦\n`, 'sampler'), `${head}    levels-at: sampler\n`);
    assert.deepEqual(labelsAt(`${head}    filter: pick¦\n`), ['pick-up guard']);
    assert.equal(chosen(`${head}    filter: pick-up gu¦\n`, 'pick-up guard'), `${head}    filter: pick-up guard\n`);
    assert.deepEqual(labelsAt(`${head}    aperture: ¦`), ['instant', 'zero-order', 'linear']);
  });

  it('offers other channels for `like`, not the channel itself', () => {
    assert.deepEqual(labelsAt(`${head}  gate-y:\n    like: ¦\n`), ['gate-x']);
  });

  it('completes inside brackets', () => {
    assert.equal(
      chosen(`${head}    rate-choices: { clock: b¦, divide: 3 }\n`, 'board'),
      `${head}    rate-choices: { clock: board, divide: 3 }\n`,
    );
    assert.deepEqual(labelsAt(`${head}    rate-choices: { clock: board, ¦ }\n`), ['multiply', 'divide']);
    assert.deepEqual(labelsAt(`${head}    rate-choices: { ¦\n`), ['range', 'clock']);
    assert.equal(chosen(`${head}    limits: { al¦ }\n`, 'alias'), `${head}    limits: { alias:  }\n`);
  });

  it('offers what goes with what stands already', () => {
    const stage = (keys: string) => labelsAt(`${head}    filter: { ${keys}, ¦ }\n`);
    assert.deepEqual(stage('family: butterworth'), ['name', 'kind', 'order', 'corner', 'corner-at', 'gain', 'tolerance']);
    assert.deepEqual(stage('family: bessel, kind: bandpass, order: 3'), ['name', 'corners', 'corner-at', 'gain', 'tolerance']);
    assert.deepEqual(stage('family: chebyshev, order: 3'), [
      'name',
      'kind',
      'corner',
      'ripple',
      'corner-at',
      'gain',
      'tolerance',
    ]);
    assert.deepEqual(stage('bandwidth: 3 kHz'), ['name', 'tolerance']);
    assert.deepEqual(labelsAt(`${head}    filter: { name: a, ¦ }\n`), [
      'family',
      'second-order',
      'rc',
      'cr',
      'rlc',
      'bandwidth',
      'poles',
      'measured',
    ]);
  });

  it('offers keys and words behind a dash', () => {
    assert.deepEqual(labelsAt(`${head}    unwanted:\n      - ¦\n`), [
      'name',
      'tone',
      'band',
      'anything',
      'spectrum',
      'enters',
      'ref',
      'anything',
    ]);
    assert.deepEqual(labelsAt(`${head}    unwanted:\n      - any¦\n`).includes('anything'), true);
    assert.equal(
      chosen(`${head}    unwanted:\n      - tone: 3 kHz\n        ¦\n`, 'level'),
      `${head}    unwanted:\n      - tone: 3 kHz\n        level: \n`,
    );
  });

  it('offers the keys of a map on a line of its own', () => {
    assert.deepEqual(labelsAt(`${head}    limits:\n      ¦\n`), [
      'alias',
      'flatness',
      'snr',
      'headroom',
      'delay',
      'delay-spread',
      'level',
      'response',
      'through',
    ]);
    assert.deepEqual(labelsAt(`${head.replace('capture', 'generate')}    limits:\n      ¦\n`), [
      'image',
      'flatness',
      'snr',
      'headroom',
      'delay',
      'delay-spread',
      'level',
      'response',
      'through',
      'output',
    ]);
    assert.deepEqual(labelsAt('clocks:\n  board:\n    ¦\n'), ['frequency', 'jitter']);
  });

  it('offers nothing in a comment, in a quantity or for a free name', () => {
    assert.deepEqual(labelsAt(`${head}    # ¦\n`), []);
    assert.deepEqual(labelsAt(`${head}    guard: ¦\n`), []);
    assert.deepEqual(labelsAt(`${head}  ¦\n`), []);
    assert.deepEqual(labelsAt(`${head}    title: ¦\n`), []);
  });

  it('says what each means, and which are required', () => {
    const { completions } = at('clocks:\n  board:\n    ¦\n');
    assert.deepEqual(
      completions.map(({ required }) => required),
      [true, false],
    );
    assert.match(completions[1]?.about ?? '', /rms jitter.*Default: 0 s\./);
  });

  it('works between channels, and beside a fault', () => {
    const text = `${head}    ¦\n  gate-y:\n    like: gate-x\n`;
    assert.ok(labelsAt(text).includes('aperture'));
    assert.ok(labelsAt(text.replace('rate: 51.2 kHz', 'rate:51.2 kHz')).includes('aperture'));
  });

  it('never throws, wherever the cursor stands', () => {
    const text = `${head}    unwanted:\n      - { tone: 3 kHz, level: 0 dBFS }\n    limits: { alias: -9`;
    const reading = read(text);
    for (let offset = 0; offset <= text.length; offset++) {
      for (const { span } of completionsAt(reading, offset)) assert.ok(span.start <= offset && offset <= span.end);
    }
  });
});
