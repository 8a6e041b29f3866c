/** What a relay channel lets out of its wanted band besides the band itself: the strongest point of every copy, to infinity. */
import type { CopyAxis } from '../../signal/copy-axis';
import { inverse, product } from '../../signal/response-algebra';
import type { Response } from '../../signal/response';
import type { CopyExtreme } from '../../signal/search';
import type { Channel, Limit, WantedBand } from '../../spec/channel';
import { axisFactors } from '../axis';
import { gainWithCornersDb } from '../capture-view';
import { deviationsAt } from '../corners';
import type { Corners } from '../corners';
import { reportedFolds } from '../copies';
import { toDb } from '../decibels';
import { imagesFrom, measureOf } from '../image';
import type { Image, Images } from '../image';
import type { Measure } from '../image-search';
import { joinWorst } from '../tolerances';
import type { WorstAt } from '../figures';
import { tiedStage } from '../worst-stage';
import type { MovedStage } from '../worst-stage';
import { strongestArriving } from './copy-search';
import { inView, rateDeviation, rateScale, relayViews, sideOf } from './views';
import type { RelayView } from './views';
import { weightResponse } from './weights';

/** Every copy's strongest point, measured as the image limit measures it; by level where there is none. */
export function relayImages(channel: Channel, limit: Limit | null): Images {
  const views = relayViews(channel);
  const measure = measureOf(limit);
  const found = channel.wanted.flatMap((band) => {
    const nominal = pointsOf(views.nominal, band, measure);
    return views.worst.flatMap((view) => {
      const worst = view === views.nominal ? nominal : pointsOf(view, band, measure);
      return worst.flatMap((point, index) => {
        const still = nominal[index];
        return still === undefined ? [] : [imageOf(channel, band, point, still)];
      });
    });
  });
  return imagesFrom(found, limit);
}

/** One search: the copies from first to last on one side of their multiples of the rate, or on both. */
interface Search {
  readonly first: number;
  readonly last: number;
  readonly side: 'upper' | 'lower' | 'both';
}

const reported = Array.from({ length: reportedFolds }, (_, index) => index + 1);

/** The copies that are reported one by one, then all others. */
const searches: readonly Search[] = [
  ...reported.flatMap((fold) => (['lower', 'upper'] as const).map((side) => ({ first: fold, last: fold, side }))),
  { first: reportedFolds + 1, last: Infinity, side: 'both' },
];

/** A copy's strongest point in levels. */
interface Point {
  readonly view: RelayView;
  readonly extreme: CopyExtreme;
  readonly levelDb: number;
  readonly relativeDb: number;
  readonly worstAt: WorstAt | null;
}

function pointsOf(view: RelayView, band: WantedBand, measure: Measure): readonly Point[] {
  if (view.relay.weights.lastCopy === 0) return [];
  const question = measure === 'relative' ? relativeQuestion(view) : levelQuestion(view);
  return searches.flatMap((copies) => {
    const { tied } = question;
    const single = copies.first === copies.last && tied !== null;
    const extreme = strongestArriving({
      relay: view.relay,
      arrives: [inView(view, { low: band.lowHz, high: band.highHz })],
      copies,
      input: question.input,
      output: question.output,
      ...(single ? { tied } : {}),
    });
    return extreme === null ? [] : [question.pointOf(extreme, band.levelDb)];
  });
}

/** How copies are measured under a view. */
interface ImageQuestion {
  readonly input: Response;
  readonly output: Response;
  /** What the parts do to a copy and to the wanted output at once; null where nothing of them varies. */
  readonly tied: ((axis: CopyAxis) => Response) | null;
  pointOf(extreme: CopyExtreme, statedDb: number): Point;
}

/** The copy's own level: the input filter where it arrives, the output filter where it leaves. */
function levelQuestion(view: RelayView): ImageQuestion {
  const { relay, channel } = view;
  const input = sideOf(view, relay.input, 'largest', channel.levelsAt === 'sampler' ? channel.referenceHz : null);
  const output = sideOf(view, relay.output, 'largest', null);
  return {
    input: input.response,
    output: output.response,
    tied: null,
    pointOf: (extreme, statedDb) => ({
      view,
      extreme,
      levelDb: statedDb + toDb(extreme.logGain),
      relativeDb: againstWantedDb(view, extreme, output.cornersAt(extreme.farHz)),
      worstAt: joinWorst(input.worstAt(extreme.nearHz), output.worstAt(extreme.farHz)),
    }),
  };
}

