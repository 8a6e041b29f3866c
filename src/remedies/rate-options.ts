/** The rates that a fix may pick for a channel: those of `rate-choices`, or any with at most three figures. */
import { keepsWhole, rateWindowsOf } from '../analysis';
import { sameRate } from '../findings';
import type { Channel, ClockShare, RateChoices } from '../spec';
import { roundedMiddle } from './rounded-middle';

/** One rate, and how it is had from a clock where it is. */
export interface RateOption {
  readonly hz: number;
  readonly clock: Pick<ClockShare, 'name' | 'multiply' | 'divide'> | null;
}

/** Rates in ascending order, each keeping the wanted bands whole. */
export interface RateOptions {
  readonly above: readonly RateOption[];
  readonly below: readonly RateOption[];
  /** Whether somebody has chosen each of them, so that even one with a thin margin deserves to be offered. */
  readonly chosen: boolean;
}

/**
 * The rates to try, the likeliest set first. Where a clock offers a whole range of divisors, rates of three figures
 * come first, since people prefer 64 kHz to 57.42 kHz; all others follow as a set of their own.
 */
export function rateOptions(channel: Channel): readonly RateOptions[] {
  const { rateChoices: choices, rate } = channel;
  if (choices === null)
    return rate.clock === null ? [split(channel, figures(channel), false)] : clocked(channel, anyDivide(channel, rate.clock));
  switch (choices.kind) {
    case 'list':
      return [split(channel, choices.ratesHz.map(plain), true)];
    case 'range':
      return [
        choices.stepHz === null
          ? split(channel, figures(channel, choices), false)
          : split(channel, steps(choices, rate.hz), true),
      ];
    case 'clock':
      return clocked(channel, choices);
  }
}

type RangeChoice = Extract<RateChoices, { kind: 'range' }>;
type ClockChoice = Extract<RateChoices, { kind: 'clock' }>;

/** More options than this in one direction are not looked at. */
const most = 2000;

function clocked(channel: Channel, choice: ClockChoice): readonly RateOptions[] {
  const { clock, divides } = choice;
  const option = (divide: number): RateOption => ({
    hz: (clock.frequencyHz * clock.multiply) / divide,
    clock: { name: clock.name, multiply: clock.multiply, divide },
  });
  if (!('from' in divides)) return [split(channel, divides.map(option), true)];
  const all = divisors(divides, (clock.frequencyHz * clock.multiply) / channel.rate.hz).map(option);
  return [
    split(
      channel,
      all.filter(({ hz }) => hasThreeFigures(hz)),
      false,
    ),
    split(channel, all, false),
  ];
}

/** Divisors on both sides of the present one, as many as are looked at. */
function divisors({ from, to }: { from: number; to: number }, present: number): readonly number[] {
  const first = Math.max(from, Math.floor(present) - most);
  const last = Math.min(to, Math.ceil(present) + most);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => first + index);
}

/** Without choices a clock may be divided by anything that could still carry the wanted bands. */
function anyDivide(channel: Channel, clock: ClockShare): ClockChoice {
  const width = channel.wanted.reduce((sum, band) => sum + band.highHz - band.lowHz, 0);
  const to = Math.max(clock.divide, Math.floor((clock.frequencyHz * clock.multiply) / Math.max(2 * width, 1e-9)));
  return { kind: 'clock', clock, divides: { from: 1, to } };
}

function steps({ lowHz, highHz, stepHz }: RangeChoice, presentHz: number): readonly RateOption[] {
  const step = stepHz ?? highHz - lowHz;
  const last = Math.floor((highHz - lowHz) / step + 1e-9);
  const present = Math.round((presentHz - lowHz) / step);
  const first = Math.max(0, present - most);
  const count = Math.max(0, Math.min(last, present + most) - first + 1);
  return Array.from({ length: count }, (_, index) => plain(lowHz + (first + index) * step));
}

/**
 * Every rate of three figures from one that just carries the bands to well above twice the highest frequency, and for each window of
 * rates that is too narrow for three figures its middle.
 */
function figures(channel: Channel, range?: RangeChoice): readonly RateOption[] {
  const top = Math.max(...channel.wanted.map((band) => band.highHz + channel.guardHz));
  const width = Math.max(...channel.wanted.map((band) => band.highHz - band.lowHz));
  const low = Math.max(range?.lowHz ?? 0, Math.min(2 * width, channel.rate.hz));
  const high = Math.min(range?.highHz ?? Infinity, Math.max(8 * channel.rate.hz, 4 * top));
  const found: RateOption[] = [];
  for (let index = Math.ceil(threeFigureIndex(low)); found.length < 2 * most; index += 1) {
    const hz = threeFigures(index);
    if (hz > high) break;
    if (hz >= low) found.push(plain(hz));
  }
  const middles = rateWindowsOf(channel).windows.flatMap((window) => roundedMiddle(window) ?? []);
  return [...found, ...middles.filter((hz) => low <= hz && hz <= high && !hasThreeFigures(hz)).map(plain)];
}

/** Numbers of three figures, counted: 900 in each decade. */
function threeFigures(index: number): number {
  const decade = Math.floor(index / 900);
  return Number(`${index - decade * 900 + 100}e${decade - 2}`);
}

function threeFigureIndex(hz: number): number {
  const decade = Math.floor(Math.log10(hz));
  return decade * 900 + hz / 10 ** (decade - 2) - 100;
}

function hasThreeFigures(hz: number): boolean {
  return sameRate(hz, Number(hz.toPrecision(3)));
}

function plain(hz: number): RateOption {
  return { hz, clock: null };
}

function split(channel: Channel, options: readonly RateOption[], chosen: boolean): RateOptions {
  const whole = options.filter(({ hz }) => !sameRate(hz, channel.rate.hz) && keepsWhole(channel, hz));
  const sorted = [...whole].sort((a, b) => a.hz - b.hz);
  return {
    above: sorted.filter(({ hz }) => hz > channel.rate.hz),
    below: sorted.filter(({ hz }) => hz < channel.rate.hz),
    chosen,
  };
}
