/** Hovers: the answer for the innermost place under the cursor, then what the declaration says of its key. */
import type { Hover, Position } from 'vscode-languageserver-types';
import { placeAt, type DefinedName, type Path, type PlaceAt, type Reading } from '../spec';
import type { ClientAbilities } from './client-abilities';
import { writeHover, type Answer } from './hovers/answer';
import { channelHover } from './hovers/channel';
import { bitsHover, jitterHover } from './hovers/converter';
import { gateHover } from './hovers/gate';
import { keyProse } from './hovers/key-prose';
import { levelHover } from './hovers/level';
import { limitHover } from './hovers/limit';
import { maskHover } from './hovers/mask';
import { nameHover } from './hovers/name';
import { pulseHover } from './hovers/pulse';
import { rateHover } from './hovers/rate';
import { slotsHover } from './hovers/slots';
import { sourceHover } from './hovers/source';
import { stageHover } from './hovers/stage';
import type { Subject } from './hovers/subject';
import { usedFileHover } from './hovers/used-file';
import { pathForUser } from './hovers/user-path';
import { wantedHover } from './hovers/wanted';
import type { SpecDocument } from './spec-document';
import { offsetOf, rangeOf } from './text-range';

/** The hover at a position, or null where nothing stands there. */
export function hover(document: SpecDocument, position: Position, abilities: ClientAbilities): Hover | null {
  const { reading } = document;
  const offset = offsetOf(reading, position);
  const at = placeAt(reading, offset);
  if (at === null || !standsAt(reading, at, offset)) return null;
  const answer = answerAt(document, at);
  const prose = at.about === null || (answer !== null && at.part === 'value') ? null : keyProse(keyName(at), at.about);
  if (answer === null && prose === null) return null;
  const value = writeHover(answer, prose, abilities.markdown);
  return { contents: { kind: abilities.markdown ? 'markdown' : 'plaintext', value }, range: rangeOf(reading, at.span) };
}

/** Whether the cursor is on the place itself: not on the blanks and comments between the lines of a longer one. */
function standsAt({ text }: Reading, { part, span }: PlaceAt, offset: number): boolean {
  if (span.start === span.end || offset < span.start || offset > span.end) return false;
  return part === 'key' || !text.slice(span.start, span.end).includes('\n');
}

function keyName({ place: { path } }: PlaceAt): string | null {
  const last = path.at(-1);
  return typeof last === 'string' ? last : null;
}

/** What has been computed of the place: in a channel, of a name, or in a definition as its first whole user sees it. */
function answerAt(document: SpecDocument, at: PlaceAt): Answer | null {
  const { place, part } = at;
  if (place.channel !== null) return nameIn(document, at) ?? answerIn(document, place.channel, place.path);
  const [space, name, ...rest] = place.path;
  if (space === 'use') return part === 'value' ? usedFileHover(document.reading, written(document, at)) : null;
  const defined = document.reading.names.find((entry) => entry.space === space && entry.name === name);
  if (defined === undefined) return null;
  if (rest.length === 0 && part === 'key') return nameHover(document, defined);
  return answerForUser(document, defined, rest) ?? (rest.length === 0 ? nameHover(document, defined) : null);
}

/** Where a channel names a clock or another channel: what that is. */
function nameIn(document: SpecDocument, { place: { path }, part, span }: PlaceAt): Answer | null {
  if (part === 'key') return null;
  const name = written(document, { span });
  switch (path.at(-1)) {
    case 'like':
      return answerIn(document, name, []);
    case 'clock':
      return definition(document, 'clocks', name);
    default:
      return null;
  }
}

/** The text there, without quotes around it. */
function written({ reading }: SpecDocument, { span }: Pick<PlaceAt, 'span'>): string {
  return reading.text.slice(span.start, span.end).replace(/^(["'])(.*)\1$/, '$2');
}

function definition(document: SpecDocument, space: DefinedName['space'], name: string): Answer | null {
  const defined = document.reading.names.find((entry) => entry.space === space && entry.name === name);
  return defined === undefined ? null : nameHover(document, defined);
}

function answerForUser(document: SpecDocument, defined: DefinedName, rest: Path): Answer | null {
  const whole = document.judgement.channels.find(({ entry, figures }) => figures !== null && defined.users.includes(entry.name));
  if (whole === undefined) return null;
  const channel = whole.entry.channel;
  const path = channel === null ? null : pathForUser(document.reading, channel, defined, rest);
  return path === null ? null : answerIn(document, whole.entry.name, path);
}

function answerIn(document: SpecDocument, name: string, path: Path): Answer | null {
  const judged = document.judgement.channels.find(({ entry }) => entry.name === name);
  const channel = judged?.entry.channel ?? null;
  const figures = judged?.figures ?? null;
  return channel === null || figures === null ? null : answerOf({ document, channel, figures, path });
}

function answerOf(subject: Subject): Answer | null {
  const [head] = subject.path;
  if (head === undefined) return channelHover(subject);
  if (isLevel(subject.path)) return levelHover(subject);
  switch (head) {
    case 'wanted':
      return wantedHover(subject);
    case 'unwanted':
      return sourceHover(subject);
    case 'rate':
    case 'rate-choices':
      return rateHover(subject);
    case 'aperture':
    case 'hold':
      return pulseHover(subject);
    case 'gate':
      return gateHover(subject);
    case 'filter':
    case 'input-filter':
    case 'output-filter':
      return stageHover(subject);
    case 'slots':
      return slotsHover(subject);
    case 'limits':
      return subject.path.length === 1 ? channelHover(subject) : (maskHover(subject) ?? limitHover(subject));
    case 'bits':
    case 'full-scale':
      return bitsHover(subject);
    case 'jitter':
      return jitterHover(subject);
    default:
      return null;
  }
}

function isLevel(path: Path): boolean {
  const last = path.at(-1);
  return last === 'level' && path.length > 1 && path[0] !== 'limits';
}
