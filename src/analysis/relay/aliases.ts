/** The strongest copy of each unwanted source in the protected ranges of a relay channel, nominally and at the worst of all tolerances. */
import type { Channel, Limit, Source } from '../../spec/channel';
import { aliasesFrom, heldTo, noAliases, noLanding, notAbove } from '../alias';
import type { Aliases, Found } from '../alias';
import { arrivalsOf, mayMove, nominalArrivals } from '../arrivals';
import { powerOf } from '../decibels';
import type { AliasFigure } from '../figures';
import { protectedAt } from '../landing-point';
import { deviation, joinWorst, toneLabel } from '../tolerances';
import { relayLandings, strongestLandings, weakestWantedDb } from './landings';
import type { Landed, Landings, Measure } from './landings';
import { rateDeviation, rateScale, relayViews } from './views';
import type { RelayViews } from './views';

/** Every source's strongest copy in a protected range, measured as the alias limit measures it. */
export function relayAliases(channel: Channel, limit: Limit | null): Aliases {
  if (channel.unwanted.length === 0) return noAliases;
  const views = relayViews(channel);
  const measure: Measure = limit?.unit === 'dBc' ? 'relative' : 'level';
  const found = channel.unwanted.map((source, index): Found => {
    const nominal = relayLandings(views.nominal, source.enters, nominalArrivals(source), measure);
    const still = views.worst[0] === views.nominal && !mayMove(source);
    const worst = still ? nominal : worstLandings(views, source, measure);
    return foundOf(channel, source, index, { nominal, worst, limit });
  });
  return aliasesFrom(found, limit);
}

/** The landings of one source over a tone's own power as it leaves, with the tone's level counted out. */
export function relayLandingsOverTone(
  channel: Channel,
  source: Source,
  toneHz: number,
  at: 'nominal' | 'worst',
): { readonly power: number; readonly evaluations: number } {
  const views = relayViews({ ...channel, referenceHz: toneHz });
  const { sum, evaluations } =
    at === 'nominal'
      ? relayLandings(views.nominal, source.enters, nominalArrivals(source), 'relative')
      : worstLandings(views, source, 'relative');
  return { power: sum === null ? 0 : powerOf(sum.relativeDb + weakestWantedDb(channel)), evaluations };
}

function worstLandings(views: RelayViews, source: Source, measure: Measure): Landings {
  return strongestLandings(views.worst.map((view) => relayLandings(view, source.enters, arrivalsOf(source), measure)));
}

interface Outcome {
  readonly nominal: Landings;
  readonly worst: Landings;
  readonly limit: Limit | null;
}

function foundOf(channel: Channel, source: Source, index: number, { nominal, worst, limit }: Outcome): Found {
  const evaluations = nominal.evaluations + (worst === nominal ? 0 : worst.evaluations);
  const { strongest } = worst;
  if (strongest === null) {
    return { figure: noLanding(source, index, limit), nominal: null, sum: null, nominalSum: null, gapDb: 0, evaluations };
  }
  const plain = nominal.strongest === null ? null : notAbove(nominal.strongest.levels, strongest.levels);
  return {
    figure: figureOf(
      channel,
      { source, index, strongest, sumDb: worst.sum?.levelDb ?? null, nominalDb: plain?.levelDb ?? null },
      limit,
    ),
    nominal: plain,
    sum: worst.sum,
    nominalSum: nominal.sum === null || worst.sum === null ? null : notAbove(nominal.sum, worst.sum),
    gapDb: worst.gapDb,
    evaluations,
  };
}

/** What a figure is made of. */
interface Reached {
  readonly source: Source;
  readonly index: number;
  readonly strongest: Landed;
  readonly sumDb: number | null;
  readonly nominalDb: number | null;
}

function figureOf(channel: Channel, { source, index, strongest, sumDb, nominalDb }: Reached, limit: Limit | null): AliasFigure {
  const { levels, arrival, extreme, view } = strongest;
  const scale = scaleOf(strongest);
  const frequencyHz = extreme.farHz * scale;
  const endless = extreme.copy === Infinity;
  const held = heldTo(limit, levels);
  const moved =
    source.kind === 'tone' && mayMove(source)
      ? { [toneLabel(source)]: deviation(frequencyHz / (arrival.harmonic * source.frequencyHz), source.tolerance) }
      : null;
  return {
    source: source.name,
    index,
    harmonic: arrival.harmonic,
    frequency: frequencyHz,
    lands: endless ? null : extreme.nearHz * scale,
    fold: endless ? null : Math.abs(extreme.copy),
    inverted: endless ? null : extreme.nearHz + extreme.copy * view.relay.rateHz < 0,
    level: levels.levelDb,
    nominal: nominalDb,
    sum: sumDb,
    relative: levels.relativeDb,
    limit: held.limit,
    margin: held.margin,
    gap: extreme.gapDb,
    worstAt: joinWorst(strongest.worstAt, rateDeviation(channel, scale * view.relay.rateHz), moved),
  };
}

/** What a view counts in periods, in hertz: at the rate that puts both frequencies where they may be. */
function scaleOf({ view, arrival, extreme }: Landed): number {
  if (extreme.copy === Infinity) return 1;
  return rateScale(view, [
    { frequencyHz: extreme.nearHz, range: protectedAt(view.channel, view.relay.rateHz) },
    { frequencyHz: extreme.farHz, range: [arrival.range] },
  ]);
}
