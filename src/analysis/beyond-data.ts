/** Where a measured table that refuses to be asked outside its range is asked there, and what can then not be judged. */
import type { Channel, MeasuredForm, Stage } from '../spec/channel';
import { arrivalsOf } from './arrivals';
import type { BeyondData, Figures, JudgedKey, LimitFigure } from './figures';
import { factorsOf } from './tolerances';
import { appearance } from './wanted';

/** A frequency that is as near as this, relatively, to the end of a table is its end. */
const slack = 1e-9;

/** One frequency at which the figures need a stage. */
interface Question {
  readonly frequencyHz: number;
  /** The stages that are asked: an interval of indices, the end not included. */
  readonly from: number;
  readonly to: number;
  readonly asks: BeyondData['asks'];
  readonly source: string | null;
  /** The limits that lean on it, whether they are stated or not. */
  readonly keys: readonly JudgedKey[];
}

const everyKey: readonly JudgedKey[] = [
  'alias',
  'image',
  'flatness',
  'delay',
  'delay-spread',
  'level',
  'response',
  'through',
  'output',
  'snr',
  'headroom',
];

/** For each refusing end of each measured stage the farthest frequency asked beyond it, if any. */
export function beyondDataOf(channel: Channel): readonly BeyondData[] {
  const measured = channel.stages.flatMap((stage, index) =>
    stage.form.kind === 'measured' ? [{ stage, index, form: stage.form }] : [],
  );
  if (measured.length === 0) return [];
  const questions = questionsOf(channel);
  return measured.flatMap(({ stage, index, form }) => {
    const covers = coveredBy(stage, form);
    const asked = questions.filter(({ from, to }) => from <= index && index < to);
    const below = asked.filter(({ frequencyHz }) => frequencyHz < covers.lowHz * (1 - slack));
    const beyond = asked.filter(({ frequencyHz }) => frequencyHz > covers.highHz * (1 + slack));
    return [...farthest(index, covers, 'below', below), ...farthest(index, covers, 'beyond', beyond)];
  });
}

/** The figures without those that lean on what a table does not hold; the limits on them are not judged. */
export function withheld(figures: Figures, beyondData: readonly BeyondData[]): Figures {
  if (beyondData.length === 0) return figures;
  const keys = new Set(beyondData.flatMap((one) => one.keys));
  const nothing = <T>(key: JudgedKey, value: T): T | null => (keys.has(key) ? null : value);
  const none = <T>(key: JudgedKey, values: readonly T[]): readonly T[] => (keys.has(key) ? [] : values);
  return {
    ...figures,
    beyondData,
    limits: figures.limits.map((limit) => (keys.has(limit.limit) ? unjudged(limit) : limit)),
    droop: nothing('flatness', figures.droop),
    delay: nothing('delay', figures.delay),
    delaySpread: nothing('delay-spread', figures.delaySpread),
    aliases: none('alias', figures.aliases),
    alias: nothing('alias', figures.alias),
    aliasSum: nothing('alias', figures.aliasSum),
    images: none('image', figures.images),
    image: nothing('image', figures.image),
    noise: { ...figures.noise, jitterUnwanted: nothing('alias', figures.noise.jitterUnwanted) },
    snr: nothing('snr', figures.snr),
    sinad: nothing('snr', figures.sinad),
    enob: nothing('snr', figures.enob),
    enobFullScale: nothing('snr', figures.enobFullScale),
    headroom: nothing('headroom', figures.headroom),
    masks: figures.masks.filter((mask) => !keys.has(mask.limit)),
  };
}

function unjudged(limit: LimitFigure): LimitFigure {
  return {
    ...limit,
    value: null,
    nominal: null,
    margin: null,
    gap: null,
    judged: false,
    passes: false,
    where: null,
    worstAt: null,
  };
}

