/** Resolves `unwanted` to tones, bands, spectra and `anything`, each with a name that messages can use. */
import type { AnythingSource, Band, BandSource, Source, SpectrumSource, ToneSource } from '../channel';
import type { ChannelModel } from '../declaration/channel';
import type { SourceModel } from '../declaration/source';
import type { Path } from '../place';
import type { Named } from '../shape';
import { formatFrequency } from '../../units/format';
import type { Quantity } from '../../units/quantity';
import { resolveEntrance, resolveHarmonics } from './entrance';
import { levelDb } from './levels';
import { oneOrMany } from './one-or-many';
import { reportRepeatedNames } from './repeated-names';
import type { SourceContext } from './source-context';
import { settledTolerance } from './tolerance';

/** The sources in their order, or null where one of them is faulty. */
export function resolveSources(stated: NonNullable<ChannelModel['unwanted']>, context: SourceContext): readonly Source[] | null {
  const models = oneOrMany<SourceModel | 'anything' | Named | null>(stated);
  const written = models.map((model, index) => writtenOf(model, ['unwanted', index], context));
  reportRepeatedNames(
    written.map((one) => one && { name: one.name }),
    'unwanted',
    context.report,
  );
  const sources = written.map((one) => (one === null ? null : sourceOf(one, context)));
  const whole = sources.flatMap((source) => source ?? []);
  return whole.length === sources.length ? whole : null;
}

/** A band's ends; what is left open runs from 0 Hz or to infinity. */
export const bandBetween = (range: { readonly low: Quantity; readonly high: Quantity }): Band => ({
  lowHz: Math.max(0, range.low.value),
  highHz: range.high.value,
});

/** A source with its name and where it is written. */
interface Written {
  readonly model: SourceModel;
  readonly name: string | null;
  readonly path: Path;
  readonly file: string | null;
}

/** Full scale, where `anything` has no level of its own. */
const anythingModel: SourceModel = { anything: { value: 0, unit: 'dBFS' } };

function writtenOf(
  model: SourceModel | 'anything' | Named | null,
  path: Path,
  { lookup, report }: SourceContext,
): Written | null {
  if (model === null) return null;
  if (model === 'anything') return { model: anythingModel, name: null, path, file: null };
  if (!('refersTo' in model)) return { model, name: model.name ?? null, path, file: null };
  const name = model.refersTo;
  report.use('sources', name);
  const found = lookup.source(name);
  if (found === undefined) return report.unknownName(path, { space: 'sources', name }, lookup);
  if (found === null) return report.leansOnFaultOf({ space: 'sources', name }, path, lookup);
  return { model: found, name: found.name ?? name, path, file: lookup.fileOf('sources', name) };
}

function sourceOf(written: Written, context: SourceContext): Source | null {
  const { model, path } = written;
  const enters = resolveEntrance(model.enters, [...path, 'enters'], context);
  if (enters === null) return null;
  const common = { ref: model.ref ?? null, enters };
  if (model.anything) return anythingOf(written, common, context);
  if (model.spectrum) return spectrumOf(written, model.spectrum, common, context);
  const level = model.level ? levelDb(model.level, context.scale, [...path, 'level'], context.report) : null;
  const harmonics = resolveHarmonics(model.harmonics);
  if (level === null || harmonics === undefined) return null;
  const found = { ...common, levelDb: level, harmonics };
  return toneOf(written, found) ?? bandOf(written, found);
}

type Common = Pick<Source, 'ref' | 'enters'>;
type Leveled = Common & Pick<ToneSource, 'levelDb' | 'harmonics'>;

function anythingOf({ model, name, path }: Written, common: Common, { scale, report }: SourceContext): AnythingSource | null {
  const level = model.anything ? levelDb(model.anything, scale, [...path, 'anything'], report) : null;
  return level === null ? null : { kind: 'anything', name: name ?? 'anything', ...common, levelDb: level };
}

function toneOf({ model, name }: Written, found: Leveled): ToneSource | null {
  if (!model.tone) return null;
  const { value, tolerance } = model.tone;
  return {
    kind: 'tone',
    name: name ?? `tone at ${formatFrequency(value)}`,
    ...found,
    frequencyHz: value,
    tolerance: settledTolerance(tolerance),
  };
}

function bandOf({ model, name }: Written, found: Leveled): BandSource | null {
  if (!model.band) return null;
  const band = bandBetween(model.band);
  return { kind: 'band', name: name ?? bandName(band), ...found, ...band };
}

function spectrumOf(
  { model, name, path, file }: Written,
  tablePath: string,
  common: Common,
  { scale, lookup, report }: SourceContext,
): SpectrumSource | null {
  const at = [...path, 'spectrum'];
  const found = report.table({ role: 'spectrum', file, path: tablePath }, at, lookup);
  if (found?.kind !== 'spectrum' || model.lines === null) return null;
  const levels: number[] = [];
  for (const value of found.levels) {
    const level = levelDb({ value, unit: found.unit }, scale, at, report);
    if (level === null) return null;
    levels.push(level);
  }
  const points = found.frequenciesHz.map((frequencyHz, index) => ({ frequencyHz, levelDb: levels[index] ?? -Infinity }));
  const lines = model.lines === 'true';
  if (!lines && points.length < 2)
    return report.fault(at, 'file-not-read', `\`${tablePath}\` has one row: an envelope needs at least two`);
  const highest = levels.reduce((most, level) => Math.max(most, level), -Infinity);
  return { kind: 'spectrum', name: name ?? tablePath, ...common, path: tablePath, points, lines, levelDb: highest };
}

function bandName({ lowHz, highHz }: Band): string {
  const from = `band from ${formatFrequency(lowHz)}`;
  return highHz === Infinity ? `${from} up` : `${from} to ${formatFrequency(highHz)}`;
}
