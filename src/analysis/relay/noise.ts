/** Noise of a relay channel in the wanted band as it leaves: what the jitter of its sampling makes of the test tone, and what unwanted sources add. */
import type { Channel } from '../../spec/channel';
import { atCorners, deviationsAt } from '../corners';
import type { Corners } from '../corners';
import type { ChannelPath } from '../channel-path';
import { powerDb, powerOf } from '../decibels';
import type { DirectionNoise } from '../noise-parts';
import { jitterSeconds, levelReference, noiseBands, testToneLevelDb } from '../test-tone';
import { joinWorst, partsVary, rateRange } from '../tolerances';
import { worstCorners } from '../worst-corners';
import { worstPath } from '../worst-path';
import { relayLandingsOverTone } from './aliases';
import { jitterPower } from './jitter';
import { relayPath } from './relay-path';
import type { RelayPath } from './relay-path';
import { sourcesAtSampler } from './sources-at-sampler';
import { rateDeviation } from './views';
import { weightResponse } from './weights';

/** The noise of a relay channel. Its only noise of its own is that of jitter, which grows with the tone. */
export function relayNoise(channel: Channel, withUnwanted: boolean): DirectionNoise {
  const relay = relayPath(channel);
  const toneHz = channel.testTone.frequencyHz;
  const sigma = jitterSeconds(channel);
  const toneDb = testToneLevelDb(relay.input.channel, relay.input);
  const nominalPower = sigma === 0 ? null : jitterAt(relay, relay.output, toneHz);
  const worst = sigma === 0 ? null : worstJitter(channel, relay);
  const extras = withUnwanted ? unwantedShares(channel, relay) : none;
  const gain = toneGain(relay, relay.output, toneHz);
  return {
    nominal: { quantisation: null, jitter: nominalPower === null ? null : toneDb + powerDb(nominalPower) },
    jitterUnwanted: sigma === 0 ? null : unwantedJitterDb(relay, 'nominal'),
    nominalShares: [...(nominalPower === null ? [] : [nominalPower / gain]), ...extras.nominal],
    worstShares: [...(worst === null ? [] : [worst.share]), ...extras.worst],
    worstAt: worst?.worstAt ?? null,
    evaluations: extras.evaluations,
  };
}

const none = { nominal: [], worst: [], evaluations: 0 } as const;

/** Jitter on a tone, in the wanted band as it leaves, over the tone's power at the sampler. */
function jitterAt(relay: RelayPath, output: ChannelPath, toneHz: number): number {
  const { channel } = relay;
  return jitterPower({
    relay,
    channel,
    output: output.total,
    bands: noiseBands(channel),
    toneHz,
    sigmaSeconds: jitterSeconds(channel),
  });
}

/** The power that a tone leaves with over its power at the sampler. */
function toneGain({ weights }: RelayPath, output: ChannelPath, toneHz: number): number {
  return Math.exp(2 * (weightResponse(weights.copy(0)).logGain(toneHz) + output.total.logGain(toneHz)));
}

/** The tone and its noise pass the same output filter; its worst corners and the worst end of the rate are looked for together. */
function worstJitter(
  channel: Channel,
  relay: RelayPath,
): { readonly share: number; readonly worstAt: DirectionNoise['worstAt'] } {
  const toneHz = channel.testTone.frequencyHz;
  const shareOf = (at: RelayPath, corners: Corners): number => {
    const output = atCorners(at.output, corners);
    return jitterAt(at, output, toneHz) / toneGain(at, output, toneHz);
  };
  if (!partsVary(channel))
    return {
      share: shareOf(
        relay,
        relay.output.stages.map(() => 1),
      ),
      worstAt: null,
    };
  const { low, high } = rateRange(channel.rate);
  const weakest = worstPath(relay.output, { sense: 'smallest', referenceHz: null, axis: 'hertz' }).cornersAt(toneHz);
  const found = [...new Set([channel.rate.hz, low, high])].map((rateHz) => {
    const moved = relayPath(channel, rateHz);
    const corners = worstCorners(moved.output, [weakest], (tried) => shareOf(moved, tried));
    return { rateHz, corners, share: shareOf(moved, corners) };
  });
  const worst = found.reduce((best, one) => (one.share > best.share ? one : best));
  return {
    share: worst.share,
    worstAt: joinWorst(deviationsAt(relay.output, worst.corners), rateDeviation(channel, worst.rateHz)),
  };
}

/** Jitter on the unwanted sources in the wanted band as it leaves, dBFS; null where there are none that it acts on. */
function unwantedJitterDb(
  relay: RelayPath,
  at: 'nominal' | 'worst',
  referenceHz = levelReference(relay.input.channel),
): number | null {
  const places = sourcesAtSampler(relay.input.channel, at, referenceHz);
  if (places.length === 0) return null;
  return powerDb(
    places.reduce((sum, candidates) => {
      const powers = candidates.map(({ levelDb, frequencyHz }) => powerOf(levelDb) * jitterAt(relay, relay.output, frequencyHz));
      return sum + Math.max(...powers);
    }, 0),
  );
}

/** Landings and jitter of the unwanted sources over the test tone's own power, each at its own worst. */
function unwantedShares(
  channel: Channel,
  relay: RelayPath,
): typeof none | (Record<'nominal' | 'worst', readonly number[]> & { readonly evaluations: number }) {
  const { frequencyHz, levelDb } = channel.testTone;
  let evaluations = 0;
  const sharesOf = (at: 'nominal' | 'worst'): readonly number[] => {
    const landings = channel.unwanted.map((source) => {
      const landed = relayLandingsOverTone(channel, source, frequencyHz, at);
      evaluations += landed.evaluations;
      return landed.power / powerOf(levelDb);
    });
    const jitterDb = jitterSeconds(channel) === 0 ? null : unwantedJitterDb(relay, at, frequencyHz);
    const gain = toneGain(relay, relay.output, frequencyHz);
    return jitterDb === null ? landings : [...landings, powerOf(jitterDb - levelDb) / gain];
  };
  return { nominal: sharesOf('nominal'), worst: sharesOf('worst'), evaluations };
}