/** The frequencies that the table holds at every corner that its tolerance allows; an end that does not refuse is open. */
function coveredBy(stage: Stage, { table, below, beyond }: MeasuredForm): { readonly lowHz: number; readonly highHz: number } {
  const factors = factorsOf(stage.cornerTolerance);
  return {
    lowHz: below === 'refuse' ? (table.frequenciesHz[0] ?? 0) * factors.high : 0,
    highHz: beyond === 'refuse' ? (table.frequenciesHz.at(-1) ?? 0) * factors.low : Infinity,
  };
}

function farthest(
  stage: number,
  covers: { readonly lowHz: number; readonly highHz: number },
  side: BeyondData['side'],
  asked: readonly Question[],
): readonly BeyondData[] {
  const [first] = asked;
  if (first === undefined) return [];
  const sign = side === 'below' ? -1 : 1;
  const worst = asked.reduce((best, one) => (sign * one.frequencyHz > sign * best.frequencyHz ? one : best), first);
  return [
    {
      stage,
      side,
      endHz: side === 'below' ? covers.lowHz : covers.highHz,
      askedHz: worst.frequencyHz,
      asks: worst.asks,
      source: worst.source,
      keys: [...new Set(asked.flatMap((one) => one.keys))],
    },
  ];
}

function questionsOf(channel: Channel): readonly Question[] {
  return [...wantedQuestions(channel), ...sourceQuestions(channel), ...copyQuestions(channel), ...maskQuestions(channel)];
}

/** Every figure is about the wanted tone somewhere. */
function wantedQuestions({ wanted, testTone, stages }: Channel): readonly Question[] {
  const all = { from: 0, to: stages.length, source: null };
  return [
    ...wanted.flatMap(({ lowHz, highHz }) =>
      [lowHz, highHz].map((frequencyHz): Question => ({ ...all, frequencyHz, asks: 'wanted', keys: everyKey })),
    ),
    { ...all, frequencyHz: testTone.frequencyHz, asks: 'test tone', keys: ['snr'] },
  ];
}

/** A source may stand anywhere in its range, and passes the stages from where it enters to the sampler. */
function sourceQuestions({ direction, unwanted, inputStages, limits }: Channel): readonly Question[] {
  if (direction === 'generate') return [];
  const withUnwanted = limits.some((limit) => limit.key === 'snr' && limit.withUnwanted);
  const keys: readonly JudgedKey[] = ['alias', 'headroom', ...(withUnwanted ? (['snr'] as const) : [])];
  return unwanted.flatMap((source) => {
    const from = source.enters === 'input' ? 0 : source.enters === 'sampler' ? inputStages.length : source.enters.stage;
    return arrivalsOf(source).flatMap(({ range }) =>
      [range.low, range.high].map((frequencyHz): Question => {
        return { frequencyHz, from, to: inputStages.length, asks: 'source', source: source.name, keys };
      }),
    );
  });
}

/** Copies leave at every frequency from where the band appears upwards; in a relay landings do too, in the protected ranges. */
function copyQuestions({ direction, wanted, protect, rate, inputStages, stages }: Channel): readonly Question[] {
  if (direction === 'capture') return [];
  const behind = { from: inputStages.length, to: stages.length, source: null };
  const copies = wanted.flatMap((band) =>
    [appearance(band, rate.hz).low, Infinity].map((frequencyHz): Question => ({
      ...behind,
      frequencyHz,
      asks: 'copies',
      keys: ['image'],
    })),
  );
  if (direction === 'generate') return copies;
  const landings = (protect ?? []).flatMap(({ lowHz, highHz }) =>
    [lowHz, highHz].map((frequencyHz): Question => ({ ...behind, frequencyHz, asks: 'landings', keys: ['alias'] })),
  );
  return [...copies, ...landings];
}

function maskQuestions({ masks, stages }: Channel): readonly Question[] {
  return masks.flatMap(({ key, segments }) =>
    segments.flatMap(({ lowHz, highHz }) =>
      [lowHz, highHz].map((frequencyHz): Question => ({
        frequencyHz,
        from: 0,
        to: stages.length,
        asks: key,
        source: null,
        keys: [key],
      })),
    ),
  );
}
