/** The stored filter vectors and the table of Bessel poles are what the kept scripts make, and scipy.signal agrees with them. */
import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { assertClose } from '../support/tolerance';
import { filterVectorScript, readFilterVectors, type FilterVectors } from './filter-vectors';

const root = join(import.meta.dirname, '../..');
const besselTable = join(root, 'src/signal/families/bessel-poles.ts');
const besselScript = join(root, 'scripts/make-bessel-poles.py');

/** A Python that has what the scripts need, or null. */
function pythonWithScipy(): string | null {
  const has = (python: string): boolean => spawnSync(python, ['-c', 'import scipy.signal, mpmath, numpy']).status === 0;
  return ['/usr/bin/python3', 'python3'].find(has) ?? null;
}

/** Runs a script that writes one file and hands its path on before it is removed. */
function remade<T>(python: string, script: string, read: (path: string) => T): T {
  const folder = mkdtempSync(join(tmpdir(), 'bandkeep-vectors-'));
  try {
    const file = join(folder, 'made');
    const run = spawnSync(python, [script, file], { encoding: 'utf8' });
    assert.equal(run.status, 0, run.stderr);
    return read(file);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function numbersOf(value: unknown, path = ''): [string, number][] {
  if (typeof value === 'number') return [[path, value]];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => numbersOf(inner, `${path}/${key}`));
}

/** scipy loses some digits of high orders, but none that a double of the answer would keep at 1e−9. */
function assertScipyAgrees({ scipy_difference: differences }: FilterVectors): void {
  assert.deepEqual(Object.keys(differences), ['inverseChebyshev', 'elliptic', 'bessel']);
  for (const difference of Object.values(differences)) assert.ok(difference.roots < 1e-11 && difference.gain < 1e-10);
}

describe('the stored filter vectors', () => {
  const stored = readFilterVectors();

  it('record the versions they were made with and how far scipy.signal is from them', () => {
    assert.match(stored.versions.scipy, /^\d+\.\d+/);
    assert.match(stored.versions.mpmath, /^\d+\.\d+/);
    assertScipyAgrees(stored);
  });

  const python = pythonWithScipy();
  if (python === null) {
    it('NOT COMPARED: no Python with scipy and mpmath here, so only the recorded version was looked at', () => {
      assert.equal(stored.versions.scipy, '1.10.1');
    });
    return;
  }

  it('come out of the script again, number by number, with the scipy and mpmath of this machine', function () {
    this.timeout(600_000);
    const again = remade(python, filterVectorScript, readFilterVectors);
    const skip = (entries: [string, number][]): [string, number][] =>
      entries.filter(([path]) => !path.startsWith('/scipy_difference'));
    const expected = skip(numbersOf(stored));
    const actual = skip(numbersOf(again));
    assert.ok(expected.length > 12_000);
    assert.deepEqual(
      actual.map(([path]) => path),
      expected.map(([path]) => path),
    );
    // mpmath is exact to the double; another version may round a last digit differently.
    actual.forEach(([path, value], index) => {
      assertClose(value, expected[index]![1], 1e-14, path);
    });
    assertScipyAgrees(again);
  });

  it('and the table of Bessel poles comes out of its script again, byte by byte', function () {
    this.timeout(180_000);
    const again = remade(python, besselScript, (path) => readFileSync(path, 'utf8'));
    assert.equal(again, readFileSync(besselTable, 'utf8'));
  });
});
