/** Gains cannot be measured from a frequency at which a stage lets nothing through. */
import assert from 'node:assert/strict';
import { read } from '../../../src/spec';

const problemsOf = (filter: string, rest = '', wanted = '0 Hz .. 1 kHz') => {
  const text = `bandkeep: 1
channels:
  lock-gauge:
    direction: capture
    wanted: { band: ${wanted} }
    rate: 10 kHz
    filter: ${filter}
${rest}`;
  return read(text).problems.map(({ code, message, span }) => ({ code, message, at: text.slice(span.start, span.end) }));
};

describe('the reference and the nulls of stages', () => {
  for (const [title, filter] of [
    ['a cr section', '{ cr: { r: 10k, c: 1 µF } }'],
    ['a high-pass', '{ family: bessel, order: 2, corner: 20 Hz, kind: highpass }'],
    [
      'a band-pass of odd order with nulls in its stop band',
      '{ family: elliptic, order: 3, corners: 20 Hz .. 2 kHz, kind: bandpass, ripple: 1 dB, attenuation: 40 dB }',
    ],
    ['a resonance', '{ second-order: { frequency: 100 Hz, q: 1, kind: bandpass } }'],
    ['a zero at 0 Hz', '{ poles: [-10 Hz], zeros: [0 Hz], gain: 1 V/V, gain-at: 1 kHz }'],
  ] as const) {
    it(`asks for another reference where the band begins at the null of ${title}`, () => {
      const [problem, ...others] = problemsOf(filter);
      assert.deepEqual(others, []);
      assert.equal(problem?.code, 'contradiction');
      assert.equal(problem.at, '0 Hz .. 1 kHz');
      assert.match(problem.message, /measured from 0 Hz, where `stage 1` lets nothing through: state a `reference`/);
      assert.deepEqual(problemsOf(filter, '    reference: 500 Hz\n'), []);
    });
  }

  it('points at a stated reference that sits on a notch', () => {
    const notch = '[{ bandwidth: 9 kHz }, { name: hum trap, second-order: { frequency: 50 Hz, q: 5, kind: notch } }]';
    const [problem] = problemsOf(notch, '    reference: 50 Hz\n');
    assert.equal(problem?.at, '50 Hz');
    assert.match(problem.message, /`reference` is 50 Hz, where `hum trap` lets nothing through/);
    assert.deepEqual(problemsOf(notch), []);
  });

  it('knows the middle of a band-stop, which a band named by its edges has as its reference', () => {
    const stop = (order: number) =>
      `{ family: inverse-chebyshev, order: ${order}, corners: 100 Hz .. 900 Hz, kind: bandstop, attenuation: 40 dB }`;
    assert.equal(problemsOf(stop(3), '', '100 Hz .. 900 Hz')[0]?.code, 'contradiction');
    // Of an even order the stop band ends at its attenuation, in the middle too.
    assert.deepEqual(problemsOf(stop(4), '', '100 Hz .. 900 Hz'), []);
  });

  it('lets even orders with a finite stop band be measured from 0 Hz', () => {
    const high = '{ family: elliptic, order: 4, corner: 20 Hz, kind: highpass, ripple: 1 dB, attenuation: 40 dB }';
    assert.deepEqual(problemsOf(high), []);
  });
});
