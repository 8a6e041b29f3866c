/** The stored pulse vectors are what the kept script makes. */
import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { assertWithin } from '../support/tolerance';
import { pulseVectorScript, readPulseVectors, type PulseVectors } from './pulse-vectors';

/** Every how many pulses are remade: the whole takes half a minute. */
const every = 7;

function remake(python: string): PulseVectors {
  const folder = mkdtempSync(join(tmpdir(), 'bandkeep-vectors-'));
  try {
    const file = join(folder, 'vectors.json');
    const run = spawnSync(python, [pulseVectorScript, file, String(every)], { encoding: 'utf8' });
    assert.equal(run.status, 0, run.stderr);
    return readPulseVectors(file);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function numbersOf(value: unknown): readonly number[] {
  if (typeof value === 'number') return [value];
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersOf) : [];
}

describe('the stored pulse vectors', () => {
  const stored = readPulseVectors();
  const python = ['/usr/bin/python3', 'python3'].find((name) => spawnSync(name, ['-c', 'import mpmath']).status === 0);

  it('hold every shape and the version they were made with', () => {
    assert.equal(new Set(stored.pulses.map(({ shape }) => shape)).size, 7);
    assert.match(stored.versions.mpmath, /^\d+\.\d+/);
  });

  if (python === undefined) {
    it('NOT COMPARED: no Python with mpmath here, so only the recorded version was looked at', () => {
      assert.equal(stored.versions.mpmath, '1.2.1');
    });
  } else {
    it('come out of the script again, number by number, every seventh pulse', function () {
      this.timeout(120_000);
      const again = remake(python);
      const chosen = <Item>(items: readonly Item[]): readonly Item[] => items.filter((_, index) => index % every === 0);
      const expected = numbersOf([chosen(stored.pulses), chosen(stored.trackAndHold)]);
      const actual = numbersOf([again.pulses, again.trackAndHold]);
      assert.equal(actual.length, expected.length);
      assert.ok(expected.length > 500);
      actual.forEach((value, index) => {
        assertWithin(value, expected[index]!, 1e-14 * Math.abs(value));
      });
    });
  }
});
