/** Tests of resolving channels: defaults, names, `like`, and faults that only show once all parts are in. */
import assert from 'node:assert/strict';
import { resolveFaults, resolveText, wholeChannel } from '../tree-of';

const board = 'clocks:\n  board: { frequency: 24.576 MHz ± 25 ppm, jitter: 3 ps }\n';
const guard =
  'filters:\n  pick-up guard:\n    - { bandwidth: 400 kHz }\n    - { family: butterworth, order: 4, corner: 14 kHz, tolerance: { corner: 4 % } }\n';

/** A spec with one channel `x` of the given keys, beside a clock and a filter. */
const spec = (...keys: readonly string[]) => `${board}${guard}channels:\n  x:\n${keys.map((key) => `    ${key}\n`).join('')}`;

const plain = ['direction: capture', 'wanted: { band: 5 Hz .. 10 kHz }', 'rate: 51.2 kHz'];
const leaving = ['direction: generate', 'wanted: { band: 5 Hz .. 10 kHz }', 'rate: 51.2 kHz'];

describe('resolving a channel', () => {
  it('applies every default', () => {
    assert.deepEqual(wholeChannel(spec(...plain), 'x'), {
      name: 'x',
      direction: 'capture',
      ref: null,
      wanted: [{ name: null, lowHz: 5, highHz: 10000, levelDb: 0 }],
      guardHz: 0,
      levelsAt: 'input',
      // The geometric middle of 5 Hz and 10 kHz is √50000 Hz.
      referenceHz: Math.sqrt(50000),
      unwanted: [],
      protect: null,
      fullScaleVpp: null,
      impedanceOhm: null,
      rate: { hz: 51200, tolerance: { low: 0, high: 0 }, clock: null },
      rateChoices: null,
      pulse: { shape: 'instant' },
      gate: null,
      slots: null,
      stages: [],
      inputStages: [],
      outputStages: [],
      levelLimit: null,
      masks: [],
      testTone: { frequencyHz: 10000, levelDb: 0 },
      jitterSeconds: 0,
      bits: null,
      limits: [],
    });
  });

  it('holds for a whole period in generate, and measures from 0 Hz where the band starts there', () => {
    const channel = wholeChannel(spec('direction: generate', 'wanted: { band: 0 .. 10 kHz }', 'rate: 51.2 kHz'), 'x');
    assert.deepEqual(channel.pulse, { shape: 'rectangle', width: { share: 1 } });
    assert.equal(channel.referenceHz, 0);
  });

  it('takes a rate from its clock, with tolerance and jitter', () => {
    const { rate } = wholeChannel(spec(...plain.slice(0, 2), 'rate: { clock: board, multiply: 2, divide: 480 }'), 'x');
    assert.deepEqual(rate, {
      hz: 102400,
      tolerance: { low: -25e-6, high: 25e-6 },
      clock: { name: 'board', frequencyHz: 24576000, jitterSeconds: 3e-12, multiply: 2, divide: 480 },
    });
  });

  const choices: readonly [string, unknown][] = [
    ['[ 48 kHz, 96 kS/s ]', { kind: 'list', ratesHz: [48000, 96000] }],
    ['40 kHz .. 60 kHz', { kind: 'range', lowHz: 40000, highHz: 60000, stepHz: null }],
    ['40 kHz ..', { kind: 'range', lowHz: 40000, highHz: 1e15, stepHz: null }],
    ['{ range: 40 kHz .. 60 kHz, step: 100 Hz }', { kind: 'range', lowHz: 40000, highHz: 60000, stepHz: 100 }],
  ];
  for (const [text, expected] of choices) {
    it(`reads the rate choices ${text}`, () => {
      assert.deepEqual(wholeChannel(spec(...plain, `rate-choices: ${text}`), 'x').rateChoices, expected);
    });
  }

  it('reads the dividers of a clock as a list, one number or a range', () => {
    const divides = (text: string) => {
      const found = wholeChannel(spec(...plain, `rate-choices: { clock: board, multiply: 4, divide: ${text} }`), 'x').rateChoices;
      assert.equal(found?.kind, 'clock');
      assert.equal(found.clock.multiply, 4);
      return found.divides;
    };
    assert.deepEqual(divides('[ 3, 4 ]'), [3, 4]);
    assert.deepEqual(divides('7'), [7]);
    assert.deepEqual(divides('120 .. 480'), { from: 120, to: 480 });
  });

  it('labels stages by name, by filter and by number', () => {
    const labels = (filter: string) => wholeChannel(spec(...plain, `filter: ${filter}`), 'x').stages.map(({ label }) => label);
    assert.deepEqual(labels('pick-up guard'), ['pick-up guard, stage 1', 'pick-up guard, stage 2']);
    assert.deepEqual(labels('[ { bandwidth: 1 MHz }, { name: input rc, rc: { r: 1k, c: 1n } } ]'), ['stage 1', 'input rc']);
    assert.deepEqual(labels('{ bandwidth: 1 MHz }'), ['stage 1']);
  });

  it('gives an rc stage the corner tolerance of its parts', () => {
    const [stage] = wholeChannel(spec(...plain, 'filter: { rc: { r: 4k7 ± 1 %, c: 2n2 ± 5 % } }'), 'x').stages;
    assert.deepEqual(stage?.form, { kind: 'rc', ohm: 4700, farad: 2.2e-9 });
    assert.equal(stage.cornerTolerance.low, 1 / (1.01 * 1.05) - 1);
    assert.equal(stage.cornerTolerance.high, 1 / (0.99 * 0.95) - 1);
  });

  it('names unwanted sources that have no name of their own', () => {
    const sources = wholeChannel(
      spec(
        ...plain,
        'unwanted: [ { tone: 310 kHz ± 10 %, level: -24 dBFS }, { band: 40 kHz .. 3 MHz, level: 0 }, { band: 40 kHz .., level: 0 }, anything ]',
      ),
      'x',
    ).unwanted;
    assert.deepEqual(
      sources.map(({ name }) => name),
      ['tone at 310 kHz', 'band from 40 kHz to 3 MHz', 'band from 40 kHz up', 'anything'],
    );
    assert.deepEqual(sources[3], { kind: 'anything', name: 'anything', ref: null, enters: 'input', levelDb: 0 });
  });

  it('brings limits in short and long form to one form', () => {
    const { limits } = wholeChannel(
      spec(
        ...plain,
        'limits: { alias: -60 dBc, flatness: { at: 0.8 dB, ref: R-7, margin: 0.1 dB }, snr: { at: 84 dB, with: unwanted } }',
      ),
      'x',
    );
    assert.deepEqual(limits, [
      { key: 'alias', at: -60, unit: 'dBc', ref: null, margin: null, withUnwanted: false, sum: false },
      { key: 'flatness', at: 0.8, unit: 'dB', ref: 'R-7', margin: 0.1, withUnwanted: false, sum: false },
      { key: 'snr', at: 84, unit: 'dB', ref: null, margin: null, withUnwanted: true, sum: false },
    ]);
  });

  it('lets a channel be like another, key by key', () => {
    const text = `${spec(...plain, 'bits: 16', 'limits: { flatness: 1 dB }')}  y:\n    like: x\n    rate: 96 kHz\n    limits: { headroom: 3 dB }\n`;
    const like = wholeChannel(text, 'y');
    assert.equal(like.name, 'y');
    assert.equal(like.bits, 16);
    assert.equal(like.rate.hz, 96000);
    assert.deepEqual(
      like.limits.map(({ key }) => key),
      ['headroom'],
    );
    assert.deepEqual(resolveText(text, 'y').uses, [{ space: 'channels', name: 'x' }]);
  });

  const faults: readonly [string, readonly string[], readonly string[]][] = [
    ['an unknown clock', [...plain.slice(0, 2), 'rate: { clock: bord, divide: 3 }'], ['unknown-name at rate.clock']],
    ['an unknown filter', [...plain, 'filter: pickup guard'], ['unknown-name at filter']],
    ['volts without full scale', [...plain, 'unwanted: { tone: 60 kHz, level: 3 mV }'], ['wrong-unit at unwanted.0.level']],
    ['dBm without impedance', [...plain, 'full-scale: 2 V', 'test-tone: { level: -3 dBm }'], ['wrong-unit at test-tone.level']],
    ['a reference outside the band', [...plain, 'reference: 20 kHz'], ['out-of-range at reference']],
    ['a hold in capture', [...plain, 'hold: 50 %'], ['contradiction at hold (key)']],
    ['an aperture in generate', [...leaving, 'aperture: 50 %'], ['contradiction at aperture (key)']],
    ['an alias limit in generate', [...leaving, 'limits: { alias: -60 dBFS }'], ['contradiction at limits.alias (key)']],
    ['a source in generate', [...leaving, 'unwanted: anything'], ['contradiction at unwanted (key)']],
    ['a hold of more than two periods', [...leaving, 'hold: 40 µs'], ['out-of-range at hold']],
    ['a full scale of nothing', [...plain, 'full-scale: 5 V .. 5 V'], ['out-of-range at full-scale']],
    [
      'two sources of one name',
      [...plain, 'unwanted: [ { name: a, tone: 60 kHz, level: 0 }, { name: a, tone: 70 kHz, level: 0 } ]'],
      ['duplicate-name at unwanted.1.name'],
    ],
    [
      'steps beyond counting',
      [...plain, 'rate-choices: { range: 1 Hz .. 1 GHz, step: 1 mHz }'],
      ['out-of-range at rate-choices.step'],
    ],
    ['`like` of nothing', [...plain, 'like: z'], ['unknown-name at like']],
    ['`like` of itself', [...plain, 'like: x'], ['contradiction at like']],
    [
      'several at once',
      ['direction: capture', 'wanted: { band: 5 Hz .. 1 kHz, level: 1 V }', 'rate: { clock: z }', 'filter: z', 'hold: 1 s'],
      ['contradiction at hold (key)', 'wrong-unit at wanted.0.level', 'unknown-name at rate.clock', 'unknown-name at filter'],
    ],
  ];
  for (const [title, keys, expected] of faults) {
    it(`finds ${title}`, () => {
      assert.deepEqual(resolveFaults(spec(...keys), 'x'), expected);
      assert.equal(resolveText(spec(...keys), 'x').channel, null);
    });
  }

  it('offers the nearest name', () => {
    assert.deepEqual(resolveText(spec(...plain, 'filter: pickup guard'), 'x').problems[0]?.cures, [
      { title: 'Write it as `pick-up guard`', newText: 'pick-up guard' },
    ]);
  });

  it('does not repeat a fault of the text as another one', () => {
    assert.deepEqual(resolveFaults(spec(...plain, 'full-scale: 4 Volt', 'unwanted: { tone: 60 kHz, level: 1 V }'), 'x'), []);
    assert.deepEqual(resolveFaults(spec(...plain, 'filter: { name: pick-up }'), 'x'), []);
  });

  describe('with `like`', () => {
    const two = (first: readonly string[], ...second: readonly string[]) =>
      `${spec(...first)}  y:\n${second.map((key) => `    ${key}\n`).join('')}`;

    it('reports a circle in every channel on it, and not in one that only leads there', () => {
      const text = `${board}channels:\n  a: { like: b }\n  b: { like: a }\n  c: { like: b }\n`;
      assert.deepEqual(resolveFaults(text, 'a'), ['contradiction at like']);
      assert.deepEqual(resolveFaults(text, 'b'), ['contradiction at like']);
      assert.deepEqual(resolveFaults(text, 'c'), []);
      assert.equal(resolveText(text, 'c').channel, null);
    });

    it('leaves a fault of the other channel to that channel', () => {
      const text = two([...plain, 'filter: nonsense'], 'like: x');
      assert.deepEqual(resolveFaults(text, 'y'), []);
      assert.equal(resolveText(text, 'y').channel, null);
    });

    it('reports at `like` what only the combination makes wrong', () => {
      const text = two(
        [...plain, 'aperture: 300 ns', 'reference: 9 kHz'],
        'like: x',
        'direction: generate',
        'wanted: { band: 5 Hz .. 1 kHz }',
      );
      assert.deepEqual(resolveFaults(text, 'y'), ['contradiction at like', 'out-of-range at like']);
      assert.match(resolveText(text, 'y').problems[0]?.message ?? '', /`aperture` comes from `x`/);
    });

    it('misses a required key that neither has', () => {
      const text = `channels:\n  x: { direction: capture, rate: 9 kHz }\n  y: { like: x }\n`;
      assert.deepEqual(resolveFaults(text, 'y'), ['missing-key at  (key)']);
    });

    it('follows a long chain, and refuses an endless one', () => {
      const chain = (length: number) =>
        `${spec(...plain)}${Array.from({ length }, (_, index) => `  c${index}: { like: ${index === 0 ? 'x' : `c${index - 1}`} }\n`).join('')}`;
      assert.equal(wholeChannel(chain(90), 'c89').rate.hz, 51200);
      assert.deepEqual(resolveFaults(chain(300), 'c250'), ['out-of-range at like']);
    });
  });
});
