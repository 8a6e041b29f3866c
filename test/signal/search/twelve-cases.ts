/** Twelve named hard cases for the proved maximum; each with its own plain gain over frequency, which shares nothing with the bounds. */
import { butterworth } from '../../../src/signal/families/butterworth';
import { chebyshev } from '../../../src/signal/families/chebyshev';
import { filterResponse, type Filter, type Root } from '../../../src/signal/filter';
import { rectangleResponse } from '../../../src/signal/pulses/rectangle';
import type { Response } from '../../../src/signal/response';
import { constantResponse, inverse, product } from '../../../src/signal/response-algebra';
import { largestOverBands, largestOverFolds, type Extreme, type FoldQuestion } from '../../../src/signal/search';
import { stretched } from '../../../src/signal/stretched';

/** One case. */
export interface HardCase {
  readonly name: string;
  /** The proved search. */
  readonly prove: () => Extreme | null;
  /** Power gain |H|² by a plain formula at a share 0 … 1 of everything that is searched (to a last fold, where it is endless). */
  readonly powerAt: (share: number) => number;
  /** The same plain power gain at the frequency that was found (and the x it lands on); the limit where that is infinite. */
  readonly powerThere: (frequencyHz: number, landsHz: number) => number;
}

const everything = { firstFold: 1, lastFold: Infinity, sides: 'both', inner: null, within: null } as const;

function exact(rateHz: number): { readonly low: number; readonly high: number } {
  return { low: rateHz, high: rateHz };
}

/** |H|² of poles by complex distances, 1 at 0 Hz where `scale` is 1. */
function polesPower(poles: readonly Root[], scale: number): (f: number) => number {
  const re = Float64Array.from(poles, (pole) => pole.re);
  const im = Float64Array.from(poles, (pole) => pole.im);
  const own = Float64Array.from(poles, (pole) => pole.re ** 2 + pole.im ** 2);
  return (f) => {
    let power = scale;
    for (let i = 0; i < re.length; i += 1) power *= own[i]! / (re[i]! * re[i]! + (f - im[i]!) * (f - im[i]!));
    return power;
  };
}

function filterPower(filter: Filter): (f: number) => number {
  return polesPower(filter.poles, filter.gainAt.gain ** 2);
}

function sincPower(x: number): number {
  return x === 0 ? 1 : (Math.sin(Math.PI * x) / (Math.PI * x)) ** 2;
}

/** F and x at a share of all rungs up to a last fold. */
function rungAt(
  share: number,
  rateHz: number,
  band: readonly [number, number],
  lastFold: number,
): { readonly f: number; readonly x: number } {
  const place = Math.min(share, 1 - 1e-15) * 2 * lastFold;
  const rung = Math.floor(place);
  const x = band[0] + (place - rung) * (band[1] - band[0]);
  const fold = Math.floor(rung / 2) + 1;
  return { f: rung % 2 === 0 ? fold * rateHz - x : fold * rateHz + x, x };
}

function overBand(
  name: string,
  filter: Filter,
  high: number,
  extra: (f: number) => number = () => 1,
  extraResponse = constantResponse(0),
): HardCase {
  const power = filterPower(filter);
  const response = product([filterResponse(filter), extraResponse]);
  return {
    name,
    prove: () => largestOverBands(response, [{ low: 0, high }]),
    powerAt: (share) => power(share * high) * extra(share * high),
    powerThere: (f) => power(f) * extra(f),
  };
}

interface FoldCase {
  readonly name: string;
  readonly question: Omit<FoldQuestion, 'rateHz'>;
  readonly rateHz: number;
  readonly band: readonly [number, number];
  /** How far the plain samples go; the proof goes to infinity. */
  readonly lastFold: number;
  readonly power: (f: number, x: number) => number;
}

function overFolds({ name, question, rateHz, band, lastFold, power }: FoldCase): HardCase {
  return {
    name,
    prove: () => largestOverFolds({ rateHz: exact(rateHz), ...question }),
    powerAt: (share) => {
      const { f, x } = rungAt(share, rateHz, band, lastFold);
      return power(f, x);
    },
    powerThere: power,
  };
}

