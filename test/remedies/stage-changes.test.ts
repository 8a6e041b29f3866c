/** Changes of stages, pulses and slots, each on a channel that needs it: what is offered, what the text then says, and that it passes. */
import assert from 'node:assert/strict';
import type { Fix } from '../../src/remedies';
import { after, cured, errorsIn, titles, type Cured } from '../support/cured';

const capture = (parts: { wanted: string; unwanted: string; filter: string; limits: string }): string => `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: ${parts.wanted}, level: -6 dBFS }
    unwanted: ${parts.unwanted}
    rate: 16 kHz
    rate-choices: [16 kHz]
    filter: ${parts.filter}
    limits: ${parts.limits}
`;

const relay = (gate: string, rest: string): string => `bandkeep: 1
channels:
  strain-link:
    direction: relay
    wanted: { band: 0 Hz .. 20 Hz, level: -6 dBFS }
    unwanted: { name: hash, band: 8 kHz .. 1 MHz, level: -50 dBFS }
    rate: 12.5 kHz
    rate-choices: [12.5 kHz]
    gate: ${gate}
${rest}
`;

/** The fix of a kind; everything that is offered must leave a text without an error. */
function fixOf(one: Cured, kind: Fix['kind']): Fix {
  for (const fix of one.cure.fixes) assert.deepEqual(errorsIn(after(one, fix)), [], fix.title);
  const found = one.cure.fixes.find((fix) => fix.kind === kind);
  assert.ok(found !== undefined, `no ${kind} among: ${titles(one).join('\n')}`);
  return found;
}

describe('a corner', () => {
  it('of a high-pass goes down where the wanted band must stay flat', () => {
    const high = cured(
      capture({
        wanted: '100 Hz .. 2 kHz',
        unwanted: '{ name: hum, tone: 50 Hz, level: -20 dBFS }',
        filter: '{ family: butterworth, kind: highpass, order: 2, corner: 60 Hz }',
        limits: '{ flatness: 0.3 dB }',
      }),
      'flatness-over-limit',
    );
    // |H|² = 1/(1 + (fc/f)⁴) at 100 Hz against 447.2 Hz: 0.26 dB for 50 Hz.
    const fix = fixOf(high, 'corner');
    assert.equal(fix.title, 'Lower the corner of the filter to 50 Hz: flatness margin 0.04 dB');
    assert.match(after(high, fix), /corner: 50 Hz \}/);
  });

  it('of a stop band is narrowed from both sides', () => {
    const stop = cured(
      capture({
        wanted: '0 Hz .. 30 Hz',
        unwanted: '{ name: hum, tone: 50 Hz, level: -20 dBFS }',
        filter: '{ family: butterworth, kind: bandstop, order: 1, corners: 30 Hz .. 80 Hz }',
        limits: '{ flatness: 1 dB }',
      }),
      'flatness-over-limit',
    );
    const fix = fixOf(stop, 'corner');
    assert.match(fix.title, /^Narrow the filter to [\d.]+ Hz \.\. [\d.]+ Hz: flatness margin/);
    assert.match(after(stop, fix), /corners: 3\d\.\d+ Hz \.\. [67]\d(\.\d+)? Hz \}/);
  });

  it('stands under the filter that it belongs to in a relay', () => {
    const link = cured(
      relay(
        '12 %',
        `    input-filter: { rc: { r: 18 kΩ, c: 100 nF } }
    output-filter: { family: butterworth, order: 1, corner: 300 Hz }
    limits: { image: -36 dBc, flatness: 0.5 dB }`,
      ),
      'image-over-limit',
    );
    const fix = fixOf(link, 'corner');
    assert.match(fix.title, /^Lower the corner of `output filter` to \d+ Hz: image margin 1 dB/);
    assert.match(after(link, fix), /output-filter: \{ family: butterworth, order: 1, corner: \d+ Hz \}/);
    assert.match(fixOf(link, 'order').title, /^Raise `output filter` to order 2: /);
  });
});

describe('a part', () => {
  it('goes to the next standard value that works, in its own form', () => {
    const parts = cured(
      capture({
        wanted: '0 Hz .. 200 Hz',
        unwanted: '{ name: hash, band: 15 kHz .. 1 MHz, level: -20 dBFS }',
        filter: '[{ rc: { r: 4k7 ± 1 %, c: 22n ± 5 % } }, { rc: { r: 4k7, c: 22n } }]',
        limits: '{ alias: -64 dBFS, flatness: 1 dB }',
      }),
      'alias-over-limit',
    );
    const fix = fixOf(parts, 'part');
    assert.match(fix.title, /^Raise C of stage 1 to 47 nF: alias margin 2\.6 dB/);
    assert.match(after(parts, fix), /\{ rc: \{ r: 4k7 ± 1 %, c: 47n ± 5 % \} \}/);
  });
});

