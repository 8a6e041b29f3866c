/** What a filter takes from the frequencies that fold onto the wanted band, or from the copies that leave beside it. */
import { gainDb, lossDb, type Figures, type Response, type WantedFigure } from '../../analysis';
import type { Path } from '../../spec';
import { formatDb, formatFrequency } from '../../units/format';
import { lossWords } from './words';

/** A frequency outside the wanted band that sampling takes for one of its edges. */
interface Neighbour {
  readonly hz: number;
  readonly label: string;
}

/** One short answer: what is lost at half the rate, or at the nearest fold where the band lies above that. */
export function headlineWords(response: Response, figures: Figures, path: Path): string {
  const nearest = neighbours(figures, path)[0];
  if (nearest === undefined || figures.zone === 1) {
    const loss = lossDb(response, figures.halfRate, figures.reference);
    return `${shortLoss(loss)} loss at half the rate, ${formatFrequency(figures.halfRate)}`;
  }
  const weakest = neighbours(figures, path).reduce((a, b) => (gainDb(response, b.hz) > gainDb(response, a.hz) ? b : a), nearest);
  return `${shortLoss(lossDb(response, weakest.hz, figures.reference))} loss at ${formatFrequency(weakest.hz)}, the nearest ${wordOf(path, figures)}`;
}

/** One row for each neighbour. */
export function foldRows(response: Response, figures: Figures, path: Path): (readonly [string, string])[] {
  return neighbours(figures, path).map(({ hz, label }) => [
    label,
    `${shortLoss(lossDb(response, hz, figures.reference))} at ${formatFrequency(hz)}`,
  ]);
}

/** In zone 1 the lowest frequency above half the rate that lands on the band or leaves as its copy; else those on both sides. */
function neighbours(figures: Figures, path: Path): readonly Neighbour[] {
  const word = wordOf(path, figures);
  const { rate, wanted } = figures;
  const uppers = wanted.map(({ zone, high }) => zone * rate - high);
  const lowers = wanted.flatMap(({ zone, low }) => (zone > 1 ? [(zone - 1) * rate - low] : []));
  if (uppers.length === 0) return [];
  const upper = Math.min(...uppers);
  if (wanted.every(isFirstZone)) return [{ hz: upper, label: `loss at the first ${word}` }];
  const above = { hz: upper, label: `loss at the nearest ${word} above` };
  return lowers.length === 0 ? [above] : [{ hz: Math.max(...lowers), label: `loss at the nearest ${word} below` }, above];
}

function isFirstZone({ zone }: WantedFigure): boolean {
  return zone === 1;
}

function wordOf([head]: Path, { direction }: Figures): 'fold' | 'image' {
  return direction === 'capture' || head === 'input-filter' ? 'fold' : 'image';
}

/** A loss of at least a decibel needs no more than tenths. */
function shortLoss(loss: number): string {
  return Math.abs(loss) < 1 ? lossWords(loss) : formatDb(loss);
}
