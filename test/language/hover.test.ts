/** Hovers: one test a kind of place, with the numbers that a reader can check by hand. */
import assert from 'node:assert/strict';
import { hover } from '../../src/language';
import { ableEditor, expectHover, hoverAt, opened, plainAbilities } from '../support/language-document';
import { passingSpec } from '../support/spec-texts';

/** The passing spec with the cursor before some words. */
const at = (words: string): string => {
  assert.ok(passingSpec.includes(words), words);
  return passingSpec.replace(words, `¦${words}`);
};

const sounder = `bandkeep: 1
channels:
  sounder:
    direction: generate
    wanted: { band: 40 kHz .. 60 kHz, level: -1 dBFS }
    rate: 500 kHz
    hold: zero-order
    filter: { family: butterworth, order: 5, corner: 95 kHz }
    limits: { image: -60 dBc }
`;

describe('the hover of', () => {
  it('a source says where it lands and how it stands', () => {
    // 40 kHz .. 3 MHz at 64 kS/s: what lands in 5 Hz .. 10 kHz begins at 64 − 10 = 54 kHz.
    expectHover(at('drive hash'), {
      headline: /^`drive hash` lands on 10 kHz at −.* dBFS, .* inside the limit$/,
      rows: { 'strongest from': '54 kHz', fold: '1, inverted', limit: '−96 dBFS' },
    });
  });

  it('a tone that lands outside says how far it may drift', () => {
    // At 64 kS/s 80 kHz lands on 16 kHz; 5 Hz .. 10 kHz is reached from 54 .. 63.995, 64.005 .. 74 and 118 kHz on.
    const tone = passingSpec.replace('band: 40 kHz .. 3 MHz', '¦tone: 80 kHz');
    expectHover(tone, {
      headline: '`drive hash` lands in no protected range',
      rows: { 'may drift before it lands inside': '6 kHz down, 38 kHz up' },
    });
  });

  it('a tone that lands inside names the nearest frequencies that do not', () => {
    const tone = passingSpec.replace('band: 40 kHz .. 3 MHz', '¦tone: 70 kHz');
    expectHover(tone, {
      headline: /^`drive hash` lands on 6 kHz/,
      rows: { 'nearest frequencies that land outside': /and 74 kHz$/ },
    });
  });

  it('a wanted band says where it appears and what its edges lose', () => {
    expectHover(at('5 Hz .. 10 kHz'), {
      headline: '5 Hz .. 10 kHz appears at 5 Hz .. 10 kHz, upright',
      rows: { zone: '1, each 32 kHz wide', 'at 10 kHz': /^−3\.\d dBFS, droop 0\.\d\d dB$/ },
    });
  });

  it('a rate says what it makes of the band, and which other rates pass', () => {
    // 24.576 MHz / 384 = 64 kHz; a band up to 10 kHz stays whole from 20 kHz.
    expectHover(at('{ clock: board, divide: 384 }'), {
      headline: '64 kHz: half rate 32 kHz, the wanted band in zone 1',
      rows: {
        from: '`board`, 24.58 MHz ÷384',
        'keeps the band whole': '20 kHz and more',
        'room below': '44 kHz (687,500 ppm)',
        'next allowed rates that pass': /76\.8 kHz/,
      },
    });
  });

  it('a rate that generates names the first copies', () => {
    expectHover(sounder.replace('500 kHz', '¦500 kHz'), {
      headline: '500 kHz: half rate 250 kHz, the wanted band in zone 1',
      rows: { 'first copies': '440 kHz .. 460 kHz and 540 kHz .. 560 kHz' },
    });
  });

  it('a filter name in a channel answers for the filter', () => {
    // 20·log10 √(1 + (32/14)^8) = 28.7 dB for order 4.
    expectHover(at('guard\n    bits'), { headline: /28\.7 dB loss at half the rate, 32 kHz$/ });
  });

  it('a stage gives its half-power point and the f₀ and Q of its sections', () => {
    // Butterworth of order 4: Q = 1/(2·cos θ) with θ = 22.5° and 67.5°.
    expectHover(at('butterworth'), {
      headline: /^`.*`: 28\.7 dB loss at half the rate/,
      rows: {
        'half power at': '14 kHz',
        'loss at the first fold': /^46\.9 dB at 54 kHz$/,
        'section 1': /^f₀ 14 kHz, Q (1\.307|0\.5412)$/,
      },
    });
  });

  it('an aperture gives its loss at the edges of the band and its nulls', () => {
    // −20·log10(sinc(10 kHz · 300 ns)) = 0.00013 dB.
    expectHover(at('300 ns'), {
      headline: '300 ns: 0.00013 dB loss at 10 kHz',
      rows: { 'passes nothing at': '3.333 MHz, 6.667 MHz, 10 MHz' },
    });
  });

  it('a zero-order hold gives its loss at the output frequency', () => {
    // −20·log10(sinc(60/500)) = 0.206 dB, from the rectangle's |sinc(f·T)|.
    expectHover(sounder.replace('zero-order', '¦zero-order'), {
      headline: '2 µs: 0.21 dB loss at 60 kHz',
      rows: { 'share of the period': '100 %', 'passes nothing at': '500 kHz, 1 MHz, 1.5 MHz' },
    });
  });

  it('a limit says how it stands and what contributes', () => {
    expectHover(at('-96 dBFS'), {
      headline: /^`alias` −.* dBFS, .* inside the limit$/,
      rows: { limit: '−96 dBFS', 'reached at': '54 kHz', '`drive hash`': /dBFS$/ },
    });
  });

  it('an image limit lists the copies, strongest first', () => {
    expectHover(sounder.replace('-60 dBc', '¦-60 dBc'), { headline: /^`image` −/, rows: { 'copy 1, lower': /dBc$/ } });
  });

  it('a noise limit lists the parts of the noise', () => {
    expectHover(at('84 dB'), { headline: /^`snr` \d/, rows: { quantisation: /^−\d/, jitter: /^−\d/ } });
  });

  it('a level gives volts and steps', () => {
    // 4 V pp is 1.414 V rms at 0 dBFS; −3 dBFS is 1.001 V rms, 2.832 V pp, 0.70795 · 65536 = 46396 steps.
    expectHover(at('-3 dBFS'), {
      headline: '−3 dBFS',
      rows: { rms: '1.001 V', 'peak to peak': '2.832 V', 'steps, peak to peak': '46396' },
    });
  });

  it('bits give the size of a step and the noise that follows', () => {
    // 4 V / 65536 = 61.04 µV; 6.0206·16 + 1.7609 = 98.1 dB; −98.1 − 10·log10(32000) = −143.1 dBFS/√Hz.
    expectHover(at('16\n    limits'), {
      headline: 'One LSB is 61.04 µV',
      rows: { 'full-scale sine to noise': '98.1 dB', 'density up to half the rate': '−143.1 dBFS/√Hz' },
    });
  });

  it('a jitter gives its share of the noise', () => {
    // −20·log10(2π · 10 kHz · 3 ps) = 134.5 dB.
    expectHover(at('3 ps'), { headline: '3 ps rms in all: 134.5 dB signal to jitter noise', rows: { 'of the clock': '3 ps' } });
  });

  it('a defined name gives its definition and its users', () => {
    expectHover(at('board: {'), { headline: 'clock `board`, used by 1 channel', rows: { 'used by': '`bearing`' } });
    expectHover(at('guard:'), { headline: 'filter `guard`, used by 1 channel', rows: { 'defined as': /family: butterworth/ } });
  });

  it('a clock that a rate names gives its definition', () => {
    expectHover(passingSpec.replace('rate: { clock: board', 'rate: { clock: ¦board'), {
      headline: 'clock `board`, used by 1 channel',
    });
  });

  it('a channel that another is like gives that channel', () => {
    expectHover(`${passingSpec}\n  second:\n    like: ¦bearing\n`, { headline: '`bearing` passes: capture at 64 kHz' });
  });

  it('a rate without any that passes says which limit fails at each', () => {
    expectHover(at('{ clock: board, divide: 384 }').replace('flatness: 0.8 dB', 'flatness: 0.1 dB'), {
      headline: /^64 kHz/,
      rows: { 'next allowed rates that pass': 'none: `flatness` fails at each' },
    });
  });

  it('a limit that asks for at least so much says that it is short', () => {
    expectHover(at('84 dB').replace('84 dB', '104 dB'), { headline: /^`snr` 99\.\d dB, 4\.\d dB short of the limit$/ });
  });

  it('a full scale without bits gives the rms value of 0 dBFS', () => {
    expectHover(at('4 V').replace('    bits: 16\n', ''), { headline: '0 dBFS is 1.414 V rms' });
  });

  it('a channel says whether it passes, limit by limit', () => {
    expectHover(at('bearing:'), { headline: '`bearing` passes: capture at 64 kHz', rows: { flatness: /inside the limit$/ } });
  });

  it('a key without figures gives what the declaration says', () => {
    assert.match(hoverAt(at('direction')), /`direction`: Which way the signal goes\./);
  });

  it('a key of a broken channel still gives what the declaration says, with units and default', () => {
    const text = hoverAt(passingSpec.replace('bits: 16', 'bits: many\n    ¦guard: 1 Hz'));
    assert.match(text, /`guard`: .*\n\nUnits: Hz/);
    assert.match(text, /Default: 0 Hz\./);
  });
});

describe('a hover', () => {
  it('covers exactly the place it is about', () => {
    const { document, cursor, text } = opened(at('-96 dBFS'));
    const range = hover(document, cursor, ableEditor)?.range;
    assert.ok(range);
    assert.equal(text.split('\n')[range.start.line]?.slice(range.start.character, range.end.character), '-96 dBFS');
  });

  it('is absent in a comment and on an empty line', () => {
    const between = ['    limits:\n', '    limits:\n      # a no¦te\n'] as const;
    for (const marked of [
      `# no¦te\n${passingSpec}`,
      passingSpec.replace('\n\nclocks', '\n¦\nclocks'),
      passingSpec.replace(...between),
    ]) {
      const { document, cursor } = opened(marked);
      assert.equal(hover(document, cursor, ableEditor), null);
    }
  });

  it('is free of Markdown for an editor that knows none', () => {
    const text = hoverAt(at('-3 dBFS'), plainAbilities);
    assert.match(text, /^−3 dBFS\n/);
    assert.doesNotMatch(text, /\*\*|\|/);
  });
});
