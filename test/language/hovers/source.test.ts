/** Hovers of sources with harmonics, entrances and tables, and of what stands among shared definitions. */
import { expectHover } from '../../support/language-document';

const spec = `bandkeep: 1
title: Ice-thickness echo receiver
sources:
  sounder: { tone: 310 kHz, level: -20 dBFS, harmonics: { to: 30, odd: true } }
  ripple: { tone: 150 kHz, level: -80 dBFS, enters: sampler }
masks:
  ear:
    - { band: 4.2 MHz .. 4.5 MHz, within: ± 1 dB }
    - { band: 6 MHz .., below: -40 dB }
channels:
  echo:
    direction: capture
    wanted: { band: 4.2 MHz .. 4.5 MHz, level: -3 dBFS }
    unwanted:
      - sounder
      - ripple
      - { name: hum, tone: 50 kHz, level: -60 dBFS, enters: second guard }
    rate: 1.02 MHz
    filter:
      - { family: butterworth, kind: bandpass, order: 4, corners: 4.1 MHz .. 4.6 MHz }
      - { name: second guard, bandwidth: 8 MHz }
    limits:
      alias: -90 dBFS
      response: ear
`;
const at = (words: string): string => spec.replace(words, `¦${words}`);

/** 4.34 MHz is about the middle; −10·log10(1 + x^8), x = (f² − 4.1·4.6)/(0.5·f) in MHz, and one pole at 8 MHz. */
const pathDb = (mhz: number): number => {
  const x = (mhz * mhz - 4.1 * 4.6) / (0.5 * mhz);
  return -10 * Math.log10(1 + x ** 8) - 10 * Math.log10(1 + (mhz / 8) ** 2);
};
const levelOf = (harmonic: number): string => {
  const level = -20 - 20 * Math.log10(harmonic) + pathDb(0.31 * harmonic);
  return `−${Number(Math.abs(level).toFixed(1))} dBFS`;
};

describe('the hover of a source with harmonics', () => {
  it('lists what of each lands, the strongest first', () => {
    // At 1.02 MHz the band appears at 120 … 420 kHz. 13 · 310 kHz = 4.03 MHz lands on 50 kHz and 15 · 310 kHz = 4.65 MHz on 450 kHz, both
    // outside; 17 · 310 kHz = 5.27 MHz lands on 170 kHz and 11 · 310 kHz = 3.41 MHz on 350 kHz.
    expectHover(at('sounder\n      - ripple'), {
      headline: new RegExp(`^\`sounder\` lands on 170 kHz at ${levelOf(17)}, `),
      rows: {
        'stands at': '310 kHz',
        harmonics: 'odd ones up to 30, −20 dB/decade',
        'strongest from': '5.27 MHz, harmonic 17',
        'harmonic 11': `3.41 MHz lands on 350 kHz at ${levelOf(11)}`,
        'harmonic 17': `5.27 MHz lands on 170 kHz at ${levelOf(17)}`,
      },
    });
  });

  it('says the same where the source is defined', () => {
    expectHover(at('{ tone: 310 kHz'), { headline: /^`sounder` lands on 170 kHz/ });
    expectHover(at('sounder: {'), {
      headline: 'source `sounder`, used by 1 channel',
      rows: { 'used by': '`echo`' },
    });
  });
});

describe('the hover of a source that enters later', () => {
  it('says that one at the sampler passes no stage', () => {
    expectHover(at('{ tone: 150 kHz'), {
      headline: /^`ripple` lands on 150 kHz at −80 dBFS, 10 dB over the limit$/,
      rows: { enters: 'at the sampler, so it passes no stage before it' },
    });
  });

  it('names the stages that one in front of a stage still passes', () => {
    expectHover(at('{ name: hum'), {
      headline: '`hum` lands in no protected range',
      rows: { enters: 'in front of `second guard`, so it passes `second guard`' },
    });
  });
});

describe('the hover of a mask', () => {
  it('lists its segments with the worst of each, where it is used and where it is defined', () => {
    // 12 dB and more below −40 dB at 6 MHz: x = 17.14/3 = 5.713, 60.6 dB.
    const rows = { '6 MHz .., below −40 dB': /^−6\d\.\d+ dB at 6 MHz, 2\d\.\d+ dB inside$/ };
    expectHover(at('ear\n'), { headline: /^`response`, mask `ear`: 0\.\d+ dB inside the limit, worst at 4\.\d+ MHz$/, rows });
    expectHover(at('{ band: 6 MHz'), {
      headline: /^6 MHz \.\., below −40 dB: 2\d\.\d+ dB inside$/,
      rows: { 'bound there': '−40 dB, at most' },
    });
    expectHover(at('ear:\n'), { headline: 'mask `ear`, used by 1 channel' });
  });
});
