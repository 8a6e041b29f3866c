/** `stale-acceptance`: a comment that accepts a finding which is not there. */
import type { Acceptance } from '../spec/reading';
import type { Finding } from './finding';
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A comment accepts a finding that is not there.',
  means: `A comment \`# bandkeep: accept CODE, reason\` speaks for the finding on the line below it, or on its own line where it stands at
the end of one. There is no finding of that code on that line. Findings about the text cannot be accepted at all.`,
  matters: `An acceptance that is left behind would silently accept the next finding that turns up there.`,
  cure: `Take the comment out, or move it to the line of the value that the finding marks.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 90 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    # bandkeep: accept alias-over-limit, agreed in the gate review
    limits: { alias: -90 dBFS }
`,
    from: '    # bandkeep: accept alias-over-limit, agreed in the gate review\n',
    to: '',
  },
};

/** The finding code `stale-acceptance`; it is found when acceptances are applied, after all others. */
export const staleAcceptance: FindingKind = {
  code: 'stale-acceptance',
  severity: 'warning',
  group: 'advice',
  help,
  remedies: [],
};

/** Why an acceptance speaks for nothing. */
export type Staleness = 'no-finding' | 'no-such-code' | 'not-acceptable';

/** The warning about an acceptance that matches nothing. */
export function staleFinding(acceptance: Acceptance, why: Staleness): Finding {
  return {
    code: 'stale-acceptance',
    severity: 'warning',
    channel: null,
    ref: null,
    message: messages[why](acceptance.code),
    at: { span: acceptance.span },
    related: [],
    figures: null,
    limit: null,
    accepted: null,
  };
}

const messages: Readonly<Record<Staleness, (code: string) => string>> = {
  'no-finding': (code) =>
    `There is no \`${code}\` on this line to accept. Take the comment out, or move it to the line it means.`,
  'no-such-code': (code) => `There is no finding called \`${code}\`, so this accepts nothing.`,
  'not-acceptable': (code) => `\`${code}\` cannot be accepted: only findings about figures can. Take the comment out.`,
};
