/** Tests of walking a tree along the declaration: every fault at its own place, and nothing ignored. */
import assert from 'node:assert/strict';
import { channel } from '../../src/spec/declaration/channel';
import { clocks } from '../../src/spec/declaration/clock';
import { limits } from '../../src/spec/declaration/limits';
import { masks } from '../../src/spec/declaration/mask';
import { gate, hold } from '../../src/spec/declaration/pulse';
import { rateChoices } from '../../src/spec/declaration/rate';
import { unwanted } from '../../src/spec/declaration/source';
import { filter, filters } from '../../src/spec/declaration/stage';
import { declaration } from '../../src/spec/declaration/top-level';
import { wanted } from '../../src/spec/declaration/wanted';
import type { Shape } from '../../src/spec/shape';
import { decodeText, faultsOf } from './tree-of';

describe('decoding along the declaration', () => {
  it('reads a whole spec without a fault', () => {
    const text = `
bandkeep: 1
title: Sluice gate 3
clocks:
  board: { frequency: 24.576 MHz ± 25 ppm, jitter: 3 ps }
filters:
  guard:
    - { bandwidth: 400 kHz }
    - { family: butterworth, order: 4, corner: 14 kHz, tolerance: { corner: 4 % } }
    - { rc: { r: 4k7 ± 1 %, c: 2n2 ± 5 % } }
    - { family: chebyshev, order: 5, corner: 14 kHz, ripple: 0.1 dB, corner-at: ripple, name: steep }
channels:
  bearing-x:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted:
      - { name: switcher, tone: 310 kHz ± 10 %, level: -24 dBFS }
      - { band: 40 kHz .., level: -55 dBFS, ref: 4.10 }
      - anything
      - { anything: -20 dBFS }
    full-scale: 4 V
    rate: { clock: board, divide: 480 }
    rate-choices: { clock: board, divide: 120 .. 480 }
    aperture: 300 ns
    filter: guard
    bits: 16
    limits: { alias: -96 dBFS, flatness: { at: 0.8 dB, ref: R-7, margin: 0.1 dB }, snr: { at: 84 dB, with: unwanted } }
`;
    assert.deepEqual(faultsOf(declaration, text), []);
  });

  it('keeps the source text of a reference and of a name', () => {
    const { value } = decodeText(wanted, '{ name: 3, band: 1 kHz .. 2 kHz, level: 0 }');
    assert.deepEqual(value, {
      name: '3',
      band: { low: { value: 1000, unit: 'Hz' }, high: { value: 2000, unit: 'Hz' } },
      level: { value: 0, unit: 'dBFS' },
    });
    const source = decodeText(unwanted, '{ tone: 1 kHz, level: 0 dBFS, ref: 4.10 }').value;
    assert.equal((source as { ref: string }).ref, '4.10');
  });

  const faults: readonly [string, Shape<unknown>, string, readonly string[]][] = [
    ['an unknown key', wanted, '{ bnad: 5 Hz .. 1 kHz }', ['unknown-key: bnad', 'missing-key: ']],
    ['a missing key', wanted, '{ level: 0 dBFS }', ['missing-key: ']],
    ['a key twice', wanted, '{ band: 5 Hz .. 1 kHz, band: 5 Hz .. 2 kHz }', ['duplicate-name: band']],
    ['a key without a value', wanted, '{ band: 5 Hz .. 1 kHz, level: }', ['missing-key: level']],
    ['a wrong unit', wanted, '{ band: 5 Hz .. 1 kHz, level: 3 ms }', ['wrong-unit: 3 ms']],
    ['no quantity', wanted, '{ band: low .. high }', ['not-a-quantity: low .. high']],
    ['a bare number', filter, '{ bandwidth: 400000 }', ['not-a-quantity: 400000']],
    ['a value out of range', filter, '{ bandwidth: 1e300 Hz }', ['out-of-range: 1e300 Hz']],
    ['a negative frequency', filter, '{ bandwidth: -5 Hz }', ['out-of-range: -5 Hz']],
    ['a zero where none can be', filter, '{ bandwidth: 0 }', ['out-of-range: 0']],
    ['an absurd order', filter, '{ family: butterworth, order: 1000000000, corner: 1 kHz }', ['out-of-range: 1000000000']],
    ['an order that is no whole number', filter, '{ family: butterworth, order: 4.5, corner: 1 kHz }', ['not-a-quantity: 4.5']],
    ['an unknown family', filter, '{ family: butterwort, order: 4, corner: 1 kHz }', ['unknown-name: butterwort']],
    [
      'a family without its attenuation',
      filter,
      '{ family: elliptic, order: 4, corner: 1 kHz, ripple: 1 dB }',
      ['missing-key: '],
    ],
    [
      'a band-pass with one corner',
      filter,
      '{ family: bessel, kind: bandpass, order: 2, corner: 1 kHz }',
      ['contradiction: corner', 'missing-key: '],
    ],
    [
      'a low-pass with two',
      filter,
      '{ family: bessel, order: 2, corners: 1 kHz .. 2 kHz }',
      ['contradiction: corners', 'missing-key: '],
    ],
    [
      'a lower corner left out',
      filter,
      '{ family: bessel, kind: bandpass, order: 2, corners: .. 2 kHz }',
      ['contradiction: .. 2 kHz'],
    ],
    [
      'a ripple that the family has not',
      filter,
      '{ family: bessel, order: 2, corner: 1 kHz, ripple: 1 dB }',
      ['contradiction: ripple'],
    ],
    [
      'a corner at a ripple that is not',
      filter,
      '{ family: legendre, order: 2, corner: 1 kHz, corner-at: ripple }',
      ['contradiction: ripple'],
    ],
    [
      'a corner at a delay that is not',
      filter,
      '{ family: gaussian, order: 2, corner: 1 kHz, corner-at: delay }',
      ['contradiction: delay'],
    ],
    [
      'the delay of a high-pass',
      filter,
      '{ family: bessel, kind: highpass, order: 2, corner: 1 kHz, corner-at: delay }',
      ['contradiction: delay'],
    ],
    [
      'a stop band above the ripple',
      filter,
      '{ family: elliptic, order: 2, corner: 1 kHz, corner-at: ripple, ripple: 3 dB, attenuation: 2 dB }',
      ['contradiction: 2 dB'],
    ],
    [
      'a stop band above half power',
      filter,
      '{ family: inverse-chebyshev, order: 2, corner: 1 kHz, attenuation: 2 dB }',
      ['contradiction: 2 dB'],
    ],
    ['a Q with a unit', filter, '{ second-order: { frequency: 1 kHz, q: 0.7 dB } }', ['not-a-quantity: 0.7 dB']],
    ['a Q with a decimal comma', filter, '{ second-order: { frequency: 1 kHz, q: "0,7" } }', ['not-a-quantity: "0,7"']],
    ['a coil without its capacitor', filter, '{ rlc: { r: 10R, l: 1 mH } }', ['missing-key: rlc']],
    ['a pole that does not decay', filter, '{ poles: [ 800 ± 600j Hz ] }', ['out-of-range: 800 ± 600j Hz']],
    ['a pole at 0 Hz', filter, '{ poles: [ 0 Hz ] }', ['out-of-range: 0 Hz']],
    ['a pole without its conjugate', filter, '{ poles: [ -800 + 600j Hz ] }', ['not-a-quantity: -800 + 600j Hz']],
    ['more zeros than poles', filter, '{ poles: [ -1 kHz ], zeros: [ ± 50j Hz ] }', ['contradiction: [ ± 50j Hz ]']],
    ['a zero at 0 Hz without `gain-at`', filter, '{ poles: [ -1 kHz ], zeros: [ 0 Hz ] }', ['contradiction: [ 0 Hz ]']],
    ['a gain at a zero', filter, '{ poles: [ -1 ± 50j Hz ], zeros: [ ± 50j Hz ], gain-at: 50 Hz }', ['contradiction: 50 Hz']],
    ['zeros alone', filter, '{ bandwidth: 1 kHz, zeros: [ 0 Hz ] }', ['contradiction: zeros']],
    ['a load without its source', filter, '{ measured: a.s2p, load: 50 ohm }', ['missing-key: ']],
    ['a Q that a table cannot have', filter, '{ measured: a.csv, tolerance: { q: 5 % } }', ['contradiction: { q: 5 % }']],
    ['a slope in plain dB', filter, '{ measured: a.csv, beyond: -40 dB }', ['wrong-unit: -40 dB']],
    ['a gain of a section', filter, '{ bandwidth: 1 kHz, gain: 6 dB }', ['contradiction: gain']],
    ['a trapezoid without edges', hold, '{ shape: trapezoid, width: 50 % }', ['missing-key: ']],
    ['a rectangle with edges', hold, '{ shape: rectangle, width: 50 %, edge: 5 % }', ['contradiction: edge']],
    ['an exponential without decay', hold, '{ shape: exponential, width: 50 % }', ['missing-key: ']],
    ['a gate that tracks and has a shape', gate, '{ track: 50 %, shape: triangle, width: 50 % }', ['contradiction: shape']],
    ['a gate that is held', gate, 'zero-order', ['not-a-quantity: zero-order']],
    [
      'a mask segment of two kinds',
      masks,
      'a: [ { band: 1 kHz .. 2 kHz, below: -3 dB, above: -6 dB } ]',
      ['contradiction: above'],
    ],
    [
      'a mask segment that slopes to nowhere',
      masks,
      'a: [ { band: 1 kHz .., below: -3 dB, to: -6 dB } ]',
      ['contradiction: -6 dB'],
    ],
    [
      'a slope over the logarithm of zero',
      masks,
      'a: [ { band: 0 Hz .. 1 kHz, below: -3 dB, to: -6 dB, along: log } ]',
      ['contradiction: log'],
    ],
    ['a slope of a range', masks, 'a: [ { band: 0 Hz .. 1 kHz, within: ± 1 dB, to: -6 dB } ]', ['contradiction: to']],
    ['a stage that comes later', filter, '{ ladder: [], source: 50 ohm, load: 50 ohm }', ['unknown-key: ladder']],
    ['a stage of no kind', filter, '{ order: 4, corner: 1 kHz }', ['missing-key: ']],
    [
      'a stage of two kinds',
      filter,
      '{ family: butterworth, order: 4, corner: 1 kHz, bandwidth: 1 kHz }',
      ['contradiction: bandwidth'],
    ],
    [
      'what goes with another family',
      filter,
      '{ family: butterworth, order: 4, corner: 1 kHz, ripple: 1 dB }',
      ['contradiction: ripple'],
    ],
    [
      'a name that looks like a family',
      filter,
      '{ name: chebyshev, family: butterworth, order: 4, corner: 1 kHz, ripple: 1 dB }',
      ['contradiction: ripple'],
    ],
    ['a missing ripple', filter, '{ family: chebyshev, order: 4, corner: 1 kHz }', ['missing-key: ']],
    [
      'a ripple corner without ripple',
      filter,
      '{ family: butterworth, order: 4, corner: 1 kHz, corner-at: ripple }',
      ['contradiction: ripple'],
    ],
    [
      'half power inside the ripple',
      filter,
      '{ family: chebyshev, order: 4, corner: 1 kHz, ripple: 4 dB }',
      ['contradiction: 4 dB'],
    ],
    ['a tolerance where none can be', filter, '{ bandwidth: 14 kHz ± 4 % }', ['not-a-quantity: 14 kHz ± 4 %']],
    ['a tolerance beside parts', filter, '{ rc: { r: 1k, c: 1n }, tolerance: { corner: 4 % } }', ['contradiction: tolerance']],
    ['a part of the wrong kind', filter, '{ rc: { r: 2.2 nF, c: 1n } }', ['wrong-unit: 2.2 nF']],
    ['a list item that is empty', filter, '[ { bandwidth: 1 kHz }, ~ ]', ['syntax: ~']],
    [
      'faults of several items',
      filter,
      '[ { bandwidth: 1 khz }, { bandwidth: 2 }, { bandwith: 1 kHz } ]',
      ['wrong-unit: 1 khz', 'not-a-quantity: 2', 'unknown-key: bandwith', 'missing-key: { bandwith: 1 kHz }'],
    ],
    ['a range that runs backwards', wanted, '{ band: 10 kHz .. 5 Hz }', ['out-of-range: 10 kHz .. 5 Hz']],
    ['a wanted band without an end', wanted, '{ band: 5 kHz .. }', ['out-of-range: 5 kHz ..']],
    ['a band below zero', wanted, '{ band: 1 kHz ± 2 kHz }', ['out-of-range: 1 kHz ± 2 kHz']],
    ['an empty list of wanted bands', wanted, '[]', ['missing-key: []']],
    ['a source of no kind', unwanted, '{ level: 0 dBFS }', ['missing-key: ']],
    ['a source without a level', unwanted, '{ tone: 3 kHz }', ['missing-key: ']],
    ['a source of two kinds', unwanted, '{ tone: 3 kHz, band: 1 kHz .. 2 kHz, level: 0 dBFS }', ['contradiction: band']],
    ['a noise, which comes later', unwanted, '{ noise: 40 nV/√Hz, level: 0 dBFS }', ['unknown-key: noise']],
    ['a first harmonic', unwanted, '{ tone: 1 kHz, level: 0 dBFS, harmonics: 1 }', ['out-of-range: 1']],
    ['harmonics of anything', unwanted, '{ anything: 0 dBFS, harmonics: 3 }', ['contradiction: harmonics']],
    [
      'harmonics without an end',
      unwanted,
      '{ tone: 1 kHz, level: 0 dBFS, harmonics: { odd: true } }',
      ['missing-key: harmonics'],
    ],
    ['a level of a spectrum', unwanted, '{ spectrum: a.csv, level: 0 dBFS }', ['contradiction: level']],
    ['a level both ways', unwanted, '{ anything: 0 dBFS, level: 0 dBFS }', ['contradiction: level']],
    ['a dBc where it cannot be', unwanted, '{ tone: 1 kHz, level: -3 dBc }', ['wrong-unit: -3 dBc']],
    ['a limit in volts', limits, '{ alias: 3 mV }', ['wrong-unit: 3 mV']],
    ['a limit in plain dB', limits, '{ alias: -96 dB }', ['wrong-unit: -96 dB']],
    ['a limit that comes later', limits, '{ sinad: 80 dB }', ['unknown-key: sinad']],
    ['a limit and a sum', limits, '{ alias: { at: -96 dBFS, sum: -90 dBFS } }', ['contradiction: sum']],
    ['a delay in dB', limits, '{ delay: 3 dB }', ['wrong-unit: 3 dB']],
    ['a level that is no range', limits, '{ level: -3 dBFS }', ['not-a-quantity: -3 dBFS']],
    [
      'a mask that is a segment',
      limits,
      '{ response: { band: 0 Hz .. 1 kHz, within: ± 1 dB } }',
      ['unknown-key: band', 'unknown-key: within', 'missing-key: response'],
    ],
    ['a mask without segments', limits, '{ response: [] }', ['missing-key: []']],
    ['a long limit without a value', limits, '{ flatness: { ref: R-1 } }', ['missing-key: flatness']],
    ['a negative flatness', limits, '{ flatness: -0.5 dB }', ['out-of-range: -0.5 dB']],
    ['a list where a value is needed', limits, '{ flatness: [ 1 dB ] }', ['not-a-quantity: [ 1 dB ]']],
    ['dividers that run backwards', rateChoices, '{ clock: board, divide: 480 .. 120 }', ['out-of-range: 480 .. 120']],
    ['a step without a range', rateChoices, '{ clock: board, divide: 3, step: 1 kHz }', ['contradiction: step']],
    ['a divider of zero', rateChoices, '{ clock: board, divide: [ 0, 2 ] }', ['out-of-range: 0']],
    ['a clock without a frequency', clocks, 'board: { jitter: 3 ps }', ['missing-key: board']],
    [
      'a key of another language',
      channel,
      '{ direction: capture, wanted: { band: 1 kHz .. 2 kHz }, rate: 9 kHz, constructor: 1 }',
      ['unknown-key: constructor'],
    ],
    ['keys that `like` may bring', channel, '{ like: other }', []],
    ['the same keys without `like`', channel, '{}', ['missing-key: ', 'missing-key: ', 'missing-key: ']],
  ];
  for (const [title, shape, text, expected] of faults) {
    it(`finds ${title}`, () => {
      assert.deepEqual(faultsOf(shape, text), expected);
    });
  }

  it('says "not supported yet" of what comes later', () => {
    for (const text of ['{ sallen-key: { r1: 1k } }', '{ ladder: [] }', '{ bandwidth: 1 kHz, noise: 1 nV/√Hz }']) {
      assert.match(decodeText(filter, text).problems[0]?.message ?? '', /not supported yet/);
    }
  });

  it('explains why there is no first-order hold', () => {
    assert.match(decodeText(hold, 'first-order').problems[0]?.message ?? '', /names two holds.*`linear`/);
  });

  it('offers the nearest key and word, and a unit for a bare number', () => {
    const cures = (shape: Shape<unknown>, text: string) =>
      decodeText(shape, text).problems.flatMap((problem) => problem.cures.map(({ title }) => title));
    assert.deepEqual(cures(filter, '{ bandwith: 1 kHz, bandwidth: 2 kHz }'), ['Write it as `bandwidth`']);
    assert.deepEqual(cures(filter, '{ family: Butterworth, order: 2, corner: 1 kHz }'), ['Write it as `butterworth`']);
    assert.deepEqual(cures(filter, '{ bandwidth: 400 }')[0], 'Write it as `400 Hz`');
    assert.deepEqual(cures(wanted, '5 Hz .. 10 kHz'), ['Write it as `{ band: 5 Hz .. 10 kHz }`']);
    assert.deepEqual(cures(channel, '{ like: a, bits: 16 bit }'), ['Write it as `16`']);
    const [cure] = decodeText(filter, '{ bandwidth: 1 khz }').problems[0]?.cures ?? [];
    assert.deepEqual(cure?.edits, [{ span: { start: 13, end: 18 }, newText: '1 kHz' }]);
  });

  it('gives null for what is faulty and nothing for what is absent', () => {
    const { value } = decodeText(wanted, '[ { band: nonsense, level: 0 dBFS }, { band: 1 kHz .. 2 kHz } ]');
    assert.deepEqual(value, [
      { band: null, level: { value: 0, unit: 'dBFS' } },
      { band: { low: { value: 1000, unit: 'Hz' }, high: { value: 2000, unit: 'Hz' } } },
    ]);
    const named = decodeText(filters, 'good: { bandwidth: 1 kHz }\nbad: { bandwidth: 1 khz }').value;
    assert.equal(named?.get('bad'), null);
    assert.deepEqual(named.get('good'), { bandwidth: { value: 1000, unit: 'Hz' } });
  });
});