/** Against the same tone's wanted output, where the input filter and the level cancel. */
function relativeQuestion(view: RelayView): ImageQuestion {
  const { relay } = view;
  const least = sideOf(view, relay.output, 'smallest', null);
  const most = sideOf(view, relay.output, 'largest', null);
  const wanted = weightResponse(relay.weights.copy(0));
  const ties = view.parts === 'worst' ? tiesOf(view) : null;
  const nominal = relay.output.stages.map(() => 1);
  return {
    input: inverse(product([wanted, least.response])),
    output: most.response,
    tied: ties === null ? null : (axis) => product([inverse(wanted), ...ties.map((tie) => tie(axis).response)]),
    pointOf: (extreme, statedDb) => {
      const axis = axisOf(extreme, relay.rateHz);
      const corners =
        ties === null || extreme.copy === Infinity ? nominal : ties.map((tie) => tie(axis).settingAt(extreme.nearHz));
      return {
        view,
        extreme,
        levelDb: statedDb + leavesDb(view, extreme, corners),
        relativeDb: toDb(extreme.logGain),
        worstAt: ties === null ? null : deviationsAt(relay.output, corners),
      };
    },
  };
}

/** One stage seen at both frequencies at once. */
type Tie = (axis: CopyAxis) => MovedStage;

const same: CopyAxis = { offsetHz: 0, direction: 1 };

function tiesOf({ relay, channel }: RelayView): readonly Tie[] {
  const { periods } = axisFactors(channel);
  return relay.output.stages.map(
    (stage): Tie =>
      (axis) =>
        tiedStage(stage, periods, axis, same),
  );
}

/** The branch of a copy that a point lies on. */
function axisOf({ copy, nearHz }: CopyExtreme, rateHz: number): CopyAxis {
  const shift = copy * rateHz;
  return nearHz + shift < 0 ? { offsetHz: -shift, direction: -1 } : { offsetHz: shift, direction: 1 };
}

/** The weight of the copy at a point, over the output frequency with its sign; 0 at infinity. */
function weightLog({ relay }: RelayView, { copy, nearHz, farHz }: CopyExtreme): number {
  if (copy === Infinity) return -Infinity;
  const mirrored = nearHz + copy * relay.rateHz < 0;
  return weightResponse(relay.weights.copy(mirrored ? -copy : copy)).logGain(farHz);
}

function againstWantedDb(view: RelayView, extreme: CopyExtreme, corners: Corners): number {
  const { output, weights } = view.relay;
  const wantedDb =
    toDb(weightResponse(weights.copy(0)).logGain(extreme.nearHz)) + gainWithCornersDb(output, extreme.nearHz, corners);
  return toDb(weightLog(view, extreme)) + gainWithCornersDb(output, extreme.farHz, corners) - wantedDb;
}

/** A copy of a tone at 0 dB as it leaves. */
function leavesDb(view: RelayView, extreme: CopyExtreme, corners: Corners): number {
  const { relay, channel } = view;
  const nominal = relay.input.stages.map(() => 1);
  const referenceDb = channel.levelsAt === 'sampler' ? gainWithCornersDb(relay.input, channel.referenceHz, nominal) : 0;
  const arrivesDb = gainWithCornersDb(relay.input, extreme.nearHz, nominal) - referenceDb;
  return arrivesDb + toDb(weightLog(view, extreme)) + gainWithCornersDb(relay.output, extreme.farHz, corners);
}

function imageOf(channel: Channel, band: WantedBand, worst: Point, still: Point): Image {
  const { extreme, view } = worst;
  const scale = rateScale(view, [{ frequencyHz: extreme.nearHz, range: [{ low: band.lowHz, high: band.highHz }] }]);
  const levelDb = worst.levelDb;
  return {
    copy: { fold: Math.abs(extreme.copy), side: extreme.copy < 0 ? 'lower' : 'upper' },
    fromHz: extreme.nearHz * scale,
    frequencyHz: extreme.farHz * scale,
    levelDb,
    relativeDb: worst.relativeDb,
    nominalLevelDb: Math.min(still.levelDb, levelDb),
    nominalRelativeDb: Math.min(still.relativeDb, worst.relativeDb),
    gapDb: extreme.gapDb,
    worstAt: joinWorst(worst.worstAt, rateDeviation(channel, scale * view.relay.rateHz)),
    evaluations: extreme.evaluations + (still === worst ? 0 : still.extreme.evaluations),
  };
}
