/** Hovers of what samples in a relay channel, and of time slots, against the Fourier coefficients and the first-order link. */
import { expectHover } from '../../support/language-document';

const strain = (sampling: string): string => `bandkeep: 1
title: Strain on the turbine shaft
channels:
  strain:
    direction: relay
    wanted: { band: 0 Hz .. 400 Hz, level: -3 dBFS }
    rate: 8 kHz
    ${sampling}
    output-filter: { rc: { r: 10 kΩ, c: 4.7 nF } }
    limits: { image: -10 dBc }
`;

describe('the hover of a gate', () => {
  it('gives its own loss and the weight of each copy, as it is and at other widths', () => {
    // c₀ = 0.12, |c_k|/c₀ = sinc(0.12·k): −18.42 dB; −0.21, −0.84, −1.94, −3.58, −5.94 dB.
    expectHover(strain('gate: ¦12 %'), {
      headline: '12 % of the period: 18.4 dB own loss, copy 1 another 0.21 dB weaker before any filter',
      rows: {
        lasts: '15 µs of 125 µs',
        'own loss, 20·log10 c_0': '−18.42 dB',
        '\\|c_1\\|/c_0': '−0.21 dB',
        '\\|c_5\\|/c_0': '−5.94 dB',
        'at a width of 24 %': 'copies 1 … 5: −0.8, −3.6, −9.4, −27.6, −16.1 dB; own loss 12.4 dB',
        'at a width of 6 %': 'copies 1 … 5: −0.1, −0.2, −0.5, −0.8, −1.3 dB; own loss 24.4 dB',
        'its spectrum is nothing at': '66.67 kHz, 133.3 kHz',
        // −0.21 − 10·log10(1 + (7.6 kHz/3.386 kHz)²) + 10·log10(1 + (400/3386)²) = −7.95 dB
        'copy 1 as it leaves': '−8 dBc at 7.6 kHz, lower side',
      },
    });
  });

  it('says of a copy that the width takes out that nothing is left', () => {
    expectHover(strain('gate: ¦50 %'), { headline: /^50 % of the period: 6 dB own loss/, rows: { '\\|c_2\\|/c_0': '−∞ dB' } });
  });

  it('takes the area of another shape', () => {
    // A half sine of 20 %: c₀ = 0.4/π, |c₁|/c₀ = cos(0.2π)/(1 − 0.16).
    expectHover(strain('gate: { ¦shape: half-sine, width: 20 % }'), {
      headline: 'Half sine of 20 % of the period: 17.9 dB own loss, copy 1 another 0.33 dB weaker before any filter',
    });
  });

  it('counts a track and hold by its droop and by copies at the output frequency', () => {
    // |0.3 + 0.7·sinc(0.7·0.05)·e^{−jπ·0.7·0.05}| at 400 Hz: 0.0226 dB; e²·T/2 = 30.6 µs at 0 Hz.
    expectHover(strain('gate: { ¦track: 30 % }'), {
      headline: 'Tracks 30 % of the period: 0.023 dB loss at 400 Hz',
      rows: { 'follows for': '37.5 µs of 125 µs', 'delay at 0 Hz': '30.62 µs' },
    });
  });
});

describe('the hover of a shaped pulse', () => {
  it('gives its loss, its nulls and its delay', () => {
    // A Hann pulse of 25 µs: sinc(f·w)/(1 − (f·w)²) at 400 Hz = 0.01, nulls from 2/w.
    expectHover(strain('hold: { ¦shape: raised-cosine, width: 25 µs }'), {
      headline: /^Raised cosine of 25 µs: 20 dB loss at 400 Hz$/,
      rows: { 'passes nothing at': '80 kHz, 120 kHz, 160 kHz', 'delay at 0 Hz': '12.5 µs', 'share of the period': '20 %' },
    });
  });
});

describe('the hover of time slots', () => {
  it('gives the crosstalk of the guard over a first-order link', () => {
    // −20·log10(e)·2π·100 kHz·16.25 µs = −88.7 dB; 6.02 dB for each ln 2/(2π·100 kHz) = 1.103 µs.
    expectHover(strain('gate: 12 %\n    slots: { ¦count: 4, link: 100 kHz }'), {
      headline: '4 slots: −88.7 dB from one into the next',
      rows: {
        'each slot': '31.25 µs',
        'the pulse in it': '15 µs',
        guard: '16.25 µs',
        'time constant of the link': '1.592 µs, from 100 kHz',
        '6 dB less for each': '1.103 µs of guard',
      },
    });
  });
});
