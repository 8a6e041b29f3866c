/** Where a low-pass path has lost half the power. */

/** As much of a response as is needed here. */
interface LogGain {
  logGain(frequencyHz: number): number;
}

/** The searched range, Hz: that of every frequency in a spec. */
const range = { low: 1e-9, high: 1e15 };
/** ln of the square root of a half. */
const halfPower = -Math.LN2 / 2;

/** The highest frequency at which the gain is −3.01 dB of 1, for a path whose passband reaches gain 1; null where it never gets there. */
export function halfPowerHz(response: LogGain): number | null {
  if (response.logGain(range.low) < halfPower || response.logGain(range.high) > halfPower) return null;
  let low = Math.log(range.low);
  let high = Math.log(range.high);
  for (let step = 0; step < 60; step += 1) {
    const middle = (low + high) / 2;
    if (response.logGain(Math.exp(middle)) > halfPower) low = middle;
    else high = middle;
  }
  return Math.exp(low);
}
