/** The text that benchmarks read: a seeded generator of specs with any number of channels, 25 lines each. */

/** A spec of `channels` channels; the same for the same seed. `tonesOnly` leaves out the one band source of each channel. */
export function specText(channels: number, options: { readonly seed?: number; readonly tonesOnly?: boolean } = {}): string {
  const random = generator(options.seed ?? 1);
  const body = Array.from({ length: channels }, (_, index) => channelText(index, random, options.tonesOnly ?? false));
  return `bandkeep: 1\ntitle: Lagoon wall, sensor rows\n\nchannels:\n${body.join('')}`;
}

/** The same text with the level of one source in the middle channel changed: what a user's keystroke does. */
export function editedText(text: string, channels: number, step: number): string {
  const start = text.indexOf(`  row-${String(Math.floor(channels / 2))}:`);
  const at = text.indexOf('level: -', text.indexOf('tone:', start)) + 'level: -'.length;
  return `${text.slice(0, at)}${String(30 + (step % 10))}.${String(step % 97)}${text.slice(text.indexOf(' dBFS', at))}`;
}

function channelText(index: number, random: () => number, tonesOnly: boolean): string {
  const rate = 40 + Math.round(random() * 400) / 10;
  const top = rate * (0.1 + 0.1 * random());
  const tone = (name: string) =>
    `      - { name: ${name}, tone: ${(rate + 100 * random()).toFixed(2)} kHz, level: -${(30 + 30 * random()).toFixed(1)} dBFS }\n`;
  const band = `      - { name: hash, band: ${(2 * rate).toFixed(2)} kHz .. 2 MHz, level: -70 dBFS }\n`;
  return [
    `  row-${String(index)}:\n`,
    `    direction: capture\n`,
    `    # Sensor row ${String(index)} along the lagoon wall.\n`,
    `    wanted:\n`,
    `      band: 10 Hz .. ${top.toFixed(3)} kHz\n`,
    `      level: -3 dBFS\n`,
    `    full-scale: 4 V\n`,
    `    rate: ${rate.toFixed(1)} kHz\n`,
    `    bits: 16\n`,
    `    aperture: 300 ns\n`,
    `    jitter: 20 ps\n`,
    `    filter:\n`,
    `      family: butterworth\n`,
    `      order: ${String(4 + Math.floor(4 * random()))}\n`,
    `      corner: ${(1.4 * top).toFixed(3)} kHz\n`,
    `      tolerance: { corner: 3 % }\n`,
    `    unwanted:\n`,
    ...['pump', 'hoist', 'lamp', 'radio', 'fan'].map(tone),
    tonesOnly ? tone('gate') : band,
    `    limits: { alias: -80 dBFS, flatness: 1 dB, snr: 70 dB }\n`,
    `\n`,
  ].join('');
}

/** Mulberry32, a small generator with a full 32-bit state: enough for shuffling numbers, and the same on every machine. */
function generator(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}
