/** `crosstalk-over-limit`: too much of one time slot is left on the link when the next begins. */
import type { LimitFigure } from '../analysis/figures';
import type { Channel, Slots } from '../spec/channel';
import { formatDb, formatFrequency, formatTime } from '../units/format';
import { figuresOf, findingIn, limitPath } from './build';
import type { Finding } from './finding';
import type { FindingKind, Help, Subject } from './kind';
import { brokenLimit, nominalPasses } from './limits';
import { decimalsFor, limitWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'Too much of one time slot is left on the link when the next begins.',
  means: `Slots take turns on one link, which settles as one pole of corner B: a pulse leaves e^{−2πB·t} of its height behind after a
time t. The guard t_g runs from the end of one pulse to the start of the next, so −20·log10(e)·2π·B·t_g dB is what the next slot finds at
its first instant, the worst of it.`,
  matters: `What is left of a neighbour adds to the value of a slot and looks like a part of it: one gauge shows in another.`,
  cure: `A longer guard costs nothing but room: narrow the gate, or share the link among fewer slots, until it fits. A link of a higher
corner forgets faster.`,
  example: {
    spec: `bandkeep: 1
channels:
  strain-link:
    direction: relay
    wanted: { band: 0 Hz .. 40 Hz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 9 kHz .. 3 MHz, level: -60 dBFS }
    rate: 8 kHz
    gate: 12 %
    slots: { count: 4, guard: 5 us, link: 150 kHz }
    input-filter: { bandwidth: 400 Hz }
    output-filter: { bandwidth: 400 Hz }
    limits: { crosstalk: -60 dB }
`,
    from: 'guard: 5 us',
    to: 'guard: 12 us',
  },
};

/** The finding code `crosstalk-over-limit`. */
export const crosstalkOverLimit: FindingKind = {
  code: 'crosstalk-over-limit',
  severity: 'error',
  group: 'copies',
  help,
  remedies: ['pulse', 'guard'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'crosstalk');
    const { slots } = subject.channel;
    return limit === null || slots === null ? [] : [over(subject, limit, slots)];
  },
};

function over({ channel }: Subject, limit: LimitFigure, slots: Slots): Finding {
  const margin = limit.margin ?? 0;
  const decimals = decimalsFor('crosstalk', margin);
  const { nominal, worstAt } = limit;
  const worst = { worstAt, nominal, nominalPasses: nominalPasses(limit, nominal), decimals };
  const value = formatDb(limit.value ?? 0, 'dB', decimals);
  const behind = `${formatTime(slots.guardSeconds)} of guard on a link of ${formatFrequency(slots.linkHz)}`;
  return findingIn(channel, {
    code: 'crosstalk-over-limit',
    severity: 'error',
    message:
      `A slot leaves ${value} of itself in the next, behind ${behind}, ` +
      `${formatDb(-margin, 'dB', decimals)} over the crosstalk limit of ${limitWords(limit)}${worstCaseWords(worst)}${cureWords(slots, limit)}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    related: [{ path: ['slots'], message: 'the slots' }, ...gateOf(channel)],
    figures: figuresOf(limit),
    limit: 'crosstalk',
  });
}

/** The guard that would do: what is left falls in proportion to it in dB. A limit of 0 dB or more asks for none. */
function cureWords({ guardSeconds }: Slots, { at, nominal }: LimitFigure): string {
  const needed = guardSeconds * (at / (nominal ?? NaN));
  return Number.isFinite(needed) ? `: it asks for a guard of ${formatTime(needed)}` : '';
}

function gateOf({ gate }: Channel): readonly { readonly path: readonly string[]; readonly message: string }[] {
  return gate === null ? [] : [{ path: ['gate'], message: 'the gate' }];
}
