/** Levels of the harmonics that a converter makes of a tone. */

/**
 * A harmonic as it would stand at full scale, from where it was stated: HD_m = h − (m − 1)·L₀ in dBc.
 *
 * @param order m, ≥ 2.
 * @param statedDb h, in dB against the tone.
 * @param atDb L₀, the tone's level when it was stated, in dB against full scale.
 * Source: a power series' term of order m grows as the tone's m-th power; common practice.
 * @example harmonicAtFullScaleDb(3, -80, -1) // -78
 */
export function harmonicAtFullScaleDb(order: number, statedDb: number, atDb: number): number {
  return statedDb - (order - 1) * atDb;
}

/**
 * A harmonic's level in dB against full scale: HD_m + m·L.
 *
 * @param order m, ≥ 2.
 * @param atFullScaleDb HD_m, in dB against a tone at full scale.
 * @param toneDb L, the tone's level at the sampler in dB against full scale; −Infinity gives −Infinity.
 * Source: as `harmonicAtFullScaleDb`.
 * @example harmonicLevelDb(3, -78, -10) // -108
 */
export function harmonicLevelDb(order: number, atFullScaleDb: number, toneDb: number): number {
  return atFullScaleDb + order * toneDb;
}
