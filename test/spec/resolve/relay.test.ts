/** Tests of pulses, gates and time slots: every shape, and what does not fit. */
import assert from 'node:assert/strict';
import { resolveFaults, wholeChannel } from '../tree-of';

const spec = (direction: string, ...keys: readonly string[]) =>
  `channels:\n  x:\n    direction: ${direction}\n    wanted: { band: 0 Hz .. 2 kHz }\n    rate: 10 kHz\n${keys.map((key) => `    ${key}\n`).join('')}`;

const relay = (...keys: readonly string[]) => spec('relay', ...keys);

describe('resolving pulses', () => {
  const pulses: readonly [string, object][] = [
    ['linear', { shape: 'linear' }],
    ['zero-order', { shape: 'rectangle', width: { share: 1 } }],
    ['{ shape: triangle, width: 20 µs }', { shape: 'triangle', width: { seconds: 20e-6 } }],
    ['{ shape: half-sine, width: 50 % }', { shape: 'half-sine', width: { share: 0.5 } }],
    ['{ shape: split, width: 100 % }', { shape: 'split', width: { share: 1 } }],
    ['{ shape: raised-cosine, width: 50 % }', { shape: 'raised-cosine', width: { share: 0.5 }, edge: { share: 0.25 } }],
    [
      '{ shape: raised-cosine, width: 50 %, edge: 5 µs }',
      { shape: 'raised-cosine', width: { share: 0.5 }, edge: { seconds: 5e-6 } },
    ],
    ['{ shape: trapezoid, width: 110 %, edge: 10 % }', { shape: 'trapezoid', width: { share: 1.1 }, edge: { share: 0.1 } }],
    [
      '{ shape: exponential, width: 90 %, decay: 30 µs }',
      { shape: 'exponential', width: { share: 0.9 }, decay: { seconds: 30e-6 } },
    ],
  ];
  for (const [text, expected] of pulses) {
    it(`reads ${text} as a hold`, () => {
      // A split hold passes nothing at 0 Hz, where gains would be measured from.
      assert.deepEqual(wholeChannel(spec('generate', `hold: ${text}`, 'reference: 500 Hz'), 'x').pulse, expected);
    });
  }

  it('reads the same shapes as an aperture', () => {
    const { pulse } = wholeChannel(spec('capture', 'aperture: { shape: triangle, width: 3 ms }'), 'x');
    assert.deepEqual(pulse, { shape: 'triangle', width: { seconds: 3e-3 } });
  });
});

describe('resolving a relay channel', () => {
  it('samples flat-top with a zero-order hold unless it says otherwise', () => {
    const { pulse, gate, slots } = wholeChannel(relay(), 'x');
    assert.deepEqual({ pulse, gate, slots }, { pulse: { shape: 'rectangle', width: { share: 1 } }, gate: null, slots: null });
  });

  it('takes a gate in place of a hold', () => {
    const gateOf = (text: string) => wholeChannel(relay(`gate: ${text}`), 'x').gate;
    assert.deepEqual(gateOf('12 %'), { kind: 'pulse', pulse: { shape: 'rectangle', width: { share: 0.12 } } });
    assert.deepEqual(gateOf('{ track: 40 µs }'), { kind: 'track', track: { seconds: 40e-6 } });
    assert.deepEqual(gateOf('{ shape: triangle, width: 10 % }'), {
      kind: 'pulse',
      pulse: { shape: 'triangle', width: { share: 0.1 } },
    });
    assert.deepEqual(wholeChannel(relay('gate: 12 %'), 'x').pulse, { shape: 'instant' });
  });

  it('gives the guard the rest of the slot', () => {
    // 100 µs by 4 is 25 µs a slot, of which the gate takes 12 µs.
    const { slots } = wholeChannel(relay('gate: 12 %', 'slots: { count: 4, link: 1 MHz }'), 'x');
    assert.ok(slots);
    assert.ok(Math.abs(slots.guardSeconds - 13e-6) < 1e-18);
    assert.deepEqual({ ...slots, guardSeconds: 0 }, { count: 4, guardSeconds: 0, linkHz: 1e6 });
  });

  const faults: readonly [string, readonly string[], readonly string[]][] = [
    ['a gate beside a hold', ['gate: 12 %', 'hold: 50 %'], ['contradiction at hold (key)']],
    ['a gate of more than a period', ['gate: 120 %'], ['out-of-range at gate']],
    ['a track of more than a period', ['gate: { track: 120 µs }'], ['out-of-range at gate.track']],
    ['a gate that passes nothing', ['gate: { shape: split, width: 10 % }'], ['contradiction at gate.shape']],
    ['edges wider than their pulse', ['hold: { shape: trapezoid, width: 10 %, edge: 6 % }'], ['contradiction at hold.edge']],
    ['a pulse wider than its slot', ['gate: 30 %', 'slots: { count: 4, link: 1 MHz }'], ['contradiction at slots.count']],
    [
      'a guard wider than what is left',
      ['gate: 12 %', 'slots: { count: 4, guard: 14 µs, link: 1 MHz }'],
      ['contradiction at slots.guard'],
    ],
    ['a filter of the other directions', ['filter: { bandwidth: 1 kHz }'], ['contradiction at filter (key)']],
    ['bits', ['bits: 12'], ['contradiction at bits (key)']],
  ];
  for (const [title, keys, expected] of faults) {
    it(`finds ${title}`, () => {
      assert.deepEqual(resolveFaults(relay(...keys), 'x'), expected);
    });
  }
});
