/** The stored vectors are what the kept script makes, and scipy.signal agrees with them. */
import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { assertClose } from '../support/tolerance';
import { readVectors, vectorScript, type SignalVectors } from './signal-vectors';

/** A Python that has what the script needs, or null. */
function pythonWithScipy(): string | null {
  const has = (python: string): boolean => spawnSync(python, ['-c', 'import scipy.signal, mpmath, numpy']).status === 0;
  return ['/usr/bin/python3', 'python3'].find(has) ?? null;
}

function remake(python: string): SignalVectors {
  const folder = mkdtempSync(join(tmpdir(), 'bandkeep-vectors-'));
  try {
    const file = join(folder, 'vectors.json');
    const run = spawnSync(python, [vectorScript, file], { encoding: 'utf8' });
    assert.equal(run.status, 0, run.stderr);
    return readVectors(file);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function numbersOf(value: unknown, path = ''): [string, number][] {
  if (typeof value === 'number') return [[path, value]];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => numbersOf(inner, `${path}/${key}`));
}

describe('the stored signal vectors', () => {
  const stored = readVectors();

  it('record the versions they were made with and how far scipy.signal is from them', () => {
    assert.match(stored.versions.scipy, /^\d+\.\d+/);
    assert.match(stored.versions.mpmath, /^\d+\.\d+/);
    for (const difference of Object.values(stored.scipy_difference)) {
      assert.ok(difference.poles < 1e-12 && difference.gain < 1e-12);
    }
  });

  const python = pythonWithScipy();
  if (python === null) {
    it('NOT COMPARED: no Python with scipy and mpmath here, so only the recorded version was looked at', () => {
      assert.equal(stored.versions.scipy, '1.10.1');
    });
  } else {
    it('come out of the script again, number by number, with the scipy and mpmath of this machine', function () {
      this.timeout(180_000);
      const again = remake(python);
      const skip = (entries: [string, number][]): [string, number][] =>
        entries.filter(([path]) => !path.startsWith('/scipy_difference'));
      const expected = skip(numbersOf(stored));
      const actual = skip(numbersOf(again));
      assert.ok(expected.length > 8000);
      assert.deepEqual(
        actual.map(([path]) => path),
        expected.map(([path]) => path),
      );
      // mpmath is exact to the double; another version may round a last digit differently.
      actual.forEach(([path, value], index) => {
        assertClose(value, expected[index]![1], 1e-14, path);
      });
      for (const difference of Object.values(again.scipy_difference))
        assert.ok(difference.poles < 1e-12 && difference.gain < 1e-12);
    });
  }
});
