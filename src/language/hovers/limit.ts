/** Hover of a limit: how it stands, and what contributes, strongest first. */
import type { AliasFigure, Figures, LimitFigure, NoiseFigures } from '../../analysis';
import type { Channel, LevelLimit } from '../../spec';
import { formatAmount, formatDb } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import { levelRows } from './level';
import type { Subject } from './subject';
import { decimalsOf, frequencyOr, marginWords, worstAtWords } from './words';

/** How many contributions are listed. */
const listed = 5;

/** The limit at the subject's path, or null where there is none. */
export function limitHover({ channel, figures, path }: Subject): Answer | null {
  const limit = figures.limits.find((figure) => figure.limit === path[1]);
  if (limit === undefined) return null;
  return {
    headline: headlineOf(limit),
    rows: [
      ...standingRows(limit, limit.limit === 'level' ? rangeWords(channel.levelLimit) : null),
      ...sumRows(limit, channel),
      ...contributions(limit, figures),
      ...(limit.unit === 'dBFS' ? levelRows(channel, limit.at).map(([unit, value]): Row => [`the limit, ${unit}`, value]) : []),
    ],
    formula: formulas[limit.limit],
  };
}

const formulas: Readonly<Record<LimitFigure['limit'], string>> = {
  alias: 'Proved maximum over every source and every fold up to infinity',
  image: 'Proved maximum over every copy up to infinity',
  flatness: 'Largest |20·log10(G(f)/G(reference))| in the wanted band, proved',
  snr: 'Test tone over the sum of the noise powers in the wanted band',
  headroom: 'Full scale over the sum of all peak amplitudes',
  delay: '−dφ/dω at `reference`, summed in closed form over poles and zeros, and the pulse',
  'delay-spread': 'Largest minus smallest group delay in the wanted band, proved',
  crosstalk: '−20·log10(e)·2π·B·guard of a first-order link of corner B',
  level: 'Largest and smallest level of the wanted output over its band, proved',
  response: 'Proved extreme of the analogue path over each segment, against the gain at `reference`',
  through: 'Proved extreme of the end-to-end gain over each segment, against that at `reference`',
  output: 'Proved maximum of everything that leaves outside the wanted band, over each segment',
};

function headlineOf(limit: LimitFigure): string {
  if (limit.value === null || limit.margin === null)
    return `\`${limit.limit}\` is not judged: nothing in this channel can break it`;
  return `\`${limit.limit}\` ${level(limit, limit.value)}, ${marginWords({ ...limit, margin: limit.margin })}`;
}

function standingRows(limit: LimitFigure, range: string | null): Row[] {
  return knownRows(
    ['limit', range ?? level(limit, limit.at)],
    ['nominal', limit.nominal === null ? null : level(limit, limit.nominal)],
    ['reached at', limit.where === null ? null : frequencyOr(limit.where.frequency, '')],
    ['worst case at', worstAtWords(limit.worstAt)],
  );
}

/** Whether all landings count together. */
function sumRows({ limit }: LimitFigure, { limits }: Channel): Row[] {
  const sums = limits.some(({ key, sum }) => key === limit && sum);
  return sums ? [['counts', 'all landings of all sources together, as powers']] : [];
}

/** Both ends of a range of levels; one that was left out is open. */
function rangeWords(range: LevelLimit | null): string | null {
  if (range === null) return null;
  if (range.highDb === Infinity) return `${formatDb(range.lowDb, 'dBFS', 2)} or more`;
  const high = formatDb(range.highDb, 'dBFS', 2);
  return range.lowDb === -Infinity ? `${high} or less` : `${formatDb(range.lowDb, 'dBFS', 2)} .. ${high}`;
}

function level(limit: LimitFigure, value: number): string {
  return formatAmount(value, limit.unit, decimalsOf(limit.limit));
}

function contributions(limit: LimitFigure, figures: Figures): Row[] {
  switch (limit.limit) {
    case 'alias':
      return strongest(
        figures.aliases.map((alias) => [aliasName(alias), limit.unit === 'dBc' ? alias.relative : alias.level]),
        limit.unit,
      );
    case 'image':
      return strongest(
        figures.images.map(({ copy, side, level: value, relative }) => [
          `copy ${copy}, ${side}`,
          limit.unit === 'dBc' ? relative : value,
        ]),
        limit.unit,
      );
    case 'snr':
      return strongest(noiseParts(figures.noise));
    case 'flatness':
    case 'headroom':
    case 'delay':
    case 'delay-spread':
    case 'crosstalk':
    case 'level':
    case 'response':
    case 'through':
    case 'output':
      return [];
  }
}

function aliasName({ source, harmonic }: AliasFigure): string {
  return harmonic === 1 ? `\`${source}\`` : `\`${source}\`, harmonic ${harmonic}`;
}

/** The parts of the noise that exist, dBFS. */
function noiseParts(noise: NoiseFigures): (readonly [label: string, valueDb: number | null])[] {
  return [
    ['quantisation', noise.quantisation],
    ['jitter', noise.jitter],
    ['jitter on unwanted sources', noise.jitterUnwanted],
    ['noise sources', noise.sources],
    ['stages', noise.stages],
    ['thermal', noise.thermal],
    ['converter', noise.converter],
  ];
}

function strongest(parts: readonly (readonly [label: string, valueDb: number | null])[], unit = 'dBFS'): Row[] {
  return parts
    .flatMap(([label, valueDb]) => (valueDb === null ? [] : [{ label, valueDb }]))
    .sort((a, b) => b.valueDb - a.valueDb)
    .slice(0, listed)
    .map(({ label, valueDb }) => [label, formatDb(valueDb, unit)]);
}
