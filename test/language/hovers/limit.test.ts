/** Hovers of limits beyond a single level: sums, ranges, times and crosstalk. */
import { expectHover } from '../../support/language-document';

const spec = (limits: string): string => `bandkeep: 1
title: Slow tide gauge
channels:
  tide:
    direction: capture
    wanted: { band: 5 Hz .. 1 kHz, level: -3 dBFS }
    unwanted:
      - { name: hum, tone: 7.5 kHz, level: -40 dBFS }
      - { name: fan, tone: 3.75 kHz, level: -60 dBFS, harmonics: 2 }
    rate: 8 kHz
    filter: { bandwidth: 2 kHz }
    limits: { ${limits} }
`;

describe('the hover of a limit', () => {
  it('says that all landings count together, and which is the strongest', () => {
    // Both land from 7.5 kHz on 500 Hz: −10·log10(1 + 3.75²) = −11.8 dB, hum at −51.8, harmonic 2 of fan at −60 − 6.02 − 11.8 = −77.8 dBFS.
    expectHover(spec('alias: { ¦sum: -50 dBFS }'), {
      headline: '`alias` −51.8 dBFS, 1.8 dB inside the limit',
      rows: {
        counts: 'all landings of all sources together, as powers',
        '`hum`': '−51.8 dBFS',
        '`fan`, harmonic 2': '−77.8 dBFS',
      },
    });
  });

  it('gives a delay in seconds', () => {
    // 1/(2π·2 kHz)/(1 + (f/2 kHz)²): at √(5·1000) Hz 79.48 µs; from 79.58 µs at 5 Hz down to 63.66 µs at 1 kHz.
    expectHover(spec('delay: ¦100 µs'), { headline: '`delay` 79.48 µs, 20.52 µs inside the limit', rows: { limit: '100 µs' } });
    expectHover(spec('delay-spread: ¦10 µs'), { headline: '`delay-spread` 15.91 µs, 5.915 µs over the limit' });
  });

  it('gives a range of levels both its ends', () => {
    // −3 − 10·log10(1 + 0.25) = −3.97 dBFS at 1 kHz.
    expectHover(spec('level: ¦-3.5 .. -2 dBFS'), {
      headline: '`level` −3.97 dBFS, 0.47 dB outside the limit',
      rows: { limit: '−3.5 dBFS .. −2 dBFS', 'reached at': '1 kHz' },
    });
  });
});