function enclosure([low, high]: readonly [number, number]): readonly [{ readonly low: number; readonly high: number }] {
  return [{ low, high }];
}

function pair(re: number, im: number): readonly Root[] {
  return [
    { re, im },
    { re, im: -im },
  ];
}

const unknownTurns = (filter: Filter): Filter => ({ ...filter, turnsHz: null });

function equalRipples(): HardCase {
  return overBand(
    'order 20, ten equal ripples of 0.1 dB, turning points not told',
    unknownTurns(chebyshev(20, 20e3, 0.1, 'ripple')),
    20e3,
  );
}

function sharpEdge(): HardCase {
  const filter = unknownTurns(chebyshev(20, 20e3, 1, 'ripple'));
  const power = filterPower(filter);
  const response = inverse(filterResponse(filter));
  return {
    name: 'order 20, the smallest gain of a sharp passband',
    prove: () => largestOverBands(response, [{ low: 0, high: 20.05e3 }]),
    powerAt: (share) => 1 / power(share * 20.05e3),
    powerThere: (f) => 1 / power(f),
  };
}

function flatTop(): HardCase {
  return overBand(
    'Butterworth of order 12 over its flat top, turning points not told',
    unknownTurns(butterworth(12, 20e3)),
    20e3,
  );
}

function rippleAgainstDroop(): HardCase {
  const filter = chebyshev(8, 20e3, 0.2, 'ripple');
  return overBand(
    'ripples of a Chebyshev filter against the droop of a hold',
    filter,
    22e3,
    (f) => sincPower(f / 48e3),
    rectangleResponse(1 / 48e3),
  );
}

function twoRipples(): HardCase {
  const one = unknownTurns(chebyshev(20, 20e3, 1, 'ripple'));
  const other = chebyshev(13, 21e3, 1, 'ripple');
  const otherPower = filterPower(other);
  return overBand('ripples of two sharp filters beating against each other', one, 20e3, otherPower, filterResponse(other));
}

/** Where a 10,000-point grid over 0 … 2 MHz never looks: a resonance 3 Hz wide, halfway between two of its points. */
export const betweenPointsHz = 200 * 4321.5;

function betweenPoints(): HardCase {
  const filter: Filter = { poles: pair(-1.5, betweenPointsHz), zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: null };
  const power = filterPower(filter);
  return {
    name: 'a resonance 3 Hz wide between the points of a 10,000-point grid over 2 MHz',
    prove: () => largestOverBands(filterResponse(filter), [{ low: 0, high: 2e6 }]),
    powerAt: (share) => power(share * 2e6),
    powerThere: power,
  };
}

function deepResonance(): HardCase {
  const filter: Filter = {
    poles: [...pair(-3, 1.23456e6), { re: -30e3, im: 0 }],
    zeros: [],
    gainAt: { frequencyHz: 0, gain: 1 },
    turnsHz: null,
  };
  const response = filterResponse(filter);
  return overFolds({
    name: 'a resonance in the 24th fold, all folds to infinity',
    rateHz: 51.2e3,
    band: [5, 10e3],
    lastFold: 40,
    power: filterPower(filter),
    question: { ...everything, outer: response, bands: enclosure([5, 10e3]) },
  });
}

function holdNulls(): HardCase {
  return overFolds({
    name: 'narrow band at the nulls of a bare hold: every fold nearly alike',
    rateHz: 48e3,
    band: [0, 1e3],
    lastFold: 400,
    power: (f) => sincPower(f / 48e3),
    question: { ...everything, outer: rectangleResponse(1 / 48e3), bands: enclosure([0, 1e3]) },
  });
}

