/** The magnitude kernel beside numpy, scipy and a plain C loop on the same work: ln|H| of an elliptic filter of order 9 at a million frequencies, in processor time. */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { designFilter } from '../../src/signal/families/design-filter';
import { filterResponse, type Filter } from '../../src/signal/filter';
import { median, report } from './ratio';

const count = 1_000_000;
const rounds = 9;
const decades = { from: -2, to: 2 };
/** Beside this file's source; the bundle runs elsewhere, from the project's folder. */
const folder = join(process.cwd(), 'test', 'bench', 'kernel');

/** What one of them took and found. */
interface Timed {
  readonly ms: number;
  readonly mean: number;
}

/** Runs and prints. */
export function benchKernel(): void {
  const filter = designFilter({
    family: 'elliptic',
    order: 9,
    kind: 'lowpass',
    corners: 1,
    cornerAt: 'ripple',
    rippleDb: 0.1,
    attenuationDb: 80,
    gain: 1,
  });
  const ours = timeOurs(filter);
  const python = timePython(filter);
  if (python === null) absent('numpy and scipy', 'no Python with both');
  else {
    compare('numpy, a product of distances', ours, python.numpy, 1.2, python.versions);
    compare('scipy.signal.freqs_zpk', ours, python.scipy, 0.167, python.versions);
  }
  const c = timeC(filter);
  if (c === null) absent('a C loop', 'no C compiler called cc');
  else compare('a C loop, cc -O3 -march=native', ours, c, null, '');
}

function timeOurs(filter: Filter): Timed {
  const { from, to } = decades;
  const frequencies = Float64Array.from({ length: count }, (_, i) => 10 ** (from + ((to - from) * i) / (count - 1)));
  const gains = new Float64Array(count);
  const response = filterResponse(filter);
  const times = Array.from({ length: rounds }, () => {
    // Others' processes are timed too, so what counts is what each took of the processor.
    const start = process.cpuUsage();
    for (let i = 0; i < count; i++) gains[i] = response.logGain(frequencies[i] ?? 0);
    const { user, system } = process.cpuUsage(start);
    return (user + system) / 1000;
  });
  return { ms: median(times), mean: gains.reduce((sum, gain) => sum + gain, 0) / count };
}

/** H = constant·Π(jf − z)/Π(jf − p), from the gain at 0 Hz. */
function constantOf({ poles, zeros, gainAt }: Filter): number {
  const product = (roots: Filter['poles']): number => roots.reduce((size, { re, im }) => size * Math.hypot(re, im), 1);
  return (gainAt.gain * product(poles)) / product(zeros);
}

function timePython(filter: Filter): (Readonly<Record<'numpy' | 'scipy', Timed>> & { readonly versions: string }) | null {
  const pairs = (roots: Filter['poles']): readonly (readonly number[])[] => roots.map(({ re, im }) => [re, im]);
  const roots = { zeros: pairs(filter.zeros), poles: pairs(filter.poles), constant: constantOf(filter) };
  const input = JSON.stringify({ count, rounds, ...decades, ...roots });
  for (const python of ['/usr/bin/python3', 'python3']) {
    const { status, stdout } = spawnSync(python, ['-c', readFileSync(join(folder, 'kernel.py'), 'utf8')], {
      input,
      encoding: 'utf8',
    });
    if (status === 0) return JSON.parse(stdout) as Readonly<Record<'numpy' | 'scipy', Timed>> & { readonly versions: string };
  }
  return null;
}

function timeC(filter: Filter): Timed | null {
  const scratch = mkdtempSync(join(tmpdir(), 'bandkeep-kernel-'));
  try {
    const program = join(scratch, 'kernel');
    if (spawnSync('cc', ['-O3', '-march=native', '-o', program, join(folder, 'kernel.c'), '-lm']).status !== 0) return null;
    const list = (roots: Filter['poles']): readonly number[] => [roots.length, ...roots.flatMap(({ re, im }) => [re, im])];
    const task = [count, rounds, decades.from, decades.to, constantOf(filter), ...list(filter.zeros), ...list(filter.poles)];
    const { status, stdout } = spawnSync(program, { input: task.join(' '), encoding: 'utf8' });
    const [ms = NaN, mean = NaN] = stdout.split(' ').map(Number);
    return status === 0 ? { ms, mean } : null;
  } finally {
    rmSync(scratch, { recursive: true });
  }
}

function compare(what: string, ours: Timed, other: Timed, goal: number | null, detail: string): void {
  const apart = Math.abs(ours.mean / other.mean - 1);
  const times = `(${ours.ms.toFixed(0)} ms / ${other.ms.toFixed(0)} ms, means ${apart.toExponential(0)} apart) ${detail}`;
  report(`magnitude at 1e6 points / ${what}`, ours.ms / other.ms, goal, times);
}

function absent(what: string, why: string): void {
  process.stdout.write(`magnitude at 1e6 points / ${what}: NOT COMPARED, ${why} here\n`);
}
