/** Turns the reference cases' own conventions (test/reference/system-examples.json) into channels and back. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Channel, Pulse, Source, Stage } from '../../src/spec/channel';
import {
  anything,
  butterworthForm,
  capture,
  chebyshevForm,
  generate,
  rate,
  rectangleShare,
  stage,
  tone,
  wanted,
} from './channel-builder';

/** A filter as the cases give it; the passband maximum is 0 dB. */
export interface CaseFilter {
  readonly family: 'butterworth' | 'chebyshev1';
  readonly order: number;
  readonly ripple_dB?: number;
  readonly corner_Hz: number;
  readonly corner_meaning: 'half_power' | 'ripple_edge';
}

/** What a case gives, as far as the covered kinds use it. */
export interface CaseGiven {
  readonly fs_Hz: number;
  readonly band_Hz: readonly [number, number];
  readonly reference_Hz?: number;
  readonly filter: CaseFilter;
  readonly aperture?: { readonly type: 'integrate'; readonly width_over_T: number };
  readonly hold?: { readonly type: 'zero_order' };
  readonly interferers?: readonly { readonly f_Hz: number; readonly level_dBFS: number }[];
  readonly any_tone_level_dBFS?: number;
  readonly signal?: { readonly f_Hz: number; readonly level_dBFS: number };
  readonly bits?: number;
  readonly full_scale_Vpp?: number;
  readonly jitter_s?: number;
  readonly rates_Hz?: readonly number[];
}

/** Allowed differences of a case. */
export interface CaseTolerance {
  readonly frequency_relative: number;
  readonly gain_dB: number;
  readonly level_dB: number;
}

/** One case; `expected` is typed where it is used. */
export interface SystemCase<Expected> {
  readonly id: string;
  readonly given: CaseGiven;
  readonly expected: Expected;
  readonly tolerance: CaseTolerance;
}

/** Reads one case by its id. */
export function systemCase<Expected>(id: string): SystemCase<Expected> {
  const path = join(import.meta.dirname, '..', 'reference', 'system-examples.json');
  const file = JSON.parse(readFileSync(path, 'utf8')) as { readonly cases: readonly SystemCase<Expected>[] };
  const found = file.cases.find((one) => one.id === id);
  if (found === undefined) throw new Error(`There is no case ${id}.`);
  return found;
}

/** A case's filter as a stage. */
export function stageOf(filter: CaseFilter): Stage {
  if (filter.family === 'butterworth') return stage(butterworthForm(filter.order, filter.corner_Hz));
  const cornerAt = filter.corner_meaning === 'ripple_edge' ? 'ripple' : 'half-power';
  return stage(chebyshevForm(filter.order, filter.corner_Hz, filter.ripple_dB ?? NaN, cornerAt));
}

/** An `adc` case as a capture channel: gains from the lower band edge unless a reference is given. */
export function captureCase(given: CaseGiven, changes: Partial<Channel> = {}): Channel {
  const [low, high] = given.band_Hz;
  const pulse: Pulse = given.aperture === undefined ? { shape: 'instant' } : rectangleShare(given.aperture.width_over_T);
  const tones: readonly Source[] = (given.interferers ?? []).map((one) => tone(one.f_Hz, one.level_dBFS));
  const anyTone = given.any_tone_level_dBFS === undefined ? [] : [anything(given.any_tone_level_dBFS)];
  const signal = given.signal ?? { f_Hz: high, level_dBFS: 0 };
  return capture({
    wanted: [wanted(low, high)],
    rate: rate(given.fs_Hz),
    referenceHz: given.reference_Hz ?? low,
    pulse,
    stages: [stageOf(given.filter)],
    unwanted: [...tones, ...anyTone],
    testTone: { frequencyHz: signal.f_Hz, levelDb: signal.level_dBFS },
    bits: given.bits ?? null,
    fullScaleVpp: given.full_scale_Vpp ?? null,
    jitterSeconds: given.jitter_s ?? 0,
    ...changes,
  });
}

/** A `dac` case with a zero-order hold as a generate channel. */
export function generateCase(given: CaseGiven, changes: Partial<Channel> = {}): Channel {
  const [low, high] = given.band_Hz;
  return generate({
    wanted: [wanted(low, high)],
    rate: rate(given.fs_Hz),
    referenceHz: given.reference_Hz ?? low,
    stages: [stageOf(given.filter)],
    bits: given.bits ?? null,
    ...changes,
  });
}
