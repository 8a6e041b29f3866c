/** Builds channels without any text: sensible defaults, each overridable, for tests of what lies behind the spec layer. */
import type {
  Channel,
  Family,
  FamilyForm,
  Gate,
  Limit,
  LimitKey,
  Pulse,
  Rate,
  Source,
  Stage,
  StageForm,
  WantedBand,
} from '../../src/spec/channel';
import type { Tolerance } from '../../src/units/quantity';

/** No tolerance at all. */
export const exact: Tolerance = { low: 0, high: 0 };

/** A symmetric tolerance: plusMinus(0.04) is ± 4 %. */
export function plusMinus(share: number): Tolerance {
  return { low: -share, high: share };
}

/** A plain rate, or one with a tolerance, from a clock of that very frequency where a name or jitter is given. */
export function rate(hz: number, options: { tolerance?: Tolerance; clock?: string; clockJitterSeconds?: number } = {}): Rate {
  const fromClock = options.clock !== undefined || options.clockJitterSeconds !== undefined;
  return {
    hz,
    tolerance: options.tolerance ?? exact,
    clock: fromClock
      ? {
          name: options.clock ?? 'board',
          frequencyHz: hz,
          jitterSeconds: options.clockJitterSeconds ?? 0,
          multiply: 1,
          divide: 1,
        }
      : null,
  };
}

/** A wanted band at 0 dBFS unless a level is given. */
export function wanted(lowHz: number, highHz: number, levelDb = 0, name: string | null = null): WantedBand {
  return { name, lowHz, highHz, levelDb };
}

/** A stage without tolerances unless given; `label` is what messages call it. */
export function stage(form: StageForm, options: Partial<Omit<Stage, 'form'>> = {}): Stage {
  return {
    name: options.name ?? null,
    label: options.label ?? 'stage 1',
    form,
    gain: options.gain ?? 1,
    parts: options.parts ?? [],
    cornerTolerance: options.cornerTolerance ?? exact,
    qTolerance: options.qTolerance ?? exact,
    gainTolerance: options.gainTolerance ?? exact,
  };
}

/** A Butterworth low-pass as a stage's form. */
export function butterworthForm(order: number, cornerHz: number): StageForm {
  return family('butterworth', order, cornerHz);
}

/** A Chebyshev low-pass as a stage's form. */
export function chebyshevForm(
  order: number,
  cornerHz: number,
  rippleDb: number,
  cornerAt: 'half-power' | 'ripple' = 'half-power',
): StageForm {
  return family('chebyshev', order, cornerHz, { rippleDb, cornerAt });
}

/** A filter of a family as a stage's form; a low-pass with its corner at half power unless the options say otherwise. */
export function family(name: Family, order: number, cornerHz: number, options: Partial<FamilyForm> = {}): FamilyForm {
  return {
    kind: 'family',
    family: name,
    filterKind: 'lowpass',
    order,
    cornerHz,
    upperCornerHz: null,
    cornerAt: 'half-power',
    rippleDb: null,
    attenuationDb: null,
    ...options,
  };
}

/** A tone as a source. */
export function tone(frequencyHz: number, levelDb = 0, options: { name?: string; tolerance?: Tolerance } = {}): Source {
  return {
    kind: 'tone',
    name: options.name ?? `tone at ${String(frequencyHz)} Hz`,
    ref: null,
    frequencyHz,
    enters: 'input',
    tolerance: options.tolerance ?? exact,
    levelDb,
    harmonics: null,
  };
}

/** A tone anywhere in a band, as a source. */
export function band(lowHz: number, highHz: number, levelDb = 0, name = 'band'): Source {
  return { kind: 'band', name, ref: null, enters: 'input', lowHz, highHz, levelDb, harmonics: null };
}

/** A tone anywhere outside the wanted bands, as a source. */
export function anything(levelDb = 0): Source {
  return { kind: 'anything', name: 'anything', ref: null, enters: 'input', levelDb };
}

/** A rectangle whose width is a share of the period; share 1 is `zero-order`. */
export function rectangleShare(share: number): Pulse {
  return { shape: 'rectangle', width: { share } };
}

/** A rectangle of fixed width. */
export function rectangleSeconds(seconds: number): Pulse {
  return { shape: 'rectangle', width: { seconds } };
}

const usualUnits: Readonly<Partial<Record<LimitKey, Limit['unit']>>> = {
  alias: 'dBFS',
  image: 'dBc',
  delay: 's',
  'delay-spread': 's',
};

/** A limit in short form. */
export function limit(key: LimitKey, at: number, options: Partial<Omit<Limit, 'key' | 'at'>> = {}): Limit {
  return {
    key,
    at,
    unit: options.unit ?? usualUnits[key] ?? 'dB',
    ref: options.ref ?? null,
    margin: options.margin ?? null,
    withUnwanted: options.withUnwanted ?? false,
    sum: options.sum ?? false,
  };
}

/** What a test says of a channel; everything else is defaulted as the language defaults it. */
export type ChannelParts = Partial<Channel> & { wanted: readonly WantedBand[]; rate: Rate };

/** A capture channel: instant aperture, no filter, no noise, nothing unwanted, no limits unless given. */
export function capture(parts: ChannelParts): Channel {
  return complete('capture', { shape: 'instant' }, parts);
}

/** A generate channel: zero-order hold, no filter, no noise, no limits unless given. */
export function generate(parts: ChannelParts): Channel {
  return complete('generate', rectangleShare(1), parts);
}

/** A relay channel: flat-top with a zero-order hold unless a gate is given; its stages are the input's and then the output's. */
export function relay(parts: ChannelParts & { gate?: Gate }): Channel {
  const stages = [...(parts.inputStages ?? []), ...(parts.outputStages ?? [])];
  return complete('relay', parts.gate === undefined ? rectangleShare(1) : { shape: 'instant' }, { stages, ...parts });
}

function complete(direction: Channel['direction'], pulse: Pulse, parts: ChannelParts): Channel {
  const first = parts.wanted[0] ?? wanted(0, 0);
  const top = parts.wanted.reduce((best, one) => (one.highHz > best.highHz ? one : best), first);
  return {
    name: 'channel',
    direction,
    ref: null,
    guardHz: 0,
    levelsAt: 'input',
    referenceHz: first.lowHz === 0 ? 0 : Math.sqrt(first.lowHz * first.highHz),
    unwanted: [],
    protect: null,
    fullScaleVpp: null,
    impedanceOhm: null,
    rateChoices: null,
    pulse,
    gate: null,
    slots: null,
    stages: [],
    inputStages: direction === 'capture' ? (parts.stages ?? []) : [],
    outputStages: direction === 'generate' ? (parts.stages ?? []) : [],
    testTone: { frequencyHz: top.highHz, levelDb: top.levelDb },
    jitterSeconds: 0,
    bits: null,
    limits: [],
    levelLimit: null,
    masks: [],
    ...parts,
  };
}
