/** Hovers of rates that sample a band above half of them: the windows around the present one. */
import { expectHover } from '../../support/language-document';

const spec = (rate: string, rest = ''): string => `bandkeep: 1
title: Ice-thickness echo receiver
channels:
  echo:
    direction: capture
    wanted: { band: 4.2 MHz .. 4.5 MHz, level: -3 dBFS }
${rest}    rate: ¦${rate}
`;

describe('the hover of a rate', () => {
  it('lists the windows next to it with their zones, and how many more there are', () => {
    // 2·4.5/n … 2·4.2/(n − 1) MHz: n = 9 gives 1.0 … 1.05, n = 10 0.9 … 0.933, n = 8 1.125 … 1.2; n up to 4.5/0.3 = 15.
    expectHover(spec('1.02 MHz'), {
      headline: '1.02 MHz: half rate 510 kHz, the wanted band in zone 9',
      rows: {
        'comes out': 'upright',
        'keeps the band whole': '1 MHz .. 1.05 MHz',
        'room below': '20 kHz (19,608 ppm)',
        'room above': '30 kHz (29,412 ppm)',
        // The row nearest in rate is listed first, so the last of the same name is zone 11 or 7.
        'window below': '818.2 kHz to 840 kHz (zone 11, not inverted), 21.82 kHz (26,316 ppm) wide',
        'window above': '1.286 MHz to 1.4 MHz (zone 7, not inverted), 114.3 kHz (85,106 ppm) wide',
        'further windows': '10 more',
      },
    });
  });

  it('takes guard and clock tolerance off each window', () => {
    // Zone 9 with 20 kHz of guard and 100 ppm: 2·4.52/9/(1 − 100e-6) … 2·4.18/8/(1 + 100e-6).
    expectHover(spec('1.02 MHz ± 100 ppm', '    guard: 20 kHz\n'), {
      headline: /zone 9$/,
      rows: { 'room below': '15.46 kHz (15,152 ppm)', 'room above': '24.9 kHz (24,407 ppm)' },
    });
  });

  it('says of a rate that folds the band how far it is from the window', () => {
    expectHover(spec('980 kHz'), {
      headline: /zone 9$/,
      rows: { 'keeps the band whole': '1 MHz .. 1.05 MHz', 'outside it by': '20 kHz (20,408 ppm)' },
    });
  });
});
