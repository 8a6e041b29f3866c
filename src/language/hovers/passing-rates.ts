/** The nearest other rates that a channel may run at and passes with. */
import { analyse, type JudgedKey } from '../../analysis';
import type { Channel, Rate, RateChoices } from '../../spec';

/** How many rates are named. */
const wantedRates = 3;
/** How many are tried, so that a hover answers at once. */
const triedRates = 24;

/** What is known of the other allowed rates. */
export interface PassingRates {
  /** The nearest that pass every limit, in rising order. */
  readonly ratesHz: readonly number[];
  /** The limits that fail at every rate that was tried. */
  readonly inTheWay: readonly JudgedKey[];
}

/** The other allowed rates; null where the channel does not list its rates. */
export function passingRates(channel: Channel): PassingRates | null {
  const allowed = channel.rateChoices === null ? null : listedRates(channel.rateChoices);
  if (allowed === null) return null;
  const present = channel.rate.hz;
  const distance = (rate: Rate): number => Math.abs(Math.log(rate.hz / present));
  const tried = allowed
    .map((choice) => rateOf(channel.rate, choice))
    .filter((rate) => distance(rate) > 1e-9)
    .sort((a, b) => distance(a) - distance(b))
    .slice(0, triedRates)
    .map((rate) => ({ rate, failing: failingAt(channel, rate) }));
  const passing = tried.filter(({ failing }) => failing.length === 0).slice(0, wantedRates);
  return {
    ratesHz: passing.map(({ rate }) => rate.hz).sort((a, b) => a - b),
    inTheWay: judgedKeys(channel).filter((key) => tried.every(({ failing }) => failing.includes(key))),
  };
}

function judgedKeys({ limits, levelLimit, masks }: Channel): readonly JudgedKey[] {
  return [...limits.map(({ key }) => key), ...(levelLimit === null ? [] : (['level'] as const)), ...masks.map(({ key }) => key)];
}

/** A rate that may be chosen: a plain one, or a divider of the chosen clock. */
type Choice = number | Pick<Rate, 'hz' | 'clock'>;

function listedRates(choices: RateChoices): Choice[] | null {
  switch (choices.kind) {
    case 'list':
      return [...choices.ratesHz];
    case 'range':
      return choices.stepHz === null ? null : steps(choices.lowHz, choices.highHz, choices.stepHz);
    case 'clock': {
      const { clock, divides } = choices;
      const list = 'from' in divides ? steps(divides.from, divides.to, 1) : divides;
      return list.map((divide) => ({ hz: (clock.frequencyHz * clock.multiply) / divide, clock: { ...clock, divide } }));
    }
  }
}

/** At most so many steps are listed; a range with more has its rates everywhere. */
const mostSteps = 10_000;

function steps(low: number, high: number, step: number): number[] {
  const count = Math.min(Math.floor((high - low) / step + 1e-9) + 1, mostSteps);
  return Array.from({ length: Math.max(0, count) }, (_, index) => low + index * step);
}

function rateOf(present: Rate, choice: Choice): Rate {
  return typeof choice === 'number' ? { ...present, hz: choice, clock: null } : { ...present, ...choice };
}

/** What keeps a rate from passing: limits, or the folding of the wanted band itself. */
function failingAt(channel: Channel, rate: Rate): readonly (JudgedKey | 'wanted-folds')[] {
  const figures = analyse({ ...channel, rate });
  const limits = figures.limits.filter(({ passes }) => !passes).map(({ limit }) => limit);
  return figures.faults.some(({ kind }) => kind === 'wanted-folds') ? [...limits, 'wanted-folds'] : limits;
}
