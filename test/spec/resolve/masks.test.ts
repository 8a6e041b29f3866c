/** Tests of the limits that came with relay channels: masks in place and by name, the level's range, delays and sums. */
import assert from 'node:assert/strict';
import { resolveFaults, wholeChannel } from '../tree-of';

const named =
  'masks:\n  studio:\n    - { band: 0 Hz .. 5.5 MHz, within: ± 0.05 dB }\n    - { band: 6.75 MHz .. 8 MHz, below: -12 dB, to: -40 dB, along: log }\n    - { band: 8 MHz .., below: -40 dB }\n  dirt:\n    - { band: 8 MHz .., below: -60 dBFS }\n';

const spec = (limits: string, ...keys: readonly string[]) =>
  `${named}channels:\n  x:\n    direction: generate\n    wanted: { band: 0 Hz .. 5.5 MHz }\n    rate: 13.5 MHz\n    limits: ${limits}\n${keys.map((key) => `    ${key}\n`).join('')}`;

describe('resolving masks', () => {
  it('reads a named mask with flat, sloping and endless segments', () => {
    assert.deepEqual(wholeChannel(spec('{ response: studio }'), 'x').masks, [
      {
        key: 'response',
        mask: 'studio',
        ref: null,
        margin: null,
        segments: [
          {
            lowHz: 0,
            highHz: 5.5e6,
            along: 'linear',
            sense: 'within',
            lower: { fromDb: -0.05, toDb: -0.05 },
            upper: { fromDb: 0.05, toDb: 0.05 },
          },
          { lowHz: 6.75e6, highHz: 8e6, along: 'log', sense: 'below', lower: null, upper: { fromDb: -12, toDb: -40 } },
          { lowHz: 8e6, highHz: Infinity, along: 'linear', sense: 'below', lower: null, upper: { fromDb: -40, toDb: -40 } },
        ],
      },
    ]);
  });

  it('reads masks in place and in long form', () => {
    const { masks } = wholeChannel(
      spec('{ through: [ { band: 0 Hz .. 1 MHz, above: -1 dB } ], output: { at: dirt, ref: R-3, margin: 2 dB } }'),
      'x',
    );
    assert.deepEqual(
      masks.map(({ key, mask, ref, margin }) => [key, mask, ref, margin]),
      [
        ['through', null, null, null],
        ['output', 'dirt', 'R-3', 2],
      ],
    );
  });

  it('reads the range of the level in dBFS and in volts', () => {
    assert.deepEqual(wholeChannel(spec('{ level: -3 .. -1 dBFS }'), 'x').levelLimit, {
      lowDb: -3,
      highDb: -1,
      ref: null,
      margin: null,
    });
    // 1 V rms is full scale where that is 2√2 V from peak to peak.
    const { levelLimit } = wholeChannel(spec('{ level: { at: .. 1 V, ref: R-4 } }', `full-scale: ${2 * Math.SQRT2} V`), 'x');
    assert.equal(levelLimit?.lowDb, -Infinity);
    assert.ok(Math.abs(levelLimit.highDb) < 1e-12);
  });

  it('reads delays in seconds, and the sum of aliases', () => {
    const { limits } = wholeChannel(spec('{ delay: 3 µs, delay-spread: { at: 1 µs, margin: 0.2 µs } }'), 'x');
    assert.deepEqual(
      limits.map(({ key, at, unit, margin }) => [key, at, unit, margin]),
      [
        ['delay', 3e-6, 's', null],
        ['delay-spread', 1e-6, 's', 0.2e-6],
      ],
    );
    const captured = spec('{ alias: { sum: -90 dBFS } }').replace('generate', 'capture');
    assert.equal(wholeChannel(captured, 'x').limits[0]?.sum, true);
  });

  const faults: readonly [string, string, readonly string[]][] = [
    ['an unknown mask', '{ response: studo }', ['unknown-name at limits.response']],
    ['a response in dBFS', '{ response: dirt }', ['wrong-unit at limits.response.0.below']],
    ['an output in dB', '{ output: [ { band: 8 MHz .., below: -40 dB } ] }', ['wrong-unit at limits.output.0.below']],
    [
      'a range of gain for the output',
      '{ output: [ { band: 8 MHz .., within: ± 1 dB } ] }',
      ['wrong-unit at limits.output.0.within'],
    ],
    ['a level that runs backwards', '{ level: -1 dBFS .. 2 V }', ['wrong-unit at limits.level']],
    ['the crosstalk of a channel without slots', '{ crosstalk: -60 dB }', ['contradiction at limits.crosstalk (key)']],
  ];
  for (const [title, limits, expected] of faults) {
    it(`finds ${title}`, () => {
      assert.deepEqual(resolveFaults(spec(limits), 'x'), expected);
    });
  }
});
