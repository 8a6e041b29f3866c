/** A pulse at the worst that the rate's tolerance makes of it. */
import { factorResponse, pulseFactors, type PulseFactor } from '../signal/pulses/pulse-response';
import type { Enclosure, Response } from '../signal/response';
import { constantResponse, inverse, largestOf } from '../signal/response-algebra';
import { axisFactors } from './axis';
import { relativeTo } from './channel-path';
import type { ChannelPath } from './channel-path';
import { pulseAreaLog, pulseMoves } from './pulse';
import { pulseShape } from './pulse-shape';
import { stretchedFrom, type WorstQuestion } from './stretched-from';
import { rateRange, varies } from './tolerances';
import { wantedPulse } from './wanted-pulse';

/** A pulse at its worst. */
export interface WorstPulse {
  /** In series; none for `instant`. */
  readonly responses: readonly Response[];
  /** The rate over nominal at which the worst is reached at a frequency; null where the rate moves nothing, or is the axis. */
  readonly rateFactorAt: ((frequencyHz: number) => number) | null;
}

/**
 * The pulse's worst over all allowed rates.
 *
 * One that follows the rate is the same at every rate in periods, and is stretched in hertz. One whose lengths are times stays as it is; as
 * a hold it gains as the rate rises, since its area is then more of a period. One with lengths of both kinds is looked at in hertz only:
 * the parts that it is the convolution of are stretched each by itself, which is a proved bound, and its area is taken at its worst. Only an
 * exponential pulse of both kinds is no such product; it is taken at the worst of nominal and either end of the rate.
 */
export function worstPulse(path: ChannelPath, question: WorstQuestion): WorstPulse {
  const { channel, pulse } = path;
  if (channel.gate !== null) return worstGate(path, question);
  if (channel.pulse.shape === 'instant') return { responses: [], rateFactorAt: null };
  if (!varies(channel.rate.tolerance) || question.axis === 'periods') return unmoved(pulse, question);
  const moves = pulseMoves(channel.pulse);
  if (moves === 'follows') return moved(path, question);
  if (moves === 'stays') {
    const shift = areaShift(path, question);
    const responses = [...shift, fixed(pulse, question)];
    return { responses, rateFactorAt: shift.length === 0 ? null : worstRateAt(path, question) };
  }
  const responses = channel.pulse.shape === 'exponential' ? [worstOfRates(path, question)] : worstFactors(path, question);
  return { responses, rateFactorAt: worstRateAt(path, question) };
}

function unmoved(pulse: Response, question: WorstQuestion): WorstPulse {
  return { responses: [fixed(pulse, question)], rateFactorAt: null };
}

/** A pulse that follows the rate, in hertz. */
function moved({ channel, pulse }: ChannelPath, question: WorstQuestion): WorstPulse {
  const worst = stretchedFrom(pulse, axisFactors(channel).hertz, question);
  return { responses: [worst.response], rateFactorAt: (frequencyHz) => worst.factorAt(frequencyHz) };
}

/**
 * What a gate makes of the wanted path. A pulsed one is a constant, c₀, which a fixed width makes follow the rate; track and hold follows
 * the rate, or is taken at the worst of nominal and either end where it tracks for a fixed time.
 */
function worstGate(path: ChannelPath, question: WorstQuestion): WorstPulse {
  const { channel, pulse } = path;
  const { gate } = channel;
  if (gate === null || !varies(channel.rate.tolerance) || question.axis === 'periods') return unmoved(pulse, question);
  const follows = gate.kind === 'pulse' ? pulseMoves(gate.pulse) === 'follows' : 'share' in gate.track;
  if (!follows) return { responses: [worstOfRates(path, question)], rateFactorAt: worstRateAt(path, question) };
  return gate.kind === 'pulse' ? unmoved(pulse, question) : moved(path, question);
}

/** The worst of nominal and either end of the rate at a frequency. */
function worstRateAt({ channel, rateHz }: ChannelPath, question: WorstQuestion): (frequencyHz: number) => number {
  const sign = question.sense === 'largest' ? 1 : -1;
  const rates = [rateHz, ...rateEnds(channel.rate)].map((hz) => ({ hz, response: fixed(wantedPulse(channel, hz), question) }));
  return (frequencyHz) => {
    const gains = rates.map(({ hz, response }) => ({ hz, gain: sign * response.logGain(frequencyHz) }));
    return gains.reduce((worst, one) => (one.gain > worst.gain ? one : worst)).hz / rateHz;
  };
}

function fixed(response: Response, { referenceHz }: WorstQuestion): Response {
  return referenceHz === null ? response : relativeTo(response, referenceHz);
}

/** What the area over the period gains at its worst; nothing against a reference, where it cancels. */
function areaShift({ channel, rateHz }: ChannelPath, { referenceHz, sense }: WorstQuestion): readonly Response[] {
  if (referenceHz !== null) return [];
  const ends = rateEnds(channel.rate).map((rate) => pulseAreaLog(channel, rate));
  const worst = sense === 'largest' ? Math.max(...ends) : Math.min(...ends);
  const shift = worst - pulseAreaLog(channel, rateHz);
  return shift === 0 ? [] : [constantResponse(shift)];
}

/** Every part of the pulse over all its lengths; the area is monotone in the rate, so its worst is at an end. */
function worstFactors(path: ChannelPath, question: WorstQuestion): readonly Response[] {
  const { channel, rateHz } = path;
  const ends = rateEnds(channel.rate).map((rate) => factorsAt(path, rate));
  const area = question.referenceHz === null ? pulseAreaLog(channel, rateHz) : 0;
  const parts = factorsAt(path, rateHz).map((factor, index) => {
    const lengths = ends.map((factors) => factors[index]?.widthSeconds ?? factor.widthSeconds);
    const range: Enclosure = {
      low: factor.widthSeconds / Math.max(factor.widthSeconds, ...lengths),
      high: factor.widthSeconds / Math.min(factor.widthSeconds, ...lengths),
    };
    return stretchedFrom(factorResponse(factor), range, question).response;
  });
  return [...areaShift(path, question), ...(area === 0 ? [] : [constantResponse(area)]), ...parts];
}

function factorsAt({ channel }: ChannelPath, rateHz: number): readonly PulseFactor[] {
  const shape = pulseShape(channel.pulse, rateHz);
  return shape === null ? [] : pulseFactors(shape);
}

function worstOfRates({ channel, rateHz }: ChannelPath, question: WorstQuestion): Response {
  const rates = [rateHz, ...rateEnds(channel.rate)];
  const responses = rates.map((rate) => fixed(wantedPulse(channel, rate), question));
  return question.sense === 'largest' ? largestOf(responses) : inverse(largestOf(responses.map(inverse)));
}

function rateEnds(rate: ChannelPath['channel']['rate']): readonly number[] {
  const { low, high } = rateRange(rate);
  return [low, high];
}