describe('a family', () => {
  it('with a flatter delay is offered for a delay that spreads', () => {
    const spread = cured(
      capture({
        wanted: '0 Hz .. 500 Hz',
        unwanted: '{ name: hash, band: 15 kHz .. 1 MHz, level: -20 dBFS }',
        filter: '{ family: chebyshev, order: 5, corner: 1 kHz, ripple: 0.5 dB }',
        limits: '{ alias: -60 dBFS, delay-spread: 90 us }',
      }),
      'delay-spread-over-limit',
    );
    const fix = fixOf(spread, 'family');
    assert.match(fix.title, /^Make the filter a `butterworth` filter: delay-spread margin \d+(\.\d+)? µs$/);
    assert.match(after(spread, fix), /filter: \{ family: butterworth, order: 5, corner: 1 kHz \}/);
  });

  it('brings the keys that it needs and takes out those that it does not have', () => {
    const steep = cured(
      relay(
        '50 %',
        `    input-filter:
      - family: chebyshev
        ripple: 0.5 dB
        order: 3
        corner-at: ripple
        corner: 26 Hz
    output-filter: { family: butterworth, order: 4, corner: 50 Hz }
    limits: { flatness: 0.4 dB }`,
      ),
      'flatness-over-limit',
    );
    const fix = fixOf(steep, 'family');
    const text = after(steep, fix);
    assert.doesNotMatch(text, /corner-at/);
    assert.match(fix.title, /^Make `input filter` an? `[a-z-]+` filter/);
  });
});

describe('a pulse', () => {
  it('is widened where a wide gate weakens the copies enough', () => {
    const link = cured(
      relay(
        '12 %',
        `    input-filter: { rc: { r: 18 kΩ, c: 100 nF } }
    output-filter: { family: butterworth, order: 1, corner: 300 Hz }
    limits: { image: -36 dBc, flatness: 0.5 dB }`,
      ),
      'image-over-limit',
    );
    const fix = fixOf(link, 'pulse');
    // |c_1|/c_0 = sinc(0.54) is 4.6 dB down, 4.4 dB more than at 12 %; 3.4 dB were missing.
    assert.equal(fix.title, 'Widen the gate to 54 %: image margin 1 dB');
    assert.match(after(link, fix), /gate: 54 %/);
  });

  it('is narrowed where it leaves too little guard between slots, and a stated guard is lengthened', () => {
    const rest = (slots: string): string => `    slots: ${slots}
    output-filter: { family: butterworth, order: 2, corner: 300 Hz }
    limits: { crosstalk: -70 dB, flatness: 1 dB }`;
    // 20·log10(e)·2π·150 kHz·t_g = 71 dB, the limit with a decibel to spare, needs t_g = 8.67 µs of a slot of 20 µs.
    const narrow = cured(relay('18 %', rest('{ count: 4, link: 150 kHz }')), 'crosstalk-over-limit');
    assert.equal(fixOf(narrow, 'pulse').title, 'Narrow the gate to 14 %: crosstalk margin 2 dB');
    const stated = cured(relay('12 %', rest('{ count: 4, guard: 6 us, link: 150 kHz }')), 'crosstalk-over-limit');
    const fix = fixOf(stated, 'guard');
    assert.equal(fix.title, 'Lengthen the guard between the slots to 8.7 µs: crosstalk margin 1.2 dB');
    assert.match(after(stated, fix), /guard: 8\.7 us/);
  });

  it('is split where the wanted copy stands in the second zone', () => {
    const exciter = cured(
      `bandkeep: 1
channels:
  exciter:
    direction: generate
    wanted: { band: 300 MHz .. 450 MHz, level: -6 dBFS }
    rate: 500 MHz
    rate-choices: [500 MHz]
    filter: { family: butterworth, kind: bandpass, order: 3, corners: 260 MHz .. 490 MHz }
    limits: { flatness: 2 dB }
`,
      'flatness-over-limit',
    );
    const split = exciter.cure.fixes.find(({ edits }) => edits.some(({ newText }) => newText.includes('split')));
    assert.ok(split !== undefined, titles(exciter).join('\n'));
    assert.match(split.title, /^Hold each sample for half the period and its negative for the other half: flatness margin/);
    assert.deepEqual(errorsIn(after(exciter, split)), []);
  });
});
