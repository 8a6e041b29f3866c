/** Hover of a rate: what it makes of the wanted band, how much room it has, and which other allowed rates pass. */
import { rateWindowsOf, type Figures, type RateTable, type RateWindow } from '../../analysis';
import { windowWords, zoneWords } from '../../findings';
import { formatCount, formatFrequency } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import { passingRates, type PassingRates } from './passing-rates';
import type { Subject } from './subject';
import { turnWords } from './words';

/** The channel's rate. */
export function rateHover({ channel, figures }: Subject): Answer {
  const zone = figures.zone === null ? '' : `, the wanted band in zone ${figures.zone}`;
  const { clock } = channel.rate;
  return {
    headline: `${formatFrequency(figures.rate)}: half rate ${formatFrequency(figures.halfRate)}${zone}`,
    rows: [
      ...knownRows(
        ['from', clock === null ? null : clockWords(clock)],
        ['comes out', figures.inverted === null ? null : turnWords(figures.inverted)],
        [figures.direction === 'capture' ? 'data rate' : 'output rate', formatFrequency(figures.outputRate)],
      ),
      ...copyRows(figures),
      ...windowRows(figures),
      ...otherWindowRows(rateWindowsOf(channel), figures),
      ...passingRows(passingRates(channel)),
    ],
    formula: 'A band stays whole in zone n while 2·high/n ≤ fs ≤ 2·low/(n − 1)',
  };
}

function clockWords(clock: { name: string; frequencyHz: number; multiply: number; divide: number }): string {
  const times = clock.multiply === 1 ? '' : ` ×${clock.multiply}`;
  return `\`${clock.name}\`, ${formatFrequency(clock.frequencyHz)}${times} ÷${clock.divide}`;
}

/** Where the first copies of the wanted band leave. */
function copyRows({ direction, rate, wanted }: Figures): Row[] {
  const [band] = wanted;
  if (direction === 'capture' || band === undefined || band.zone !== 1) return [];
  const low = `${formatFrequency(rate - band.high)} .. ${formatFrequency(rate - band.low)}`;
  return [['first copies', `${low} and ${formatFrequency(rate + band.low)} .. ${formatFrequency(rate + band.high)}`]];
}

/** The rates that keep the band whole in this zone, with the room to each side, or how far outside the present one is. */
function windowRows({ rate, rateWindow }: Figures): Row[] {
  if (rateWindow === null) return [];
  const { low, high } = rateWindow;
  const open = !Number.isFinite(high);
  const words = open ? `${formatFrequency(low)} and more` : `${formatFrequency(low)} .. ${formatFrequency(high)}`;
  const room = (hz: number): string => roomWords(Math.abs(hz), rate);
  if (!holds(rateWindow, rate)) {
    return knownRows(['keeps the band whole', words], ['outside it by', room(rate < low ? low - rate : rate - high)]);
  }
  return knownRows(
    ['keeps the band whole', words],
    ['room below', room(rate - low)],
    ['room above', open ? null : room(high - rate)],
  );
}

/** How many windows are listed to each side of the present rate. */
const listedWindows = 2;

/** The windows next to the present rate, each with its zones, and how many more there are. */
function otherWindowRows({ windows, leftOff }: RateTable, { rate }: Figures): Row[] {
  const below = windows.filter(({ high }) => high < rate * (1 - slack)).slice(-listedWindows);
  const above = windows.filter(({ low }) => low > rate * (1 + slack)).slice(0, listedWindows);
  const here = windows.filter((window) => holds(window, rate));
  const more = windows.length - below.length - above.length - here.length + leftOff;
  return [
    ...here.slice(0, 1).flatMap(({ zones }): Row[] => (zones.length < 2 ? [] : [['this window', zoneWords(zones)]])),
    ...[...below].reverse().map((window): Row => ['window below', wideWords(window)]),
    ...above.map((window): Row => ['window above', wideWords(window)]),
    ...(more > 0 ? [['further windows', formatCount(more, 'more', 'more')] as const] : []),
  ];
}

/** A window with its width, which is the room that a clock has in it. */
function wideWords(window: RateWindow): string {
  const { low, high } = window;
  return high === Infinity ? windowWords(window) : `${windowWords(window)}, ${roomWords(high - low, (low + high) / 2)} wide`;
}

/** "24.7 kHz (26,953 ppm)". */
function roomWords(hz: number, rate: number): string {
  return `${formatFrequency(hz)} (${Math.round((hz / rate) * 1e6).toLocaleString('en-US')} ppm)`;
}

/** A rate this close to the end of a window is in it. */
const slack = 1e-12;

function holds({ low, high }: Pick<RateWindow, 'low' | 'high'>, rate: number): boolean {
  return low <= rate * (1 + slack) && rate * (1 - slack) <= high;
}

function passingRows(found: PassingRates | null): Row[] {
  if (found === null) return [];
  const { ratesHz, inTheWay } = found;
  const why = inTheWay.length === 0 ? '' : `: \`${inTheWay.join('`, `')}\` fails at each`;
  return [
    ['next allowed rates that pass', ratesHz.length === 0 ? `none${why}` : ratesHz.map((hz) => formatFrequency(hz)).join(', ')],
  ];
}
