/** The bearing pick-up of sluice gate 3, which breaks its alias limit by 4.8 dB, and variations of it. */

/** The whole spec. */
export const bearingSpec = `bandkeep: 1
title: Sluice gate 3, bearing pick-ups

clocks:
  board: { frequency: 24.576 MHz, jitter: 3 ps }

filters:
  pick-up guard:
    - { bandwidth: 400 kHz }                                   # the charge amplifier
    - { family: butterworth, order: 4, corner: 14 kHz, tolerance: { corner: 4 % } }

channels:
  bearing-x:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted:
      - { name: sump-pump switcher, tone: 310 kHz ± 10 %, level: -24 dBFS }
      - { name: drive hash, band: 40 kHz .. 3 MHz, level: -55 dBFS }
    full-scale: 4 V
    rate: { clock: board, divide: 480 }                        # 51.2 kHz
    rate-choices: { clock: board, divide: 120 .. 480 }         # what the board could also give
    aperture: 300 ns
    filter: pick-up guard
    bits: 16
    limits:
      alias: -96 dBFS
      flatness: 0.8 dB
      snr: 84 dB
`;

/** The same with some of its words replaced; each must stand there once. */
export function bearingWith(...changes: readonly (readonly [from: string, to: string])[]): string {
  return changes.reduce((text, [from, to]) => {
    if (text.split(from).length !== 2) throw new Error(`“${from}” does not stand in the spec exactly once.`);
    return text.replace(from, () => to);
  }, bearingSpec);
}
