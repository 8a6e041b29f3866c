/** The picture of one channel. */
import type { Judgement } from '../findings';
import type { PanelPicture, Section } from '../protocol/picture';
import { withSharedPlaces } from './also-at';
import { withFiniteLevels } from './finite-levels';
import { headingOf } from './heading';
import { leavingSection } from './leaving-section';
import { pathSection } from './path-section';
import { samplingSection } from './sampling-section';
import { subjectOf } from './subject';
import type { Subject } from './subject';

/** Everything that the panel draws of a channel; the channel must be whole. */
export function pictureOf(judgement: Judgement, channelName: string): PanelPicture {
  const subject = subjectOf(judgement, channelName);
  const sections = [...signalSections(subject), pathSection(subject)].map(withFiniteLevels);
  const picture = { channel: channelName, heading: headingOf(subject), sections };
  return withSharedPlaces(picture, judgement.reading);
}

/** What arrives in capture, what leaves in generate, both in relay, where something unwanted is stated. */
function signalSections(subject: Subject): Section[] {
  const { direction, unwanted } = subject.channel;
  if (direction === 'capture') return [samplingSection(subject)];
  return [...(direction === 'relay' && unwanted.length > 0 ? [samplingSection(subject)] : []), leavingSection(subject)];
}
