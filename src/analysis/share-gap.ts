/** How finely each of many contributions has to be proved, so that their sum is proved as finely as one of them alone would be. */

/** The gap at which a value counts as proved, dB. */
const usualGapDb = 0.001;

/**
 * The gap for one contribution, dB: all that contributions of `count` may be off together is the usual gap of their sum.
 * @param sumOverMost what is known of the sum already, over the most that the contribution can be; in whatever is added
 */
export function shareGapDb(sumOverMost: number, count: number): number {
  const slack = sumOverMost / count;
  // Nothing over nothing is no number, and asks for no slack.
  return slack > 1 ? usualGapDb * slack : usualGapDb;
}
