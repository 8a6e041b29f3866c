/** Spec texts for tests: small ones with one fault each, and a large one with any number of channels. */

/** A capture channel that passes, without anything to be said of it. */
export const passingSpec = `bandkeep: 1
title: Sluice gate 3

clocks:
  board: { frequency: 24.576 MHz, jitter: 3 ps }

filters:
  guard:
    - { family: butterworth, order: 4, corner: 14 kHz }

channels:
  bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted:
      - { name: drive hash, band: 40 kHz .. 3 MHz, level: -55 dBFS }
    full-scale: 4 V
    rate: { clock: board, divide: 384 }
    rate-choices: { clock: board, multiply: 1, divide: [192, 240, 256, 320, 384, 480] }
    aperture: 300 ns
    filter: guard
    bits: 16
    limits:
      alias: -96 dBFS
      flatness: 0.8 dB
      snr: 84 dB
`;

/** `count` channels that share nothing, each with its own rate, filter, source and limits. */
export function manyChannels(count: number): string {
  const channels = Array.from({ length: count }, (_, index) => {
    const top = 1000 + index;
    return `  gauge-${index}:
    direction: capture
    wanted: { band: 10 Hz .. ${top} Hz, level: -3 dBFS }
    unwanted:
      - { name: pump hum, tone: ${20 * top + 777} Hz, level: -40 dBFS }
    rate: ${10 * top} Hz
    filter: { family: butterworth, order: 6, corner: ${2 * top} Hz }
    bits: 16
    limits:
      alias: -80 dBFS
      flatness: 1 dB
`;
  });
  return `bandkeep: 1\ntitle: Many gauges\n\nchannels:\n${channels.join('\n')}`;
}
