/** Resolves `unwanted` to tones, bands and `anything`, each with a name that messages can use. */
import type { Band, Source } from '../channel';
import type { ChannelModel } from '../declaration/channel';
import type { SourceModel } from '../declaration/source';
import type { Path } from '../place';
import { formatFrequency } from '../../units/format';
import type { Quantity } from '../../units/quantity';
import { levelDb } from './levels';
import type { Scale } from './levels';
import { oneOrMany } from './one-or-many';
import { reportRepeatedNames } from './repeated-names';
import type { Report } from './report';
import { settledTolerance } from './tolerance';

/** The sources in their order, or null where one of them is faulty. */
export function resolveSources(
  stated: NonNullable<ChannelModel['unwanted']>,
  scale: Scale,
  report: Report,
): readonly Source[] | null {
  const models = oneOrMany<SourceModel | 'anything' | null>(stated);
  reportRepeatedNames(
    models.map((model) => (model === 'anything' ? null : model)),
    'unwanted',
    report,
  );
  const sources = models.map((model, index) => (model === null ? null : sourceOf(model, ['unwanted', index], scale, report)));
  const whole = sources.flatMap((source) => source ?? []);
  return whole.length === sources.length ? whole : null;
}

/** A band's ends; what is left open runs from 0 Hz or to infinity. */
export const bandBetween = (range: { readonly low: Quantity; readonly high: Quantity }): Band => ({
  lowHz: Math.max(0, range.low.value),
  highHz: range.high.value,
});

function sourceOf(model: SourceModel | 'anything', path: Path, scale: Scale, report: Report): Source | null {
  if (model === 'anything') return { kind: 'anything', name: 'anything', ref: null, enters: 'input', levelDb: 0 };
  const ref = model.ref ?? null;
  if (model.anything) {
    const level = levelDb(model.anything, scale, [...path, 'anything'], report);
    return level === null ? null : { kind: 'anything', name: model.name ?? 'anything', ref, enters: 'input', levelDb: level };
  }
  const level = model.level ? levelDb(model.level, scale, [...path, 'level'], report) : null;
  if (level === null) return null;
  if (model.tone) {
    const { value, tolerance } = model.tone;
    const name = model.name ?? `tone at ${formatFrequency(value)}`;
    return {
      kind: 'tone',
      name,
      ref,
      enters: 'input',
      frequencyHz: value,
      tolerance: settledTolerance(tolerance),
      levelDb: level,
      harmonics: null,
    };
  }
  if (!model.band) return null;
  const band = bandBetween(model.band);
  return { kind: 'band', name: model.name ?? bandName(band), ref, enters: 'input', ...band, levelDb: level, harmonics: null };
}

function bandName({ lowHz, highHz }: Band): string {
  const from = `band from ${formatFrequency(lowHz)}`;
  return highHz === Infinity ? `${from} up` : `${from} to ${formatFrequency(highHz)}`;
}
