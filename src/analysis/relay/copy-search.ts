/** The proved strongest copy of a relay channel, asked for from either end: over the frequencies that leave, or over those that arrive. */
import { alongCopy } from '../../signal/copy-axis';
import { constantResponse, product } from '../../signal/response-algebra';
import type { Enclosure, Response } from '../../signal/response';
import { largestOverBands, largestOverCopies } from '../../signal/search';
import type { CopyBound, CopyExtreme } from '../../signal/search';
import type { RelayPath } from './relay-path';
import { weightResponse } from './weights';
import type { Weight } from './weights';

/** What is searched over the frequencies that leave. */
export interface LeavingQuestion {
  readonly relay: Pick<RelayPath, 'rateHz' | 'weights'>;
  /** Ranges of the output frequency. */
  readonly leaves: readonly Enclosure[];
  /** Ranges of the input frequency. */
  readonly arrives: readonly Enclosure[];
  /** Where both are the same frequency: what is sampled and leaves where it was, copy 0. No clock moves that apart. */
  readonly stays: readonly Enclosure[];
  readonly input: Response;
  readonly output: Response;
}

/** The strongest of everything that leaves in some ranges from what arrives in others; the copy's x is where it leaves, F where it arrives. */
export function strongestLeaving(question: LeavingQuestion): CopyExtreme | null {
  const moved = strongestMoved(question);
  const stayed = strongestStayed(question);
  if (moved === null || stayed === null) return moved ?? stayed;
  const best = moved.logGain > stayed.logGain ? moved : stayed;
  return { ...best, evaluations: moved.evaluations + stayed.evaluations };
}

function strongestStayed({ relay, stays, input, output }: LeavingQuestion): CopyExtreme | null {
  const found = largestOverBands(product([weightResponse(relay.weights.copy(0)), input, output]), stays);
  return found === null ? null : { ...found, nearHz: found.frequencyHz, farHz: found.frequencyHz, copy: 0 };
}

function strongestMoved({ relay, leaves, arrives, input, output }: LeavingQuestion): CopyExtreme | null {
  const near = responses(output);
  const boundOf = (weight: Weight): CopyBound => ({ logWeight: weight.log, near: near(weight.atOutput), far: input });
  return largestOverCopies({
    rateHz: relay.rateHz,
    bands: leaves,
    within: arrives,
    signs: 'both',
    firstCopy: 1,
    lastCopy: relay.weights.lastCopy,
    // x = f_o stands at F = |f_o + j·rate|, so that it is copy −j of the input.
    gainOf: (copy, { axis }) => {
      const { log, atOutput } = relay.weights.copy(-copy);
      return product([constantResponse(log), near(atOutput), alongCopy(input, axis)]);
    },
    boundFrom: (first) => boundOf(relay.weights.boundFrom(first)),
    limit: relay.weights.limit === null ? null : boundOf(relay.weights.limit),
  });
}

/** What is searched over the frequencies that arrive. */
export interface ArrivingQuestion {
  readonly relay: Pick<RelayPath, 'rateHz' | 'weights'>;
  readonly arrives: readonly Enclosure[];
  /** Which copies: k from first to last, above their multiple of the rate, below it, or both. */
  readonly copies: { readonly first: number; readonly last: number; readonly side: 'upper' | 'lower' | 'both' };
  /** A gain at the input frequency, in series; bounds with it hold for every copy. */
  readonly input: Response;
  readonly output: Response;
  /** The gain of both along one copy where it is less than their product: parts that act on both frequencies at once. */
  readonly tied?: (axis: Parameters<typeof alongCopy>[1]) => Response;
}

/** The strongest copy of what arrives in some ranges; the copy's x is where it arrives, F where it leaves. */
export function strongestArriving(question: ArrivingQuestion): CopyExtreme | null {
  const { relay, arrives, copies, input, output, tied } = question;
  const far = responses(output);
  return largestOverCopies({
    rateHz: relay.rateHz,
    bands: arrives,
    within: [{ low: 0, high: Infinity }],
    signs: copies.side === 'both' ? 'both' : copies.side === 'upper' ? 'positive' : 'negative',
    firstCopy: copies.first,
    lastCopy: Math.min(copies.last, relay.weights.lastCopy),
    gainOf: (copy, { axis, mirrored }) => {
      const { log, atOutput } = relay.weights.copy(mirrored ? -copy : copy);
      const weight = atOutput === null ? [] : [alongCopy(atOutput, axis)];
      const parts = tied === undefined ? [input, alongCopy(output, axis)] : [tied(axis)];
      return product([constantResponse(log), ...weight, ...parts]);
    },
    boundFrom: (first) => {
      const { log, atOutput } = relay.weights.boundFrom(first);
      return { logWeight: log, near: input, far: far(atOutput) };
    },
    // The weight itself falls to nothing as the copy and with it the output frequency grow.
    limit: null,
  });
}

/** A response in series with a weight; the same object for the same weight, so that its largest is found once. */
function responses(response: Response): (atOutput: Response | null) => Response {
  const made = new Map<Response, Response>();
  return (atOutput) => {
    if (atOutput === null) return response;
    const known = made.get(atOutput) ?? product([atOutput, response]);
    made.set(atOutput, known);
    return known;
  };
}
