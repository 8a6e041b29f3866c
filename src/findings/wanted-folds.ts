/** `wanted-folds`: sampling lays a wanted band over itself or over another wanted band. */
import type { Figures, SamplingFault } from '../analysis/figures';
import { rateWindowsOf } from '../analysis/rate-windows';
import type { Channel } from '../spec/channel';
import { formatCount, formatFrequency } from '../units/format';
import { findingIn } from './build';
import type { Finding } from './finding';
import { bandWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { windowWords } from './window-words';

const help: Help = {
  summary: 'Sampling lays a wanted band over itself, or over another wanted band.',
  means: `A band comes out whole only if no multiple of half the rate lies inside it, its guard included, at either end of the clock's
tolerance. Here one does: frequencies on both sides of it come out on top of each other. With several wanted bands each must stay
whole and their appearances must not overlap.`,
  matters: `The two halves can never be told apart again. No filter helps, since both are wanted.`,
  cure: `Choose a rate that keeps the band whole. For a band from lo to hi these are the rates from 2·hi/n to 2·lo/(n − 1), with n = 1 for
every rate above twice the highest wanted frequency. A smaller \`guard\` or a narrower band widens the choice.`,
  example: {
    spec: `bandkeep: 1
channels:
  ice-echo:
    direction: capture
    wanted: { band: 1.2 MHz .. 1.6 MHz, level: -10 dBFS }
    unwanted: { name: medium-wave station, tone: 909 kHz, level: -60 dBFS }
    rate: 1.4 MHz
    filter: { family: butterworth, order: 4, corner: 1.8 MHz }
    limits: { flatness: 3 dB }
`,
    from: 'rate: 1.4 MHz',
    to: 'rate: 2.1 MHz',
  },
};

/** The finding code `wanted-folds`. */
export const wantedFolds: FindingKind = {
  code: 'wanted-folds',
  severity: 'error',
  group: 'sampling',
  help,
  remedies: ['rate'],
  check: (subject) =>
    subject.figures.faults.filter((fault) => fault.kind === 'wanted-folds').map((fault) => folds(subject, fault)),
};

/** "the wanted band `echo`, 1.2 MHz .. 1.6 MHz". */
export function wantedWords(channel: Channel, index: number): string {
  const band = channel.wanted[index];
  if (band === undefined) return 'the wanted band';
  const guard = channel.guardHz > 0 ? ` with its guard of ${formatFrequency(channel.guardHz)}` : '';
  return `the wanted band ${band.name === null ? '' : `\`${band.name}\`, `}${bandWords(band.lowHz, band.highHz)}${guard}`;
}

/** "700 kHz, half the rate of 1.4 MHz" or "2.1 MHz, 3 times half the rate of 1.4 MHz". */
export function edgeWords(figures: Pick<Figures, 'outputRate'>, edgeHz: number): string {
  const halves = Math.round(edgeHz / (figures.outputRate / 2));
  const whole = halves % 2 === 0 ? halves / 2 : null;
  const share = whole === null ? shareWords(halves, 'half the rate') : shareWords(whole, 'the rate');
  return `${formatFrequency(edgeHz)}, ${share} of ${formatFrequency(figures.outputRate)}`;
}

function shareWords(count: number, what: string): string {
  return count === 1 ? what : `${formatCount(count, 'time')} ${what}`;
}

function folds({ channel, figures }: Subject, fault: SamplingFault): Finding {
  const band = sentenceCase(wantedWords(channel, fault.index));
  const self =
    fault.edgeHz === null
      ? `${band} folds onto itself`
      : `${band} crosses ${edgeWords(figures, fault.edgeHz)}, and folds onto itself`;
  const other = fault.onto === null ? null : `${band} ${meetsWords(channel, figures, fault.onto)}`;
  return findingIn(channel, {
    code: 'wanted-folds',
    severity: 'error',
    message: `${other ?? self}. ${cureWords(channel)}`,
    path: ['wanted', fault.index, 'band'],
    related: [{ path: ['rate'], message: 'the rate' }, ...onto(fault)],
    figures: { frequency: fault.edgeHz },
  });
}

/** What two bands do to each other: in generate the same words would have to make both. */
function meetsWords(channel: Channel, { outputRate }: Figures, onto: number): string {
  const other = wantedWords(channel, onto);
  const at = `at ${formatFrequency(outputRate)}`;
  return channel.direction === 'generate'
    ? `is made by the same words as ${other}, ${at}`
    : `comes out on top of ${other}, ${at}`;
}

/** How many zones around the present one are looked at for rates to name. */
const zonesLookedAt = 24;

/** The windows of rates next to the present one, below and above. */
function cureWords(channel: Channel): string {
  const { windows, leftOff } = rateWindowsOf(channel, zonesLookedAt);
  const rate = channel.rate.hz;
  const below = windows.filter(({ high }) => high < rate).at(-1);
  const above = windows.find(({ low }) => low > rate);
  const near = [below, above].filter((window) => window !== undefined).map(windowWords);
  const whole = channel.wanted.length === 1 ? 'it whole' : 'all bands whole and apart';
  if (near.length > 0) return `Rates of ${near.join(' and of ')} keep ${whole}.`;
  return leftOff > 0
    ? 'Choose another rate.'
    : `No rate keeps ${whole}: even before they are sampled the bands lie on each other.`;
}

function onto(fault: SamplingFault): readonly { path: (string | number)[]; message: string }[] {
  return fault.onto === null ? [] : [{ path: ['wanted', fault.onto, 'band'], message: 'the other band' }];
}

/** The text with a capital at its start. */
export function sentenceCase(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