function wideHold(): HardCase {
  const filter = chebyshev(9, 130e3, 1.5, 'ripple');
  const power = filterPower(filter);
  const path = product([rectangleResponse(1 / 48e3), filterResponse(filter)]);
  return overFolds({
    name: 'images of a wide band against the wanted tone itself, hold nulls and ripples in both',
    rateHz: 48e3,
    band: [20, 23.9e3],
    lastFold: 60,
    power: (f, x) => (sincPower(f / 48e3) * power(f)) / (sincPower(x / 48e3) * power(x)),
    question: { ...everything, outer: path, inner: inverse(path), bands: enclosure([20, 23.9e3]) },
  });
}

function narrowHold(): HardCase {
  const filter = chebyshev(11, 5.3e6, 1, 'ripple');
  const power = filterPower(filter);
  return overFolds({
    name: 'a hold of a twelfth of the period and a filter that ripples over five folds',
    rateHz: 1e6,
    band: [50e3, 450e3],
    lastFold: 100,
    power: (f) => sincPower(f / 12e6) * power(f),
    question: {
      ...everything,
      outer: product([rectangleResponse(1 / 12e6), filterResponse(filter)]),
      bands: enclosure([50e3, 450e3]),
    },
  });
}

function stretchedRipple(): HardCase {
  const filter = chebyshev(7, 40e3, 1, 'ripple');
  const power = filterPower(filter);
  const worst = product([stretched(filterResponse(filter), { low: 0.9, high: 1.1 }, 'largest'), rectangleResponse(1 / 96e3)]);
  const factors = Array.from({ length: 41 }, (_, index) => 0.9 + 0.005 * index);
  return {
    name: 'a rippling stage whose corner may be 10 % off, against the droop of a hold',
    prove: () => largestOverBands(worst, [{ low: 5e3, high: 60e3 }]),
    powerAt: (share) => {
      const f = 5e3 + share * 55e3;
      // One factor a sample, another one at the next: a million samples cover both axes.
      const factor = factors[Math.floor(share * 999_983) % factors.length]!;
      return power(f / factor) * sincPower(f / 96e3);
    },
    powerThere: (f) => {
      let best = 0;
      for (let factor = 0.9; factor <= 1.1; factor += 1e-5) best = Math.max(best, power(f / factor));
      return best * sincPower(f / 96e3);
    },
  };
}

function approachedAtInfinity(): HardCase {
  const filter: Filter = { poles: pair(-1e3, 40e3), zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: null };
  const power = filterPower(filter);
  return overFolds({
    name: 'a gain that rises in every fold and is only approached at infinity',
    rateHz: 100e3,
    band: [1e3, 20e3],
    lastFold: 5000,
    power: (f) => 1 / (1 + power(f)),
    question: { ...everything, outer: saturating(filterResponse(filter)), bands: enclosure([1e3, 20e3]) },
  });
}

/** 1/√(1 + |H|²): rises towards 1 as H falls away. */
export function saturating(response: Response): Response {
  const turned = (logGain: number): number => -0.5 * Math.log1p(Math.exp(2 * logGain));
  return {
    logGain: (f) => turned(response.logGain(f)),
    bounds: (low, high) => {
      const bounds = response.bounds(low, high);
      return { low: turned(bounds.high), high: turned(bounds.low) };
    },
    slope: (low, high) => {
      const slope = response.slope(low, high);
      const share = Math.exp(2 * response.bounds(low, high).high);
      // d/df = −|H|²/(1 + |H|²)·d ln|H|/df, a factor between −1 and 0.
      const factor = share / (1 + share);
      return slope === null ? null : { low: Math.min(-slope.high * factor, 0), high: Math.max(-slope.low * factor, 0) };
    },
  };
}

/** The twelve. */
export const twelveCases: readonly HardCase[] = [
  equalRipples(),
  sharpEdge(),
  flatTop(),
  rippleAgainstDroop(),
  twoRipples(),
  betweenPoints(),
  deepResonance(),
  holdNulls(),
  wideHold(),
  narrowHold(),
  stretchedRipple(),
  approachedAtInfinity(),
];
