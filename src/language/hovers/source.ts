/** Hover of an unwanted source: where it lands, at what level, and how far it may drift. */
import type { AliasFigure, Figures } from '../../analysis';
import type { Source, ToneSource } from '../../spec';
import { formatDb, formatFrequency } from '../../units/format';
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
    headline: headlineOf(source, alias),
    rows: [
      ...knownRows(['stands at', standsAt(source)]),
      ...(alias === null ? [] : landingRows(alias)),
      ...(source.kind === 'tone' ? driftRows(source, figures) : []),
    ],
    formula: 'A tone at f appears at |f − fs·round(f/fs)|, weighed by the path and the aperture at f',
  };
}

function headlineOf(source: Source, alias: AliasFigure | null): string {
  if (alias?.level === null || alias === null) return `\`${source.name}\` lands in no protected range`;
  const margin = alias.margin === null ? '' : `, ${marginWords({ limit: 'alias', sense: 'at-most', margin: alias.margin })}`;
  return `\`${source.name}\` lands on ${frequencyOr(alias.lands, '?')} at ${formatDb(alias.level, 'dBFS')}${margin}`;
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
      return `under the table \`${source.path}\``;
  }
}

function landingRows(alias: AliasFigure): Row[] {
  if (alias.level === null) return [];
  return knownRows(
    ['strongest from', frequencyOr(alias.frequency, 'nowhere')],
    ['fold', alias.fold === null || alias.inverted === null ? null : `${alias.fold}, ${turnWords(alias.inverted)}`],
    ['nominal', alias.nominal === null ? null : formatDb(alias.nominal, 'dBFS')],
    ['against the wanted tone', alias.relative === null ? null : formatDb(alias.relative, 'dBc')],
    ['limit', alias.limit === null ? null : formatDb(alias.limit, 'dBFS')],
  );
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
