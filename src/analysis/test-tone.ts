/** The tone whose signal-to-noise ratio is judged: the band it stands in, its level behind the path, and the jitter that acts on it. */
import type { Enclosure } from '../signal/response';
import type { Channel } from '../spec/channel';
import { gainDb } from './channel-path';
import type { ChannelPath } from './channel-path';
import { wantedRanges } from './source-range';
import { contains } from './intervals';
import { relayPath } from './relay/relay-path';
import { nominalPath } from './worst-path';

/** The wanted band that the test tone stands in, where its noise counts; all of them where it stands in none. */
export function noiseBands(channel: Channel): readonly Enclosure[] {
  const bands = wantedRanges(channel);
  const own = bands.filter((band) => contains([band], channel.testTone.frequencyHz));
  return own.length > 0 ? own.slice(0, 1) : bands;
}

/** Rms jitter in seconds: the clock's and the sampler's own, added as squares. */
export function jitterSeconds(channel: Channel): number {
  return Math.hypot(channel.jitterSeconds, channel.rate.clock?.jitterSeconds ?? 0);
}

/** The frequency that levels are divided by the gain at: stated behind the path at `reference`, or null where they stand at its input. */
export function levelReference(channel: Channel): number | null {
  return channel.direction === 'capture' && channel.levelsAt === 'sampler' ? channel.referenceHz : null;
}

/** The test tone's nominal level in dBFS: at the sampler in capture, as it leaves in generate and relay. */
export function testToneLevelDb(channel: Channel, path: ChannelPath): number {
  const { response } = nominalPath(path, levelReference(channel));
  const referenceDb = channel.direction === 'relay' && channel.levelsAt === 'sampler' ? inputGainDb(channel) : 0;
  return channel.testTone.levelDb + gainDb(response, channel.testTone.frequencyHz) - referenceDb;
}

/** The gain at `reference` of what leads to a relay's sampler. */
function inputGainDb(channel: Channel): number {
  return gainDb(relayPath(channel).input.total, channel.referenceHz);
}
