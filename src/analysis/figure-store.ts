/** Keeps figures by the channel they are of, for as long as that channel object lives, and counts the analyses this took. */
import type { Channel } from '../spec/channel';
import { analyse } from './analyse';
import type { Figures } from './figures';

/** Figures that are computed once for each channel object. */
export interface FigureStore {
  figuresOf(channel: Channel): Figures;
  /** How many analyses were run so far. */
  readonly analysed: number;
}

/** An empty store; each entry of the program makes its own. */
export function createFigureStore(): FigureStore {
  const kept = new WeakMap<Channel, Figures>();
  let analysed = 0;
  return {
    figuresOf: (channel) => {
      const known = kept.get(channel);
      if (known !== undefined) return known;
      analysed += 1;
      const figures = analyse(channel);
      kept.set(channel, figures);
      return figures;
    },
    get analysed() {
      return analysed;
    },
  };
}
