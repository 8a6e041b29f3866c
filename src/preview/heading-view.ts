/** The top of the panel: the channel, what it is, the verdict in words and colour, and the panel's own two buttons. */
import type { Heading } from '../protocol/picture';
import { button, element, setText } from './dom';

/** What the heading asks of the page. */
export interface HeadingTarget {
  pin: () => void;
  refresh: () => void;
}

/** The heading. */
export class HeadingView {
  private readonly channel = element('h1');
  private readonly summary = element('span', { class: 'summary' });
  private readonly verdict = element('strong', { class: 'verdict' });
  private readonly words = element('span', { class: 'unseen' });
  private readonly freshness = element('span', { class: 'freshness' });
  private readonly pinButton: HTMLButtonElement;

  constructor(root: HTMLElement, target: HeadingTarget) {
    this.pinButton = button('Hold', 'Hold this channel wherever the cursor goes', target.pin);
    const refresh = button('Refresh', 'Draw the newest text again', target.refresh);
    const tools = element('div', { class: 'tools' }, this.freshness, this.pinButton, refresh);
    root.replaceChildren(this.channel, this.verdict, this.words, this.summary, tools);
  }

  /** Shows a channel's heading. */
  show(channel: string, heading: Heading, pinned: 'pinned' | 'free'): void {
    setText(this.channel, channel);
    setText(this.summary, heading.summary);
    setText(this.verdict, heading.verdict.text);
    this.verdict.dataset['standing'] = heading.verdict.standing;
    setText(this.words, heading.words);
    this.pin(pinned);
    this.pinButton.hidden = false;
  }

  /** Shows whether the channel is held. */
  pin(pinned: 'pinned' | 'free'): void {
    this.pinButton.setAttribute('aria-pressed', String(pinned === 'pinned'));
    setText(this.pinButton, pinned === 'pinned' ? 'Held' : 'Hold');
  }

  /** Shows whether what is drawn is the newest text. */
  fresh(state: 'up to date' | 'not up to date' | ''): void {
    setText(this.freshness, state);
    this.freshness.dataset['state'] = state;
  }

  /** Shows that there is nothing to head yet. */
  empty(): void {
    setText(this.channel, 'Bandkeep');
    setText(this.summary, '');
    setText(this.verdict, '');
    this.pinButton.hidden = true;
  }
}
