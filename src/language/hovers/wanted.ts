/** Hover of a wanted band: where it appears, which way round, and what the path takes from its edges. */
import { channelPath, gainDb, lossDb } from '../../analysis';
import { formatDb, formatFrequency } from '../../units/format';
import { knownRows, type Answer } from './answer';
import { indexIn, type Subject } from './subject';
import { bandWords, lossWords, turnWords } from './words';

/** The wanted band at the subject's path, or null where there is none. */
export function wantedHover({ channel, figures, path }: Subject): Answer | null {
  const band = figures.wanted[indexIn(path)];
  if (band === undefined) return null;
  const { total } = channelPath(channel);
  const edge = (hz: number): string =>
    `${formatDb(band.level + gainDb(total, hz), 'dBFS')}, droop ${lossWords(lossDb(total, hz, figures.reference))}`;
  const verb = figures.direction === 'capture' ? 'appears at' : 'leaves at';
  return {
    headline: `${bandWords(band.low, band.high)} ${verb} ${bandWords(band.appearsLow, band.appearsHigh)}, ${turnWords(band.inverted)}`,
    rows: knownRows(
      ['zone', `${band.zone}, each ${formatFrequency(figures.halfRate)} wide`],
      [`at ${formatFrequency(band.low)}`, edge(band.low)],
      [`at ${formatFrequency(band.high)}`, edge(band.high)],
      ['droop is measured from', formatFrequency(figures.reference)],
      ['noise in it', figures.noise.total === null ? null : formatDb(figures.noise.total, 'dBFS')],
    ),
    formula: 'Zone n holds (n − 1)·fs/2 to n·fs/2; even zones come out inverted',
  };
}
