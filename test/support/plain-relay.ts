/** A relay written out plainly: the Fourier series of its gate, filters as products of |1/(1 + jf/fc)|, sums over k on an even grid. */

/** How it samples: open for a share, a held sample for a share, or tracking for a share and holding for the rest. */
export interface PlainSampling {
  readonly kind: 'natural' | 'flat-top' | 'track-and-hold';
  readonly share: number;
}

/** A relay at rate fs with one pole on each side; a corner of Infinity is none. */
export interface PlainRelay {
  readonly rateHz: number;
  readonly sampling: PlainSampling;
  readonly inputHz: number;
  readonly outputHz: number;
}

const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));
const dB = (gain: number): number => 20 * Math.log10(gain);

/** |weight| of copy k for an input at f, of either sign; it leaves at f + k·fs. */
export function plainWeight({ rateHz, sampling }: PlainRelay, copy: number, inputHz: number): number {
  const { kind, share: d } = sampling;
  if (kind === 'natural') return d * Math.abs(sinc(copy * d));
  const output = inputHz / rateHz + copy;
  if (kind === 'flat-top') return d * Math.abs(sinc(d * output));
  const e = 1 - d;
  const natural = d * sinc(copy * d);
  const held = e * sinc(e * output);
  const turn = -Math.PI * e * output - 2 * Math.PI * copy * d + Math.PI * copy * d;
  return Math.hypot(natural + held * Math.cos(turn), held * Math.sin(turn));
}

/** A one-pole gain. */
export function plainPole(frequencyHz: number, cornerHz: number): number {
  return 1 / Math.hypot(1, frequencyHz / cornerHz);
}

/** Gain in dB of an input at f ≥ 0 in copy k. */
export function plainGainDb(relay: PlainRelay, copy: number, inputHz: number): number {
  const leaves = Math.abs(inputHz + copy * relay.rateHz);
  return dB(plainPole(inputHz, relay.inputHz) * plainWeight(relay, copy, inputHz) * plainPole(leaves, relay.outputHz));
}

/** An interval in Hz. */
export interface PlainRange {
  readonly low: number;
  readonly high: number;
}

/** The largest gain in dB of anything in `arrives` that leaves in `leaves`, over |k| from first to last and an even grid of what arrives. */
export function plainStrongest(
  relay: PlainRelay,
  { arrives, leaves, first, last }: { arrives: PlainRange; leaves: readonly PlainRange[]; first: number; last: number },
  points: number,
): number {
  let best = -Infinity;
  for (let i = 0; i <= points; i += 1) {
    const f = arrives.low + ((arrives.high - arrives.low) * i) / points;
    for (let copy = -last; copy <= last; copy += 1) {
      const out = Math.abs(f + copy * relay.rateHz);
      if (Math.abs(copy) < first || !leaves.some((range) => range.low <= out && out <= range.high)) continue;
      best = Math.max(best, plainGainDb(relay, copy, f));
    }
  }
  return best;
}
