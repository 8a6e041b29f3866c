/** Declares stages by their poles and zeros, and checks that a filter comes of them. */
import { formatFrequency } from '../../units/format';
import type { Quantity } from '../../units/quantity';
import type { RootPair } from '../../units/read-root';
import type { Clash } from '../shape';
import { listOf, quantity, root, within } from '../shapes';
import { frequencyOrZero, mostRoots } from './bounds';

/** The keys of a stage by its roots. */
export const rootKeys = {
  poles: {
    shape: listOf(root('pole'), 1),
    about: 'The poles as frequencies, s = 2π times each: `-1200 Hz`, `-800 ± 600j Hz`.',
  },
  zeros: {
    shape: listOf(root('zero')),
    about: 'The zeros as frequencies: `± 50j Hz`, `0 Hz`.',
    fallback: 'none',
    with: ['poles'],
  },
  'gain-at': {
    shape: within(quantity('frequency'), frequencyOrZero),
    about: 'The frequency at which `gain` holds; required where a zero stands at 0 Hz.',
    fallback: '0 Hz',
    with: ['poles'],
  },
} as const;

/** The part of a stage that its check needs. */
export interface RootStage {
  readonly poles?: readonly (RootPair | null)[] | null;
  readonly zeros?: readonly (RootPair | null)[] | null;
  readonly 'gain-at'?: Quantity | null;
}

/** What does not go together in a stage by its roots, or null. */
export function rootClash(stage: RootStage): Clash | null {
  if (!stage.poles || stage.zeros === null) return null;
  const poles = rootCount(stage.poles);
  const zeros = rootCount(stage.zeros ?? []);
  if (poles > mostRoots)
    return { key: 'poles', message: `one stage has at most ${mostRoots} poles, conjugates counted: this has ${poles}` };
  if (zeros > poles) {
    return {
      key: 'zeros',
      message: `${zeros} zeros over ${poles} poles would grow without end: conjugates counted, a filter has no more zeros than poles`,
    };
  }
  return gainAtClash(stage);
}

function gainAtClash({ zeros, 'gain-at': gainAt }: RootStage): Clash | null {
  if (gainAt === null) return null;
  const at = gainAt?.value ?? 0;
  const onZero = (zeros ?? []).some((zero) => zero !== null && zero.re === 0 && zero.im === at);
  if (!onZero) return null;
  if (gainAt === undefined)
    return { key: 'zeros', message: 'with a zero at 0 Hz there is no gain there: say with `gain-at` where `gain` holds' };
  return { key: 'gain-at', message: `a zero stands at ${formatFrequency(at)}, so the gain there cannot be stated` };
}

const rootCount = (roots: readonly (RootPair | null)[]) =>
  roots.reduce((count, found) => count + (found !== null && found.im !== 0 ? 2 : 1), 0);
