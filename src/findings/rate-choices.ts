/** Which rates a channel's `rate-choices` allow: whether one is among them, and which come next. */
import type { Channel, RateChoices } from '../spec/channel';

/** Two rates closer than this, relatively, are the same: choices are reckoned by division. */
const sameRate = 1e-9;

/** Whether a rate is among the choices; any is where there are none. */
export function isAvailable(choices: RateChoices | null, rateHz: number): boolean {
  if (choices === null) return true;
  switch (choices.kind) {
    case 'list':
      return choices.ratesHz.some((hz) => same(hz, rateHz));
    case 'range':
      return inRange(choices, rateHz);
    case 'clock': {
      const divide = (choices.clock.frequencyHz * choices.clock.multiply) / rateHz;
      const whole = Math.round(divide);
      return whole >= 1 && same(divide, whole) && divideAllowed(choices.divides, whole);
    }
  }
}

/** The nearest allowed rates below and above one that is not allowed; null where there is none. */
export function neighbours(channel: Channel): { readonly below: number | null; readonly above: number | null } {
  const { rateChoices: choices, rate } = channel;
  if (choices === null) return { below: null, above: null };
  const near = nearRates(choices, rate.hz);
  const below = near.filter((hz) => hz < rate.hz);
  const above = near.filter((hz) => hz > rate.hz);
  return { below: below.length === 0 ? null : Math.max(...below), above: above.length === 0 ? null : Math.min(...above) };
}

/** Whether two rates are one, up to rounding. */
export function same(a: number, b: number): boolean {
  return Math.abs(a - b) <= sameRate * Math.max(Math.abs(a), Math.abs(b));
}

type RangeChoice = Extract<RateChoices, { kind: 'range' }>;
type ClockChoice = Extract<RateChoices, { kind: 'clock' }>;

function inRange({ lowHz, highHz, stepHz }: RangeChoice, rateHz: number): boolean {
  const inside = (rateHz >= lowHz || same(rateHz, lowHz)) && (rateHz <= highHz || same(rateHz, highHz));
  if (!inside || stepHz === null) return inside;
  const steps = (rateHz - lowHz) / stepHz;
  return Math.abs(steps - Math.round(steps)) <= sameRate * Math.max(1, rateHz / stepHz);
}

function divideAllowed(divides: ClockChoice['divides'], divide: number): boolean {
  return 'from' in divides ? divide >= divides.from && divide <= divides.to : divides.includes(divide);
}

function nearRates(choices: RateChoices, rateHz: number): readonly number[] {
  switch (choices.kind) {
    case 'list':
      return choices.ratesHz;
    case 'range':
      return nearSteps(choices, rateHz);
    case 'clock':
      return nearDivides(choices, rateHz);
  }
}

function nearSteps({ lowHz, highHz, stepHz }: RangeChoice, rateHz: number): readonly number[] {
  if (rateHz < lowHz) return [lowHz];
  if (stepHz === null) return [highHz];
  const last = Math.floor((highHz - lowHz) / stepHz + sameRate);
  const step = Math.min(Math.floor((rateHz - lowHz) / stepHz), last);
  return [step, step + 1].filter((index) => index <= last).map((index) => lowHz + index * stepHz);
}

function nearDivides({ clock, divides }: ClockChoice, rateHz: number): readonly number[] {
  const fundamental = clock.frequencyHz * clock.multiply;
  if (!('from' in divides)) return divides.map((divide) => fundamental / divide);
  const clamp = (divide: number): number => Math.min(Math.max(divide, divides.from), divides.to);
  const exact = fundamental / rateHz;
  return [clamp(Math.floor(exact)), clamp(Math.ceil(exact))].map((divide) => fundamental / divide);
}
