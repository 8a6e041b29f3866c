/** `beyond-data`: a measured table that refuses to be asked outside its range is asked there. */
import type { BeyondData } from '../analysis/figures';
import { stagePath } from '../spec/resolve/stages';
import { formatFrequency } from '../units/format';
import { findingIn } from './build';
import type { Finding } from './finding';
import type { FindingKind, Help, Subject } from './kind';

const help: Help = {
  summary: 'A measured table is asked outside the frequencies that it holds.',
  means: `A stage by \`measured\` holds what was measured, from its first frequency to its last. A wanted band, a source that may stand
anywhere in a range, or the copies of a sampled band ask for its gain outside that, and the stage says that nothing may be asked there:
\`beyond: refuse\`, which is the default, or \`below: refuse\`. What leans on it is not computed, and the limits on it are not judged.`,
  matters: `What a filter does beyond the last measured point decides what lands from there. A guess would look like a proved figure.`,
  cure: `Measure further, or say what holds: \`beyond: hold\` goes on with the last value, \`beyond: -40 dB/decade\` lets it fall,
\`below: hold\` goes on with the first. For a source or a band that was left open upwards, such as \`anything\` or \`40 kHz ..\`, only a
slope, \`hold\` or an end of its own can help.`,
  example: null,
};

/** The finding code `beyond-data`. */
export const beyondData: FindingKind = {
  code: 'beyond-data',
  severity: 'error',
  group: 'the wanted band',
  help,
  remedies: [],
  check: (subject) => {
    const stated = new Set(subject.figures.limits.map((limit) => limit.limit));
    // Copies leave a generate channel whether or not anybody limits them.
    const asked = subject.figures.beyondData.filter((one) => one.asks !== 'copies' || one.keys.some((key) => stated.has(key)));
    return asked.map((one) => refused(subject, one));
  },
};

function refused({ channel, figures }: Subject, found: BeyondData): Finding {
  const label = channel.stages[found.stage]?.label ?? 'the stage';
  const limits = figures.limits.flatMap(({ limit }) => (found.keys.includes(limit) ? [`\`${limit}\``] : []));
  const covers =
    found.side === 'beyond' ? `ends at ${formatFrequency(found.endHz)}` : `begins at ${formatFrequency(found.endHz)}`;
  const cure =
    found.side === 'beyond'
      ? 'Measure further, or write `beyond: hold` or a slope, such as `beyond: −40 dB/decade`'
      : 'Measure lower, or write `below: hold`';
  return findingIn(channel, {
    code: 'beyond-data',
    severity: 'error',
    message: `The table of \`${label}\` ${covers}, but ${askedWords(found)}${unjudgedWords(limits)}. ${cure}.`,
    path: stagePath(channel, found.stage),
    figures: { frequency: found.askedHz, source: found.source, limit: found.endHz },
  });
}

function askedWords({ asks, askedHz, source }: BeyondData): string {
  const at = Number.isFinite(askedHz) ? `at ${formatFrequency(askedHz)}` : 'at any frequency';
  switch (asks) {
    case 'wanted':
      return `the wanted band reaches ${formatFrequency(askedHz)}`;
    case 'test tone':
      return `the test tone stands ${at}`;
    case 'source':
      return `\`${source ?? ''}\` may stand ${at}`;
    case 'copies':
      return Number.isFinite(askedHz) ? `a copy leaves ${at}` : 'copies leave at ever higher frequencies';
    case 'landings':
      return `a landing counts ${at}`;
    case 'response':
    case 'through':
    case 'output':
      return `the mask of \`${asks}\` reaches ${Number.isFinite(askedHz) ? formatFrequency(askedHz) : 'ever higher frequencies'}`;
  }
}

function unjudgedWords(limits: readonly string[]): string {
  if (limits.length === 0) return ', so nothing is computed there';
  return limits.length === 1
    ? `, so the limit ${limits[0] ?? ''} is not judged`
    : `, so the limits ${limits.join(', ')} are not judged`;
}
