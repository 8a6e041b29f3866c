/** What was last said to the page, numbered, so that a page that was hidden or reloaded can be told again. */
import type { PanelPicture } from '../../protocol/picture';
import type { HostMessage } from '../../protocol/panel-messages';
import type { Subject } from './subject';

/** The last picture and, where there is no newer one, the reason why. */
export class Newest {
  private sequence = 0;
  private show: Extract<HostMessage, { kind: 'show' }> | null = null;
  private stale: Extract<HostMessage, { kind: 'stale' }> | null = null;

  /** The messages for a page that knows nothing: the last good picture, then why it is not the newest. */
  get messages(): readonly HostMessage[] {
    return [this.show, this.stale].filter((message) => message !== null);
  }

  /** Why the picture is not the newest; null where it is, or where there is nothing yet. */
  get staleReason(): string | null {
    return this.stale?.reason ?? null;
  }

  picture(subject: Subject, picture: PanelPicture): HostMessage {
    const pinned = subject.pinned !== null;
    this.sequence += 1;
    this.show = { kind: 'show', sequence: this.sequence, uri: subject.spec.toString(), pinned, picture };
    this.stale = null;
    return this.show;
  }

  none(subject: Subject, reason: string): HostMessage {
    this.sequence += 1;
    this.stale = { kind: 'stale', sequence: this.sequence, uri: subject.spec.toString(), reason };
    // Another spec's picture must not stand behind this one's reason.
    if (this.show !== null && this.show.uri !== this.stale.uri) this.show = null;
    return this.stale;
  }
}
