/** Symmetric taps from the amplitude that they shall have. */

/**
 * The even-symmetric taps whose amplitude is given: a cosine transform of its values at the multiples of rate/count.
 *
 * @param amplitude over shares 0 … 0.5 of the rate, of a filter with so many taps; 0 at 0.5 where they are even in number.
 * @param count how many, from 1.
 * Source: frequency sampling, which is exact for such an amplitude.
 * @example tapsFromAmplitude((x) => Math.cos(Math.PI * x) ** 2, 3)[1] // 0.5
 */
export function tapsFromAmplitude(amplitude: (share: number) => number, count: number): readonly number[] {
  const samples = Array.from({ length: Math.floor((count + 1) / 2) }, (_, j) => amplitude(j / count));
  const centre = (count - 1) / 2;
  const half = Array.from({ length: Math.ceil(count / 2) }, (_, k) => {
    const sum = samples.reduce((total, sample, j) => {
      const turns = (j * (k - centre)) / count;
      return total + (j === 0 ? sample : 2 * sample * Math.cos(2 * Math.PI * (turns - Math.round(turns))));
    }, 0);
    return sum / count;
  });
  return Array.from({ length: count }, (_, k) => half[Math.min(k, count - 1 - k)] ?? 0);
}
