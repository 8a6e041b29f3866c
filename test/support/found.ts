/** What one check finds in a hand-made channel and its figures. */
import type { Figures } from '../../src/analysis/figures';
import { kindOf } from '../../src/findings/kinds';
import type { Finding } from '../../src/findings/finding';
import type { Channel } from '../../src/spec/channel';
import { butterworthForm, capture, exact, rate, stage, tone, wanted } from './channel-builder';

/** The findings of one code. */
export function found(code: string, channel: Channel, figures: Figures): readonly Finding[] {
  const kind = kindOf(code);
  if (kind?.check === undefined) throw new Error(`no check for ${code}`);
  return kind.check({ channel, figures });
}

/** Their messages. */
export function messages(code: string, channel: Channel, figures: Figures): readonly string[] {
  return found(code, channel, figures).map((finding) => finding.message);
}

/** A capture channel with a filter, a source and no limits. */
export function bearing(parts: Partial<Channel> = {}): Channel {
  return capture({
    name: 'bearing-x',
    wanted: [wanted(5, 10000, -3)],
    rate: rate(51200),
    unwanted: [tone(310e3, -24, { name: 'drive hash' })],
    stages: [stage(butterworthForm(4, 14000), { cornerTolerance: exact })],
    ...parts,
  });
}
