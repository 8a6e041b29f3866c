/** The picture of one channel. */
import type { Judgement } from '../findings';
import type { PanelPicture } from '../protocol/picture';
import { withSharedPlaces } from './also-at';
import { headingOf } from './heading';
import { leavingSection } from './leaving-section';
import { pathSection } from './path-section';
import { samplingSection } from './sampling-section';
import { subjectOf } from './subject';

/** Everything that the panel draws of a channel; the channel must be whole. */
export function pictureOf(judgement: Judgement, channelName: string): PanelPicture {
  const subject = subjectOf(judgement, channelName);
  const first = subject.channel.direction === 'capture' ? samplingSection(subject) : leavingSection(subject);
  const picture = { channel: channelName, heading: headingOf(subject), sections: [first, pathSection(subject)] };
  return withSharedPlaces(picture, judgement.reading);
}
