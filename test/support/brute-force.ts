/** Asks the plain-grid script in test/brute-force for its own answer about a channel. */
import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import type { Channel, Source, Stage } from '../../src/spec/channel';

/** The script's answer; levels in dB. */
export interface BruteForceAnswer {
  readonly flatness: number;
  readonly aliases?: readonly ({ readonly level: number; readonly frequency: number; readonly lands: number } | null)[];
  readonly aliasesRelative?: readonly ({ readonly level: number } | null)[];
  readonly image?: number;
  readonly imageRelative?: number;
}

/** The script. */
export const bruteForceScript = join(import.meta.dirname, '..', 'brute-force', 'channel.py');

/** Whether Python with numpy is here; the script needs nothing else. */
export function hasBruteForce(): boolean {
  return spawnSync('python3', ['-c', 'import numpy']).status === 0;
}

/** Runs the script on a channel. */
export function bruteForce(channel: Channel): BruteForceAnswer {
  const run = spawnSync('python3', [bruteForceScript], { input: JSON.stringify(describeChannel(channel)), encoding: 'utf8' });
  if (run.status !== 0) throw new Error(run.stderr);
  return JSON.parse(run.stdout) as BruteForceAnswer;
}

/** A channel in the script's own words. */
export function describeChannel(channel: Channel): object {
  const { hz, tolerance } = channel.rate;
  return {
    direction: channel.direction,
    rate: [hz * (1 + tolerance.low), hz, hz * (1 + tolerance.high)],
    wanted: channel.wanted.map((band) => [band.lowHz, band.highHz, band.levelDb]),
    reference: channel.referenceHz,
    pulse: 'width' in channel.pulse ? channel.pulse.width : null,
    stages: channel.stages.map(describeStage),
    sources: channel.unwanted.map(describeSource),
    protect: channel.protect?.map((range) => [range.lowHz, range.highHz]) ?? null,
    levelsAt: channel.levelsAt,
  };
}

function describeStage({ form, cornerTolerance, gainTolerance }: Stage): object {
  const varied = {
    factors: [1 + cornerTolerance.low, 1 + cornerTolerance.high],
    gains: [1 + gainTolerance.low, 1 + gainTolerance.high],
  };
  switch (form.kind) {
    case 'family':
      return {
        kind: form.family,
        order: form.order,
        corner: form.cornerHz,
        ripple: form.rippleDb,
        cornerAt: form.cornerAt,
        ...varied,
      };
    case 'rc':
      return { kind: 'bandwidth', corner: 1 / (2 * Math.PI * form.ohm * form.farad), ...varied };
    case 'bandwidth':
      return { kind: form.kind, corner: form.cornerHz, ...varied };
    default:
      throw new RangeError(`the brute-force script does not know ${form.kind}`);
  }
}

function describeSource(source: Source): readonly (number | null)[] {
  switch (source.kind) {
    case 'tone':
      return [source.frequencyHz * (1 + source.tolerance.low), source.frequencyHz * (1 + source.tolerance.high), source.levelDb];
    case 'band':
      return [source.lowHz, Number.isFinite(source.highHz) ? source.highHz : null, source.levelDb];
    case 'anything':
      return [0, null, source.levelDb];
    case 'spectrum':
      throw new RangeError('the brute-force script does not know spectra');
  }
}
