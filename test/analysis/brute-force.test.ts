/** Aliases, images and flatness against a plain grid that shares nothing with the program, to 0.01 dB (tests run where Python has numpy). */
import assert from 'node:assert/strict';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { analyse } from '../../src/analysis';
import { read } from '../../src/spec';
import type { Channel } from '../../src/spec/channel';
import { bruteForce, bruteForceScript, hasBruteForce } from '../support/brute-force';
import {
  anything,
  band,
  butterworthForm,
  capture,
  chebyshevForm,
  generate,
  limit,
  plusMinus,
  rate,
  rectangleSeconds,
  rectangleShare,
  stage,
  tone,
  wanted,
} from '../support/channel-builder';

/** What a grid of this density may miss of a smooth maximum, and what two evaluations may differ by. */
const gridDb = 0.01;

const guard = stage(chebyshevForm(5, 14e3, 0.3), { label: 'guard', cornerTolerance: plusMinus(0.04) });
const amplifier = stage({ kind: 'bandwidth', cornerHz: 400e3 }, { label: 'amplifier', gainTolerance: plusMinus(0.02) });

const captures: Readonly<Record<string, Channel>> = {
  'a pick-up with a drive above it': capture({
    wanted: [wanted(5, 10e3, -3)],
    rate: rate(51200),
    pulse: rectangleSeconds(300e-9),
    stages: [amplifier, stage(butterworthForm(4, 14e3), { cornerTolerance: plusMinus(0.04) })],
    unwanted: [tone(310e3, -24, { tolerance: plusMinus(0.1) }), band(40e3, 3e6, -55)],
  }),
  'a ripple and an averaging aperture as long as the period': capture({
    wanted: [wanted(0, 8e3)],
    rate: rate(48e3),
    referenceHz: 1e3,
    pulse: rectangleShare(1),
    stages: [guard],
    unwanted: [anything(-10), band(12e3, Infinity, -20)],
  }),
  'levels that hold at the sampler': capture({
    wanted: [wanted(1e3, 9e3, -6)],
    rate: rate(40e3),
    levelsAt: 'sampler',
    stages: [guard, amplifier],
    unwanted: [band(20e3, 60e3, -30)],
  }),
  'a band in zone 3 with a clock that moves': capture({
    wanted: [wanted(66e6, 74e6)],
    rate: rate(52e6, { tolerance: plusMinus(1e-4) }),
    stages: [stage(butterworthForm(2, 120e6), { cornerTolerance: plusMinus(0.05) })],
    unwanted: [anything(0)],
  }),
  'protection wider than the wanted band': capture({
    wanted: [wanted(100, 2e3)],
    rate: rate(20e3),
    protect: [{ lowHz: 0, highHz: 5e3 }],
    stages: [stage(butterworthForm(3, 3e3))],
    unwanted: [band(2.5e3, 100e3, -20), tone(3e3, -30), tone(20.5e3, -10)],
  }),
};

const generates: Readonly<Record<string, Channel>> = {
  'a zero-order hold and a filter with a tolerance': generate({
    wanted: [wanted(0, 20e3)],
    rate: rate(96e3),
    stages: [stage(butterworthForm(4, 30e3), { cornerTolerance: plusMinus(0.05) })],
  }),
  'a ripple whose edge moves through the band': generate({
    wanted: [wanted(200, 20e3, -2)],
    rate: rate(64e3),
    stages: [stage(chebyshevForm(7, 20.5e3, 1, 'ripple'), { cornerTolerance: plusMinus(0.06) })],
  }),
  'a narrow pulse that is wanted in zone 3': generate({
    wanted: [wanted(110e3, 140e3)],
    rate: rate(100e3),
    pulse: rectangleShare(0.3),
    stages: [stage(chebyshevForm(3, 160e3, 0.5), { cornerTolerance: plusMinus(0.03), gainTolerance: plusMinus(0.05) })],
  }),
  'a pulse of fixed width and a clock that moves': generate({
    wanted: [wanted(1e3, 30e3)],
    rate: rate(100e3, { tolerance: plusMinus(2e-4) }),
    pulse: rectangleSeconds(4e-6),
    stages: [stage(butterworthForm(3, 50e3), { cornerTolerance: plusMinus(0.05) })],
  }),
};

function assertLevel(actual: number | null | undefined, grid: number | undefined, what: string): void {
  assert.ok(typeof actual === 'number' && grid !== undefined, `${what} is missing`);
  assert.ok(Math.abs(actual - grid) <= gridDb, `${what}: ${String(actual)} dB, on the grid ${String(grid)} dB`);
}

function flatnessOf(channel: Channel): number | null | undefined {
  return analyse({ ...channel, limits: [limit('flatness', 1)] }).limits[0]?.value;
}

describe('figures against a plain grid', () => {
  if (!hasBruteForce()) {
    it('NOT COMPARED: no Python with numpy here, so only the presence of the script was looked at', () => {
      assert.ok(existsSync(bruteForceScript));
    });
    return;
  }
  for (const [title, channel] of Object.entries(captures)) {
    it(`agrees on aliases and flatness of ${title}`, () => {
      const grid = bruteForce(channel);
      const absolute = analyse({ ...channel, limits: [limit('alias', -60)] });
      const relative = analyse({ ...channel, limits: [limit('alias', -60, { unit: 'dBc' })] });
      assert.equal(grid.aliases?.length, channel.unwanted.length);
      channel.unwanted.forEach((source, index) => {
        assertLevel(absolute.aliases[index]?.level, grid.aliases?.[index]?.level, source.name);
        assertLevel(relative.aliases[index]?.relative, grid.aliasesRelative?.[index]?.level, `${source.name} in dBc`);
      });
      assertLevel(flatnessOf(channel), grid.flatness, 'flatness');
    });
  }
  for (const [title, channel] of Object.entries(generates)) {
    it(`agrees on images and flatness of ${title}`, () => {
      const grid = bruteForce(channel);
      assertLevel(analyse({ ...channel, limits: [limit('image', -60, { unit: 'dBFS' })] }).image?.level, grid.image, 'image');
      assertLevel(analyse({ ...channel, limits: [limit('image', -60)] }).image?.relative, grid.imageRelative, 'image in dBc');
      assertLevel(flatnessOf(channel), grid.flatness, 'flatness');
    });
  }

  it('agrees on both violations of the broken example', () => {
    const text = readFileSync(join(import.meta.dirname, '..', '..', 'examples', 'gate-bearing-broken.bandkeep.yaml'), 'utf8');
    const broken = read(text).entries[0]?.channel;
    assert.ok(broken !== null && broken !== undefined);
    const grid = bruteForce(broken);
    const failed = analyse(broken).limits.filter((found) => !found.passes);
    assert.deepEqual(
      failed.map((found) => found.limit),
      ['alias', 'flatness'],
    );
    assertLevel(failed[0]?.value, Math.max(...(grid.aliases ?? []).map((alias) => alias?.level ?? -Infinity)), 'alias');
    assertLevel(failed[1]?.value, grid.flatness, 'flatness');
  });
});
