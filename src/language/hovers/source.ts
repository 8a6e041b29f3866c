/** Hover of an unwanted source: where it lands, at what level, and how far it may drift. */
import { toneLandings, type AliasFigure, type Figures } from '../../analysis';
import type { Channel, Harmonics, Source, SpectrumSource, ToneSource } from '../../spec';
import { formatCount, formatDb, formatFrequency, plainNumber } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import { freedomOf } from './free-frequencies';
import { indexIn, type Subject } from './subject';
import { bandWords, frequencyOr, marginWords, turnWords } from './words';

/** The source at the subject's path, or null where there is none. */
export function sourceHover({ channel, figures, path }: Subject): Answer | null {
  const index = indexIn(path);
  const source = channel.unwanted[index];
  if (source === undefined) return null;
  const alias = figures.aliases.find((figure) => figure.index === index) ?? null;
  return {
    headline: isBeyondData(figures) ? unknownWords(source) : headlineOf(source, alias),
    rows: [
      ...knownRows(
        ['stands at', standsAt(source)],
        ['enters', entersWords(source, channel)],
        ['harmonics', source.kind === 'tone' || source.kind === 'band' ? harmonicsWords(source.harmonics) : null],
      ),
      ...(alias === null ? [] : landingRows(alias)),
      ...eachRows(channel, source),
      ...(source.kind === 'tone' ? driftRows(source, figures) : []),
    ],
    formula: formulaOf(channel, source),
  };
}

/** Whether a measured table ends before what lands could be followed through it. */
function isBeyondData({ beyondData }: Figures): boolean {
  return beyondData.some(({ keys }) => keys.includes('alias'));
}

function unknownWords(source: Source): string {
  return `where \`${source.name}\` lands is not computed: a measured table of the filter ends first`;
}

function headlineOf(source: Source, alias: AliasFigure | null): string {
  if (alias?.level === null || alias === null) return `\`${source.name}\` lands in no protected range`;
  const margin = alias.margin === null ? '' : `, ${marginWords({ limit: 'alias', sense: 'at-most', margin: alias.margin })}`;
  return `\`${source.name}\` lands on ${frequencyOr(alias.lands, '?')} at ${formatDb(alias.level, 'dBFS')}${margin}`;
}

/** How many of its tones are listed. */
const listedTones = 8;

/** What lands of each harmonic, or of each line of a table, the strongest first. */
function eachRows(channel: Channel, source: Source): Row[] {
  const many = source.kind === 'spectrum' ? source.lines : source.kind !== 'anything' && source.harmonics !== null;
  if (!many) return [];
  const all = toneLandings(channel, source);
  const more = all.length - listedTones;
  return [
    ...all.slice(0, listedTones).map((figure): Row => [toneName(source, figure), toneWords(figure)]),
    ...(more > 0 ? [['weaker ones', formatCount(more, 'more', 'more')] as const] : []),
    ...(all.length === 0 ? [['of all its tones', 'none lands in a protected range'] as const] : []),
  ];
}

function toneName(source: Source, { harmonic }: AliasFigure): string {
  if (source.kind === 'spectrum') return 'line';
  return harmonic === 1 ? 'the source itself' : `harmonic ${harmonic}`;
}

function toneWords({ frequency, lands, level }: AliasFigure): string {
  return `${frequencyOr(frequency, '?')} lands on ${frequencyOr(lands, '?')} at ${formatDb(level ?? -Infinity, 'dBFS')}`;
}

/** Which stages it passes, where that is not all of them. */
function entersWords({ enters }: Source, { direction, stages, inputStages }: Channel): string | null {
  if (enters === 'input') return null;
  const before = direction === 'relay' ? inputStages : stages;
  if (enters === 'sampler') return before.length === 0 ? 'at the sampler' : 'at the sampler, so it passes no stage before it';
  const passed = before.slice(enters.stage).map(({ label }) => `\`${label}\``);
  return `in front of \`${before[enters.stage]?.label ?? '?'}\`, so it passes ${passed.join(', ')}`;
}

function harmonicsWords(harmonics: Harmonics | null): string | null {
  if (harmonics === null) return null;
  const which = harmonics.odd ? 'odd ones' : 'all';
  const slope = harmonics.slopeDbPerDecade;
  return `${which} up to ${harmonics.to}, ${slope === 0 ? 'as strong as the first' : `${plainNumber(slope, 2)} dB/decade`}`;
}

function formulaOf({ direction, gate }: Channel, { kind }: Source): string {
  const under = kind === 'spectrum' ? ', straight in dB over log frequency between the rows' : '';
  if (direction !== 'relay')
    return `A tone at f appears at |f − fs·round(f/fs)|, weighed by the path and the aperture at f${under}`;
  const weight = gate?.kind === 'pulse' ? '|c_k| of the gate' : 'the hold at the output frequency';
  return `A tone at f leaves at |f + k·fs|, weighed by the input filter at f, ${weight} and the output filter where it leaves${under}`;
}

function standsAt(source: Source): string {
  switch (source.kind) {
    case 'tone': {
      const { low, high } = source.tolerance;
      if (low === 0 && high === 0) return formatFrequency(source.frequencyHz);
      return bandWords(source.frequencyHz * (1 + low), source.frequencyHz * (1 + high));
    }
    case 'band':
      return bandWords(source.lowHz, source.highHz);
    case 'anything':
      return 'everywhere outside the wanted bands';
    case 'spectrum':
      return tableWords(source);
  }
}

function tableWords({ path, points, lines }: SpectrumSource): string {
  const stretch = bandWords(points[0]?.frequencyHz ?? 0, points.at(-1)?.frequencyHz ?? 0);
  const rows = formatCount(points.length, 'row');
  return lines ? `\`${path}\`: ${rows}, each a tone, ${stretch}` : `anywhere under \`${path}\`: ${rows}, ${stretch}`;
}

function landingRows(alias: AliasFigure): Row[] {
  if (alias.level === null) return [];
  return knownRows(
    ['strongest from', strongestFrom(alias)],
    ['fold', alias.fold === null || alias.inverted === null ? null : `${alias.fold}, ${turnWords(alias.inverted)}`],
    ['nominal', alias.nominal === null ? null : formatDb(alias.nominal, 'dBFS')],
    ['against the wanted tone', alias.relative === null ? null : formatDb(alias.relative, 'dBc')],
    ['limit', alias.limit === null ? null : formatDb(alias.limit, 'dBFS')],
  );
}

function strongestFrom({ frequency, harmonic }: AliasFigure): string {
  const from = frequencyOr(frequency, 'nowhere');
  return harmonic === 1 ? from : `${from}, harmonic ${harmonic}`;
}

/** How far a tone may move before it enters a protected range, or has to move to leave it. */
function driftRows({ frequencyHz, tolerance }: ToneSource, figures: Figures): Row[] {
  const centre = tolerance.low === 0 && tolerance.high === 0 ? '' : `, from ${formatFrequency(frequencyHz)}`;
  const { inside, below, above } = freedomOf(frequencyHz, figures.rate, figures.protected);
  const away = (hz: number): string => formatFrequency(Math.abs(hz - frequencyHz));
  const value = inside
    ? [below, above].flatMap((hz) => (hz === null ? [] : [formatFrequency(hz)])).join(' and ')
    : [below === null ? null : `${away(below)} down`, above === null ? null : `${away(above)} up`]
        .filter((part) => part !== null)
        .join(', ');
  return value === ''
    ? []
    : [[`${inside ? 'nearest frequencies that land outside' : 'may drift before it lands inside'}${centre}`, value]];
}
