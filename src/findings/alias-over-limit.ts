/** `alias-over-limit`: a source lands in a protected range above the alias limit. */
import type { AliasFigure, Figures, LimitFigure } from '../analysis/figures';
import type { Channel, Source } from '../spec/channel';
import type { Path } from '../spec/place';
import { formatDb } from '../units/format';
import { figuresOf, findingIn, limitAndFilter, limitPath } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { breaks, brokenLimit, countsSum, nominalPasses } from './limits';
import { decimalsFor, limitWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'Something unwanted lands in a protected range above the alias limit.',
  means: `Sampling at a rate fs makes every frequency f indistinguishable from |f − k·fs| for every whole k. A source of the list
\`unwanted\` comes out inside a protected range, and after the filter and the aperture have had their say it is still stronger
than \`limits.alias\` allows. The level is the largest over the whole source, over every fold up to infinity and over all
tolerances; it is proved, not sampled. There is one finding for each source that breaks the limit. A source with \`harmonics\`
or a table of lines is judged by the strongest of them. A limit in the form \`{ sum: -90 dBFS }\` counts everything that lands
together, as powers, each at its own worst; there is then one finding, at the limit, which names the strongest.

In a relay every source leaves again at |f + k·fs|: gate or hold weigh each copy, and the filter behind weighs it once more, at the
frequency where it leaves. The levels are those at the output.`,
  matters: `Nothing behind the sampler can tell the landed tone from a real one. It looks like a bearing fault, a tide, a word: it is
in the data for good.`,
  cure: `Keep it out before the sampler: a higher order or a lower corner takes more of it away, a higher rate moves the frequency that
lands there further out, where the filter already helps. Each quick fix has been tried on the whole file. Where the source can
be weakened or moved instead, state what will really arrive. Where the limit is stricter than the job needs, change the limit.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 40 kHz .. 3 MHz, level: -55 dBFS }
    rate: 51.2 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits: { alias: -96 dBFS }
`,
    from: 'order: 4',
    to: 'order: 5',
  },
};

/** The finding code `alias-over-limit`. */
export const aliasOverLimit: FindingKind = {
  code: 'alias-over-limit',
  severity: 'error',
  group: 'sampling',
  help,
  remedies: ['rate', 'pulse', 'corner', 'part', 'order', 'family'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'alias');
    if (limit === null) return [];
    if (countsSum(subject.channel, 'alias')) return [sumOver(subject, limit)];
    return subject.figures.aliases.filter((alias) => breaks(alias.margin)).map((alias) => over(subject, limit, alias));
  },
};

/** Where the frequency of a source stands. */
export function sourcePath(channel: Channel, index: number): Path {
  const kind: Source['kind'] = channel.unwanted[index]?.kind ?? 'anything';
  return kind === 'anything' ? ['unwanted', index] : ['unwanted', index, kind];
}

/** "`drive hash` at 41.2 kHz lands on 10 kHz at −91.2 dBFS"; "`switcher`, harmonic 5 at 1.55 MHz …". */
function landingWords(figures: Figures, alias: AliasFigure, value: string): string {
  const from = alias.frequency === null ? '' : ` at ${frequencyWords(figures, alias.frequency)}`;
  const onto =
    Number.isFinite(alias.frequency) && alias.lands !== null ? frequencyWords(figures, alias.lands) : 'the protected range';
  if (figures.direction !== 'relay') return `${sourceWords(alias)}${from} lands on ${onto} at ${value}`;
  return `${sourceWords(alias)}${from} leaves ${alias.lands === null ? 'in' : 'at'} ${onto} at ${value}`;
}

/** "`switcher`", or "`switcher`, harmonic 5". */
export function sourceWords({ source, harmonic }: Pick<AliasFigure, 'source' | 'harmonic'>): string {
  return harmonic === 1 ? `\`${source}\`` : `\`${source}\`, harmonic ${harmonic}`;
}

/** How many of the sources that add up are named. */
const namedContributors = 3;

/** All landings together are above a limit for their sum: no single source is to blame, so it stands at the limit. */
function sumOver({ channel, figures }: Subject, limit: LimitFigure): Finding {
  const margin = limit.margin ?? 0;
  const decimals = decimalsFor('alias', margin);
  const { nominal, worstAt } = limit;
  const worst = { worstAt, nominal, nominalPasses: nominalPasses(limit, nominal), decimals };
  const landing = contributors(figures, limit);
  const named = landing
    .slice(0, namedContributors)
    .map(({ alias, sumDb }) => `\`${alias.source}\` with ${formatDb(sumDb, limit.unit, decimals)}`);
  const more = landing.length - named.length;
  return findingIn(channel, {
    code: 'alias-over-limit',
    severity: 'error',
    message:
      `All that ${channel.direction === 'relay' ? 'leaves' : 'lands'} in the protected ranges adds up to ${formatDb(limit.value ?? 0, limit.unit, decimals)}, ` +
      `${formatDb(-margin, 'dB', decimals)} over the limit of ${limitWords(limit)} for the sum of all aliases` +
      `${worstCaseWords(worst)}; strongest ${named.join(', then ')}${more > 0 ? ` and ${more} more` : ''}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    related: [
      ...landing.slice(0, namedContributors).map(({ alias }) => ({
        path: sourcePath(channel, alias.index),
        message: `\`${alias.source}\``,
      })),
      ...limitAndFilter(channel, limit).filter(({ path }) => path[0] !== 'limits'),
    ],
    figures: figuresOf(limit),
    limit: 'alias',
  });
}

/** The sources that land, each with the sum of its own landings in the limit's unit, strongest first. */
function contributors(figures: Figures, limit: LimitFigure): readonly { readonly alias: AliasFigure; readonly sumDb: number }[] {
  return figures.aliases
    .flatMap((alias) => {
      const { level, sum, relative } = alias;
      if (level === null || sum === null) return [];
      return [{ alias, sumDb: limit.unit === 'dBc' ? (relative ?? level) + (sum - level) : sum }];
    })
    .sort((a, b) => b.sumDb - a.sumDb);
}

function over({ channel, figures }: Subject, limit: LimitFigure, alias: AliasFigure): Finding {
  const strongest = limit.where?.source === alias.source;
  const value = limit.unit === 'dBc' ? alias.relative : alias.level;
  const nominal = strongest ? limit.nominal : limit.unit === 'dBc' ? null : alias.nominal;
  const margin = alias.margin ?? 0;
  const decimals = decimalsFor('alias', margin);
  const worst = { worstAt: alias.worstAt, nominal, nominalPasses: nominalPasses(limit, nominal), decimals };
  const landing = landingWords(figures, alias, formatDb(value ?? -Infinity, limit.unit, decimals));
  return findingIn(channel, {
    code: 'alias-over-limit',
    severity: 'error',
    message: `${landing}, ${formatDb(-margin, 'dB', decimals)} over the alias limit of ${limitWords(limit)}${worstCaseWords(worst)}.`,
    path: sourcePath(channel, alias.index),
    ref: limit.ref ?? channel.unwanted[alias.index]?.ref ?? null,
    related: limitAndFilter(channel, limit),
    figures: { value, nominal, limit: limit.at, margin, frequency: alias.frequency, lands: alias.lands, source: alias.source },
    limit: 'alias',
  });
}
