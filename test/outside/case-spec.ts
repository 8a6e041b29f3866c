/** The reference cases of whole channels as spec texts, so that they go the whole way from text to figures. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { analyse } from '../../src/analysis';
import type { Figures } from '../../src/analysis/figures';
import { read } from '../../src/spec';

/** A filter as the cases give it. */
interface CaseFilter {
  readonly family: 'butterworth' | 'chebyshev1';
  readonly order: number;
  readonly ripple_dB?: number;
  readonly corner_Hz: number;
  readonly corner_meaning: 'half_power' | 'ripple_edge';
}

/** What a case gives. */
interface CaseGiven {
  readonly fs_Hz: number;
  readonly band_Hz: readonly [number, number];
  readonly reference_Hz?: number;
  readonly filter?: CaseFilter | null;
  readonly aperture?: { readonly width_over_T: number };
  readonly interferers?: readonly { readonly f_Hz: number; readonly level_dBFS: number }[];
  readonly any_tone_level_dBFS?: number;
  readonly signal?: { readonly f_Hz: number; readonly level_dBFS: number };
  readonly bits?: number;
  readonly jitter_s?: number;
  readonly duty?: number;
  readonly f_Hz?: number;
  readonly max_harmonic?: number;
  readonly rates_Hz?: readonly number[];
  readonly limit_dB?: number;
}

/** One case. */
export interface Case {
  readonly id: string;
  readonly given: CaseGiven;
  readonly expected: Readonly<Record<string, unknown>>;
  readonly tolerance: { readonly gain_dB: number; readonly level_dB: number };
}

const file = join(import.meta.dirname, '../reference/system-examples.json');

/** One case by its id. */
export function caseOf(id: string): Case {
  const { cases } = JSON.parse(readFileSync(file, 'utf8')) as { readonly cases: readonly Case[] };
  const found = cases.find((one) => one.id === id);
  assert.ok(found !== undefined, id);
  return found;
}

/** The figures of the one channel that these lines make; they must be read without a problem. */
export function figuresOf(lines: readonly (string | null)[]): Figures {
  const body = lines.filter((line) => line !== null).map((line) => `    ${line}\n`);
  const reading = read(`bandkeep: 1\nchannels:\n  case:\n${body.join('')}`);
  assert.deepEqual(
    reading.problems.map(({ message }) => message),
    [],
  );
  const channel = reading.entries[0]?.channel ?? null;
  assert.ok(channel !== null);
  return analyse(channel);
}

/** A filter stage. */
export function filterLine(filter: CaseFilter | null | undefined, order = filter?.order): string | null {
  if (filter === null || filter === undefined) return null;
  const family = filter.family === 'butterworth' ? 'butterworth' : 'chebyshev';
  const ripple = filter.ripple_dB === undefined ? '' : `, ripple: ${filter.ripple_dB} dB`;
  const at = filter.corner_meaning === 'ripple_edge' ? ', corner-at: ripple' : '';
  return `filter: { family: ${family}, order: ${String(order)}, corner: ${filter.corner_Hz} Hz${ripple}${at} }`;
}

/** A band, and where gains are measured from: the lower edge unless the case says otherwise. */
export function bandLines({ band_Hz: [low, high], reference_Hz }: CaseGiven): readonly string[] {
  return [`wanted: { band: ${low} Hz .. ${high} Hz }`, `reference: ${reference_Hz ?? low} Hz`];
}

/** An `adc` case as a capture channel. */
export function captureLines(given: CaseGiven): readonly (string | null)[] {
  const { interferers = [], any_tone_level_dBFS: anyDb, signal, aperture, bits, jitter_s: jitter } = given;
  const tones = interferers.map(
    ({ f_Hz, level_dBFS }, index) => `{ name: tone ${index + 1}, tone: ${f_Hz} Hz, level: ${level_dBFS} dBFS }`,
  );
  const sources = anyDb === undefined ? tones : [...tones, `{ anything: ${anyDb} dBFS }`];
  return [
    'direction: capture',
    ...bandLines(given),
    `rate: ${given.fs_Hz} Hz`,
    filterLine(given.filter),
    `unwanted: [${sources.join(', ')}]`,
    aperture === undefined ? null : `aperture: ${100 * aperture.width_over_T} %`,
    signal === undefined ? null : `test-tone: { frequency: ${signal.f_Hz} Hz, level: ${signal.level_dBFS} dBFS }`,
    bits === undefined ? null : `bits: ${bits}`,
    jitter === undefined ? null : `jitter: ${jitter} s`,
  ];
}
