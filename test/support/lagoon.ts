/** A spec of many channels for tests of the reader, and what its text is made of. */

/** What stands above the channels. */
export const lagoonHead = `bandkeep: 1
title: Fernhollow Lagoon, sluice gate 3
clocks:
  board: { frequency: 24.576 MHz, jitter: 3 ps }
  spare: { frequency: 20 MHz }
filters:
  guard: { family: butterworth, order: 4, corner: 14 kHz }
  other: { bandwidth: 100 kHz }
channels:
`;

/** The lines of one channel; its first is its name. */
export function lagoonChannel(name: string): string[] {
  return [
    `  ${name}:`,
    '    direction: capture',
    '    wanted: { band: 0 Hz .. 10 kHz, level: -3 dBFS }',
    '    unwanted:',
    '      - { name: drive hash, band: 40 kHz .. 3 MHz, level: -55 dBFS }',
    '      - name: sump pump',
    '        tone: 310 kHz ± 10 %',
    '        level: -24 dBFS',
    '    rate: { clock: board, divide: 480 }',
    '    filter: guard',
    '    bits: 16',
    '    limits:',
    '      alias: -60 dBFS',
    '      flatness: 3 dB',
  ];
}

/** The names gate-01, gate-02, … */
export function lagoonNames(count: number): string[] {
  return Array.from({ length: count }, (_, index) => `gate-${String(index + 1).padStart(2, '0')}`);
}

/** A whole, faultless spec. */
export function lagoonSpec(count: number): string {
  const channels = lagoonNames(count).flatMap(lagoonChannel);
  return `${lagoonHead}${channels.join('\n')}\n`;
}
