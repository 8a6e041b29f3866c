/** What is kept between judgements: figures and findings of every channel, for as long as the channel itself lives. */
import { createFigureStore, type FigureStore } from '../analysis';
import type { Channel } from '../spec/channel';
import type { Finding } from './finding';

/** A figure store that also keeps what was found in each channel. */
export interface JudgeStore extends FigureStore {
  /** The channel's findings, found once by `find` and kept with the channel. */
  findingsOf(channel: Channel, find: () => readonly Finding[]): readonly Finding[];
}

/** What a judgement needs: a figure store serves for one judgement, one that keeps findings too for many. */
export type Store = FigureStore & Partial<Pick<JudgeStore, 'findingsOf'>>;

/** Makes an empty store; an entry point holds one for as long as it judges. */
export function createJudgeStore(figures: FigureStore = createFigureStore()): JudgeStore {
  const kept = new WeakMap<Channel, readonly Finding[]>();
  return {
    figuresOf: (channel) => figures.figuresOf(channel),
    get analysed() {
      return figures.analysed;
    },
    findingsOf(channel, find) {
      const known = kept.get(channel);
      if (known !== undefined) return known;
      const found = find();
      kept.set(channel, found);
      return found;
    },
  };
}
