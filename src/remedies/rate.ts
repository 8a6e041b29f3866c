/** The change of a channel's rate: the next allowed one that works, and the lowest. */
import { sameRate, zoneWords } from '../findings';
import { zoneOf } from '../signal/folding';
import { editValue, spanOf, type Channel, type ClockShare, type Edit, type Place } from '../spec';
import { formatFrequency } from '../units/format';
import type { Change } from './change';
import { firstThatWorks, type AttemptAt } from './first-that-works';
import { rewriteQuantity } from './quantity-text';
import { rateOptions, type RateOption, type RateOptions } from './rate-options';
import type { Session } from './session';
import { works, worksCleanly, type Trial } from './trial';

/** Proved changes of the rate, on top of changes that are made anyway; the next higher rate first, then the lowest. */
export function* rateTrials(session: Session, base: readonly Change[] = []): Generator<void, readonly Trial[]> {
  for (const options of rateOptions(session.channel)) {
    const next = yield* upwards(session, options, base);
    const lowest = base.length > 0 && next.length > 0 ? [] : yield* downwards(session, options, base);
    if (next.length + lowest.length > 0) return [...next, ...lowest];
  }
  return [];
}

/** The change to one rate, or null where the spec's form of a rate cannot say it. */
export function rateChange(session: Session, option: RateOption): Change | null {
  const { rate } = session.channel;
  const share = rate.clock === null ? null : shareFor(rate.clock, option);
  if (rate.clock !== null && share === null) return null;
  const edits = share === null ? [plainEdit(session, option.hz)] : shareEdits(session, share);
  const made = edits.filter((edit) => edit !== null);
  if (made.length < edits.length) return null;
  return { kind: 'rate', says: rateWords(session.channel, option.hz, share), about: null, edits: made };
}

/** What a change of the rate is called; where a band is, or will be, above half the rate, the zone counts more than the direction. */
function rateWords(channel: Channel, hz: number, share: Share | null): string {
  const zones = (rateHz: number): readonly number[] => channel.wanted.map((band) => zoneOf(band.lowHz, rateHz));
  const after = zones(hz);
  const divided = share === null ? [] : [`÷${share.divide}`];
  const isPlain = [...after, ...zones(channel.rate.hz)].every((zone) => zone === 1);
  const told = [...divided, ...(isPlain ? [] : [zoneWords(after)])].join(', ');
  const verb = isPlain ? `${hz > channel.rate.hz ? 'Raise' : 'Lower'} the rate to` : 'Sample at';
  // A written rate is printed whole; a divided one is rounded, since nobody writes it.
  const frequency = share === null ? formatFrequency(hz, hz * 1e-9) : formatFrequency(hz);
  return `${verb} ${frequency}${told === '' ? '' : ` (${told})`}`;
}

type Share = Pick<ClockShare, 'multiply' | 'divide'>;

/** The whole numbers that give a rate from the clock that the channel names, or null. */
function shareFor(clock: ClockShare, option: RateOption): Share | null {
  const multiply = option.clock?.multiply ?? clock.multiply;
  const divide = (clock.frequencyHz * multiply) / option.hz;
  const whole = Math.round(divide);
  return whole >= 1 && sameRate(divide, whole) ? { multiply, divide: whole } : null;
}

function plainEdit({ reading, channel }: Session, hz: number): Edit | null {
  const place: Place = { channel: channel.name, path: ['rate'] };
  const { start, end } = spanOf(reading, place);
  return editValue(reading, place, rewriteQuantity(reading.text.slice(start, end), channel.rate.hz, hz, 'Hz'));
}

function shareEdits({ reading, channel }: Session, share: Share): readonly (Edit | null)[] {
  const keys = (['multiply', 'divide'] as const).filter((key) => share[key] !== channel.rate.clock?.[key]);
  return keys.map((key) => editValue(reading, { channel: channel.name, path: ['rate', key] }, String(share[key])));
}

/**
 * Whether a rate is one to stop at: where the finding is about the rate itself, one at which the whole channel passes, since such a
 * channel has been judged at a rate that it could not run at.
 */
export function settles({ finding }: Session): (trial: Trial) => boolean {
  return finding.limit === null ? (trial) => worksCleanly(trial) && trial.passes : worksCleanly;
}

/** The first rate above that works without a new warning; where each rate has been chosen by somebody, also the first that works at all. */
function* upwards(session: Session, { above, chosen }: RateOptions, base: readonly Change[]): Generator<void, readonly Trial[]> {
  const attemptAt = attempting(session, above, base);
  const first = yield* firstThatWorks(above.length, attemptAt, works);
  const good = settles(session);
  if (first === null || good(first.trial)) return first === null ? [] : [first.trial];
  const clean = yield* firstThatWorks(above.length, attemptAt, good, first.index + 1);
  if (clean === null) return [first.trial];
  return chosen ? [first.trial, clean.trial] : [clean.trial];
}

/** How many lower rates are looked at, from the lowest up. */
const lowerRates = 24;

/** The lowest rate below that works without a new warning, of a few spread evenly where there are many. */
function* downwards(session: Session, { below }: RateOptions, base: readonly Change[]): Generator<void, readonly Trial[]> {
  const stride = Math.max(1, Math.ceil(below.length / lowerRates));
  const attemptAt = attempting(session, below, base);
  for (let index = 0; index < below.length; index += stride) {
    const trial = yield* attemptAt(index);
    if (trial !== null && settles(session)(trial)) return [trial];
  }
  return [];
}

function attempting(session: Session, options: readonly RateOption[], base: readonly Change[]): AttemptAt {
  return function* (index) {
    const option = options[index];
    return option === undefined ? null : yield* session.attempt([...base, rateChange(session, option)]);
  };
}
