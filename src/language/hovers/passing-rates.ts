/** The nearest other rates that a channel may run at and passes with. */
import { analyse } from '../../analysis';
import type { Channel, Rate, RateChoices } from '../../spec';

/** How many rates are named. */
const wantedRates = 3;
/** How many are tried, so that a hover answers at once. */
const triedRates = 24;

/** The nearest allowed rates that pass every limit, in rising order; null where the channel does not list its rates. */
export function passingRates(channel: Channel): readonly number[] | null {
  const allowed = channel.rateChoices === null ? null : listedRates(channel.rateChoices);
  if (allowed === null) return null;
  const present = channel.rate.hz;
  const distance = (rate: Rate): number => Math.abs(Math.log(rate.hz / present));
  return allowed
    .map((choice) => rateOf(channel.rate, choice))
    .filter((rate) => distance(rate) > 1e-9)
    .sort((a, b) => distance(a) - distance(b))
    .slice(0, triedRates)
    .filter((rate) => passesAt(channel, rate))
    .slice(0, wantedRates)
    .map((rate) => rate.hz)
    .sort((a, b) => a - b);
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

function passesAt(channel: Channel, rate: Rate): boolean {
  const figures = analyse({ ...channel, rate });
  return figures.limits.every((limit) => limit.passes) && !figures.faults.some(({ kind }) => kind === 'wanted-folds');
}
