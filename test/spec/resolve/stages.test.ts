/** Tests of resolving stages: every form in plain numbers, with its gain, parts and tolerances. */
import assert from 'node:assert/strict';
import { stagePath } from '../../../src/spec/resolve/stages';
import { family } from '../../support/channel-builder';
import { wholeChannel } from '../tree-of';

const head = 'channels:\n  x:\n    direction: capture\n    wanted: { band: 1 kHz .. 2 kHz }\n    rate: 48 kHz\n';

function stageOf(text: string) {
  const [stage] = wholeChannel(`${head}    filter: ${text}\n`, 'x').stages;
  assert.ok(stage);
  return stage;
}

describe('resolving a stage', () => {
  it('reads a family of every kind, with its corners, ripple and attenuation', () => {
    assert.deepEqual(stageOf('{ family: bessel, order: 4, corner: 3 kHz, corner-at: delay }').form, {
      ...family('bessel', 4, 3000, { cornerAt: 'delay' }),
    });
    assert.deepEqual(
      stageOf(
        '{ family: elliptic, kind: bandpass, order: 3, corners: 4.2 .. 4.5 MHz, corner-at: ripple, ripple: 0.5 dB, attenuation: 60 dB }',
      ).form,
      family('elliptic', 3, 4.2e6, {
        filterKind: 'bandpass',
        upperCornerHz: 4.5e6,
        cornerAt: 'ripple',
        rippleDb: 0.5,
        attenuationDb: 60,
      }),
    );
  });

  it('reads the gain of a family in dB and as a ratio', () => {
    // 20 dB is a factor of ten by definition.
    assert.equal(stageOf('{ family: legendre, order: 3, corner: 3 kHz, gain: 20 dB }').gain, 10);
    assert.equal(stageOf('{ family: legendre, order: 3, corner: 3 kHz, gain: 2.5 V/V }').gain, 2.5);
  });

  it('reads a section by its Q', () => {
    assert.deepEqual(stageOf('{ second-order: { frequency: 50 Hz, q: 12, kind: notch }, tolerance: { q: 5 %, gain: 1 % } }'), {
      name: null,
      label: 'stage 1',
      form: { kind: 'second-order', sectionKind: 'notch', frequencyHz: 50, q: 12 },
      gain: 1,
      parts: [],
      cornerTolerance: { low: 0, high: 0 },
      qTolerance: { low: -0.05, high: 0.05 },
      gainTolerance: { low: -0.01, high: 0.01 },
    });
  });

  it('reads sections in parts, each with its tolerance', () => {
    const rlc = stageOf('{ rlc: { r: 10R, l: 1 mH ± 10 %, c: 100n } }');
    assert.deepEqual(rlc.form, { kind: 'rlc', ohm: 10, henry: 1e-3, farad: 100e-9 });
    assert.deepEqual(
      rlc.parts.map(({ part, tolerance }) => [part, tolerance.high]),
      [
        ['r', 0],
        ['l', 0.1],
        ['c', 0],
      ],
    );
    assert.deepEqual(rlc.cornerTolerance, { low: 0, high: 0 });
    const cr = stageOf('{ cr: { r: 10k ± 1 %, c: 1 µF } }');
    assert.deepEqual(cr.form, { kind: 'cr', ohm: 10000, farad: 1e-6 });
    assert.equal(cr.cornerTolerance.low, 1 / 1.01 - 1);
  });

  it('lists both roots of a pair, and where the gain holds', () => {
    assert.deepEqual(stageOf('{ poles: [ -1200 Hz, -800 ± 600j Hz ], zeros: [ 0 Hz ], gain: 6 V/V, gain-at: 1 kHz }').form, {
      kind: 'roots',
      poles: [
        { re: -1200, im: 0 },
        { re: -800, im: 600 },
        { re: -800, im: -600 },
      ],
      zeros: [{ re: 0, im: 0 }],
      gain: 6,
      gainAtHz: 1000,
    });
  });

  it('says where a stage of a relay channel stands', () => {
    const text =
      'channels:\n  x:\n    direction: relay\n    wanted: { band: 1 kHz .. 2 kHz }\n    rate: 48 kHz\n    input-filter: { bandwidth: 9 kHz }\n    output-filter: [ { bandwidth: 8 kHz }, { name: last, bandwidth: 7 kHz } ]\n';
    const channel = wholeChannel(text, 'x');
    assert.deepEqual(
      channel.stages.map(({ label }) => label),
      ['input filter', 'output filter, stage 1', 'last'],
    );
    assert.deepEqual([channel.inputStages.length, channel.outputStages.length], [1, 2]);
    assert.deepEqual(
      channel.stages.map((_, index) => stagePath(channel, index)),
      [
        ['input-filter', 0],
        ['output-filter', 0],
        ['output-filter', 1],
      ],
    );
  });
});
