/** `snr-short`: the signal-to-noise ratio at the test tone is below its limit. */
import type { Figures, LimitFigure, NoiseFigures } from '../analysis/figures';
import type { Channel } from '../spec/channel';
import { formatDb } from '../units/format';
import { figuresOf, findingIn, limitPath } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { brokenLimit, nominalPasses } from './limits';
import { decimalsFor, limitWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'The signal-to-noise ratio at the test tone is smaller than the limit asks.',
  means: `The noise in the wanted band (quantisation, jitter, and whatever else the channel states) is set against the test tone as it
comes out. The ratio is below \`limits.snr\`. Without \`test-tone\` the tone stands at the highest wanted frequency at the wanted
level. The message names the strongest part of the noise.`,
  matters: `Weak signals drown. A detector behind the channel needs more averaging, or misses what it was built for.`,
  cure: `Cure the strongest part. Quantisation: more \`bits\`, or a higher rate, which spreads the same noise over a wider band. Jitter:
a quieter clock; it grows with the frequency of the tone. A wanted level far below full scale costs its distance in dB.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 20 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 100 Hz
    filter: { family: butterworth, order: 4, corner: 25 Hz }
    bits: 10
    limits: { snr: 70 dB }
`,
    from: 'bits: 10',
    to: 'bits: 14',
  },
};

/** The finding code `snr-short`. */
export const snrShort: FindingKind = {
  code: 'snr-short',
  severity: 'error',
  group: 'the wanted band',
  help,
  remedies: ['rate', 'corner', 'part'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'snr');
    return limit === null ? [] : [short(subject, limit)];
  },
};

function short({ channel, figures }: Subject, limit: LimitFigure): Finding {
  const margin = limit.margin ?? 0;
  const decimals = decimalsFor('snr', margin);
  const worst = { worstAt: limit.worstAt, nominal: limit.nominal, nominalPasses: nominalPasses(limit, limit.nominal), decimals };
  const tone = frequencyWords(figures, figures.testTone.frequency);
  const value = formatDb(limit.value ?? 0, 'dB', decimals);
  const by = `${formatDb(-margin, 'dB', decimals)} short of the limit of ${limitWords(limit)}`;
  return findingIn(channel, {
    code: 'snr-short',
    severity: 'error',
    message: `The signal-to-noise ratio of the tone at ${tone} is ${value}, ${by}${worstCaseWords(worst)}${mostWords(channel, figures, limit)}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    figures: figuresOf(limit),
    limit: 'snr',
  });
}

/** More than half of what counts is not the noise where the ratio without unwanted sources is better by this, dB. */
const halfDb = 10 * Math.log10(2);

/** What most of it is, since that is what to cure: a part of the noise, or what unwanted sources add where they count. */
function mostWords(channel: Channel, { snr, noise }: Figures, { value }: LimitFigure): string {
  const counts = channel.limits.some(({ key, withUnwanted }) => key === 'snr' && withUnwanted);
  const unwanted = counts && (snr === null || (value !== null && value < snr - halfDb));
  return unwanted ? '; most of it is what unwanted sources add' : strongestPart(noise);
}

/** The largest part of the noise, since that is the one to cure. */
function strongestPart(noise: NoiseFigures): string {
  const parts: readonly [string, number | null][] = [
    ['quantisation', noise.quantisation],
    ['jitter', noise.jitter],
    ['the sources', noise.sources],
    ['the stages', noise.stages],
    ['thermal noise', noise.thermal],
    ['the converter', noise.converter],
  ];
  const known = parts.filter((part): part is [string, number] => part[1] !== null);
  const [largest] = known.sort(([, a], [, b]) => b - a);
  return largest === undefined ? '' : `; most of the noise is ${largest[0]}, ${formatDb(largest[1], 'dBFS')}`;
}
