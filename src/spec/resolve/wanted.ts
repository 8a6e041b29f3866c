/** Resolves the wanted bands and what hangs on them: guard, reference and test tone. */
import type { WantedBand } from '../channel';
import type { ChannelModel } from '../declaration/channel';
import type { WantedModel } from '../declaration/wanted';
import { formatFrequency } from '../../units/format';
import { levelDb } from './levels';
import type { Scale } from './levels';
import { oneOrMany } from './one-or-many';
import type { Report } from './report';
import { reportRepeatedNames } from './repeated-names';

/** The wanted bands, or null where one of them is faulty. */
export function resolveWanted(
  stated: NonNullable<ChannelModel['wanted']>,
  scale: Scale,
  report: Report,
): readonly WantedBand[] | null {
  const models = oneOrMany<WantedModel | null>(stated);
  reportRepeatedNames(models, 'wanted', report);
  const bands = models.map((model, index) => (model === null ? null : bandOf(model, index, scale, report)));
  const whole = bands.flatMap((band) => band ?? []);
  return whole.length === bands.length ? whole : null;
}

function bandOf(model: WantedModel, index: number, scale: Scale, report: Report): WantedBand | null {
  const level = model.level === undefined ? 0 : model.level && levelDb(model.level, scale, ['wanted', index, 'level'], report);
  if (!model.band || level === null) return null;
  const highHz = model.band.high.value;
  if (highHz <= 0)
    return report.fault(['wanted', index, 'band'], 'out-of-range', 'the wanted band ends at 0 Hz: it needs some width');
  return { name: model.name ?? null, lowHz: Math.max(0, model.band.low.value), highHz, levelDb: level };
}

/** The frequency that flatness and dBc are measured from, or null where it is faulty. */
export function resolveReference(
  stated: ChannelModel['reference'],
  wanted: readonly WantedBand[],
  report: Report,
): number | null {
  const [first] = wanted;
  if (stated === null || first === undefined) return null;
  if (stated === undefined) return Math.sqrt(first.lowHz * first.highHz);
  const hz = stated.value;
  if (wanted.some((band) => band.lowHz <= hz && hz <= band.highHz)) return hz;
  const bands = wanted.map((band) => `${formatFrequency(band.lowHz)} to ${formatFrequency(band.highHz)}`).join(', ');
  return report.fault(
    ['reference'],
    'out-of-range',
    `\`reference\` is ${formatFrequency(hz)}, outside the wanted band (${bands})`,
  );
}

/** The tone whose signal-to-noise ratio is judged, or null where it is faulty. */
export function resolveTestTone(
  stated: ChannelModel['test-tone'],
  wanted: readonly WantedBand[],
  scale: Scale,
  report: Report,
): { readonly frequencyHz: number; readonly levelDb: number } | null {
  const highest = wanted.reduce<WantedBand | null>(
    (best, band) => (best === null || band.highHz > best.highHz ? band : best),
    null,
  );
  if (stated === null || highest === null) return null;
  const { frequency, level } = stated ?? {};
  if (frequency === null || level === null) return null;
  const frequencyHz = frequency?.value ?? highest.highHz;
  const around = wanted.find((band) => band.lowHz <= frequencyHz && frequencyHz <= band.highHz) ?? highest;
  const statedDb = level === undefined ? around.levelDb : levelDb(level, scale, ['test-tone', 'level'], report);
  return statedDb === null ? null : { frequencyHz, levelDb: statedDb };
}
