/** What the noise of either direction is handed on as, before levels and ratios are made of it. */
import type { WorstAt } from './figures';

/** Parts of noise in dB, against full scale or against the test tone; null where a part does not exist. */
export interface NoiseParts {
  readonly quantisation: number | null;
  readonly jitter: number | null;
}

/** What the noise of one direction amounts to. */
export interface DirectionNoise {
  /** dBFS, nominal. */
  readonly nominal: NoiseParts;
  readonly jitterUnwanted: number | null;
  /** The powers that count under the snr limit, each over the test tone's own; without deviations, and at the worst of them. */
  readonly nominalShares: readonly number[];
  readonly worstShares: readonly number[];
  readonly worstAt: WorstAt | null;
  readonly evaluations: number;
}
