/** Which channel a picture is asked of, and why there is none where it cannot be drawn. */
import type { Position } from 'vscode-languageserver-types';
import { counts, spanOfFinding, type Finding } from '../findings';
import { formatCount } from '../units/format';
import { channelAt } from './locate';
import type { SpecDocument } from './spec-document';
import { rangeOf } from './text-range';

/** A channel that can be drawn, or the reason why not. */
export type Drawable =
  | { readonly kind: 'channel'; readonly channel: string }
  | { readonly kind: 'none'; readonly channel: string | null; readonly reason: string };

/** The channel named, else the one at the position, else the first. */
export function drawable(document: SpecDocument, named: string | null, position: Position | null): Drawable {
  const { channels } = document.judgement;
  const near = named ?? (position === null ? null : channelAt(document, position));
  const judged = near === null ? channels[0] : channels.find(({ entry }) => entry.name === near);
  if (judged === undefined) return { kind: 'none', channel: near, reason: missing(document, near) };
  const channel = judged.entry.name;
  return judged.figures === null ? { kind: 'none', channel, reason: broken(document, channel) } : { kind: 'channel', channel };
}

function missing(document: SpecDocument, named: string | null): string {
  if (named !== null) return `This spec no longer has a channel \`${named}\`.`;
  const [fault] = document.judgement.findings.filter(counts);
  return fault === undefined ? 'This spec has no channel yet.' : `This spec has no channel; ${firstFault(document, fault)}`;
}

/** Faults of the channel's own text, or, where it has none, those of what it names. */
function broken(document: SpecDocument, channel: string): string {
  const faults = document.judgement.findings.filter((finding) => counts(finding) && 'span' in finding.at);
  const own = faults.filter((finding) => finding.channel === channel);
  const [first] = own.length > 0 ? own : faults;
  if (first === undefined) return `\`${channel}\` is not whole, so there is nothing to draw.`;
  const whose =
    own.length > 0 ? `\`${channel}\` has ${formatCount(own.length, 'fault')}` : `\`${channel}\` names something with a fault`;
  return `${whose}; ${firstFault(document, first)}`;
}

function firstFault({ reading }: SpecDocument, fault: Finding): string {
  const { start } = rangeOf(reading, spanOfFinding(reading, fault));
  return `the first is on line ${start.line + 1}: ${fault.message}`;
}
