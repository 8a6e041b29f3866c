/** Hovers of stages: half-power points, folds, noise bandwidth, delay, sections, zeros and parts, against closed forms. */
import { expectHover } from '../../support/language-document';

const spec = (stage: string, rest = ''): string => `bandkeep: 1
title: Ice-thickness echo receiver
channels:
  echo:
    direction: capture
    wanted: { band: 4.2 MHz .. 4.5 MHz, level: -3 dBFS }
    rate: 1.02 MHz
    filter:
      - ¦${stage}
${rest}`;

describe('the hover of a stage', () => {
  it('gives both half-power points of a band-pass, and the folds to both sides of a band above half the rate', () => {
    // Zone 9 of 1.02 MHz is 4.08 … 4.59 MHz: 4.2 MHz mirrors to 3.96 MHz, 4.5 MHz to 4.68 MHz.
    // Third order about √(4·4.7): with x = (f² − 4·4.7)/(0.7·f) the loss is 10·log10(1 + x⁶), 2.4 dB at 4.68 MHz against 0 dB at √(4.2·4.5).
    expectHover(spec('{ family: butterworth, kind: bandpass, order: 3, corners: 4 MHz .. 4.7 MHz }'), {
      headline: '`stage 1`: 2.4 dB loss at 4.68 MHz, the nearest fold',
      rows: {
        'half power at': '4 MHz and 4.7 MHz',
        'loss at the nearest fold below': '4.8 dB at 3.96 MHz',
        'loss at the nearest fold above': '2.4 dB at 4.68 MHz',
        // π/6·width/sin(π/6) = 0.733 MHz: Butterworth of order 3, whose noise bandwidth a band-pass keeps exactly.
        'noise bandwidth': '733 kHz',
        'zeros at 0 Hz': '3',
      },
    });
  });

  it('gives f₀ and Q of an rlc from its parts', () => {
    // 1/(2π·√(1 µH·100 pF)) = 15.92 MHz, √(L/C)/R = 2; noise bandwidth π/2·f₀·Q over the peak gain² of Q²/(1 − 1/(4Q²)) = 4.267.
    expectHover(spec('{ rlc: { r: 50 Ω, l: 1 µH, c: 100 pF } }'), {
      headline: /nearest fold$/,
      rows: {
        R: '50 Ω',
        L: '1 µH',
        C: '100 pF',
        'corner of the parts': 'f₀ 15.92 MHz, Q 2.000',
        'section 1': 'f₀ 15.92 MHz, Q 2.000',
        'noise bandwidth': '11.72 MHz',
      },
    });
  });

  it('says how far the corner of an rc may be off, and its delay RC/(1 + (ωRC)²)', () => {
    // 1/(2π·1 kΩ·22 pF) = 7.234 MHz; ends 1/(1.01·1.05) and 1/(0.99·0.95); at √(4.2·4.5) MHz ωRC = 0.601, so 22 ns/1.3612.
    expectHover(spec('{ rc: { r: 1 kΩ ± 1 %, c: 22 pF ± 5 % } }'), {
      headline: /^`stage 1`/,
      rows: {
        'half power at': '7.234 MHz',
        R: '1 kΩ, −1 % … +1 %',
        'corner of the parts': '7.234 MHz',
        'the corner may be off by': '−5.705 % … +6.326 %',
        'group delay': '16.16 ns',
        // π/2 times the corner.
        'noise bandwidth': '11.36 MHz',
      },
    });
  });

  it('says in words that what does not fall to nothing has no noise bandwidth', () => {
    expectHover(spec('{ cr: { r: 1 kΩ, c: 22 nF } }'), {
      headline: /^`stage 1`/,
      rows: {
        'half power at': '7.234 kHz',
        'noise bandwidth': 'endless: the gain does not fall to nothing',
        'zeros at 0 Hz': '1',
        'section 1': '7.234 kHz, one real pole',
      },
    });
  });

  it('gives a notch its null and its half-power points, f₀/Q apart', () => {
    // √(f₀² + (f₀/2Q)²) ± f₀/2Q with f₀ = 2 MHz and Q = 3.
    expectHover(spec('{ second-order: { frequency: 2 MHz, q: 3, kind: notch } }'), {
      headline: /^`stage 1`/,
      rows: { 'half power at': '1.694 MHz and 2.361 MHz', 'nulls at': '2 MHz', 'section 1': 'f₀ 2 MHz, Q 3.000' },
    });
  });

  it('lets zeros right of the axis count for the delay: an all-pass delays by 2·Q/(π·f₀) at f₀', () => {
    expectHover(spec('{ second-order: { frequency: 2 MHz, q: 3, kind: allpass } }', '    reference: 4.3 MHz\n'), {
      headline: '`stage 1`: 0 dB loss at 3.96 MHz, the nearest fold',
      rows: { 'half power at': 'no frequency', zero: 'f₀ 2 MHz, Q 3.000, right of the axis' },
    });
    const at = spec('{ second-order: { frequency: 4.3 MHz, q: 3, kind: allpass } }', '    reference: 4.3 MHz\n');
    // 2·3/(π·4.3 MHz) = 444.2 ns
    expectHover(at, { headline: /^`stage 1`/, rows: { 'group delay': '444.2 ns' } });
  });

  it('lists poles and zeros as they were given', () => {
    expectHover(spec('{ poles: [-1200 Hz, -800 ± 600j Hz], zeros: [-5 Hz, ± 50j Hz], gain: 0 dB }'), {
      headline: /^`stage 1`/,
      rows: { 'section 1': '1.2 kHz, one real pole', 'section 2': 'f₀ 1 kHz, Q 0.6250', 'nulls at': '50 Hz', zero: '5 Hz, real' },
    });
  });
});

describe('the hover of a relay channel’s filters', () => {
  const relay = `bandkeep: 1
title: Strain on the turbine shaft
filters:
  bridge side: { rc: { r: 1 kΩ, c: 22 nF }, name: bridge rc }
  far side:
    - { rc: { r: 10 kΩ, c: 4.7 nF } }
    - { bandwidth: 100 kHz }
channels:
  strain:
    direction: relay
    wanted: { band: 0 Hz .. 400 Hz, level: -3 dBFS }
    rate: 8 kHz
    gate: 12 %
    input-filter: bridge side
    output-filter: far side
`;
  const at = (words: string): string => relay.replace(words, `¦${words}`);

  it('tells the one before the sampler by the first fold', () => {
    // 10·log10(1 + (7.6/7.234)²) = 3.2 dB
    expectHover(at('bridge side\n    output'), {
      headline: /^`bridge rc`: 1\.2 dB loss at half the rate, 4 kHz$/,
      rows: { 'loss at the first fold': '3.2 dB at 7.6 kHz' },
    });
  });

  it('tells the one behind it by the first image, its own stages only', () => {
    expectHover(at('far side\n'), {
      headline: /^2 stages: /,
      rows: { 'loss at the first image': '7.8 dB at 7.6 kHz' },
    });
  });

  it('answers in the definition for the channel that uses it', () => {
    expectHover(at('{ bandwidth'), {
      headline: /^`far side, stage 2`/,
      rows: { 'half power at': '100 kHz', 'loss at the first image': '0.025 dB at 7.6 kHz' },
    });
  });
});
