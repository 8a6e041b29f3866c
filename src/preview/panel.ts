/** The page as a whole: takes the extension's messages, keeps what the reader has set, and never loses the last good picture. */
import type { Theme } from '../drawing/theme';
import type { HostMessage, SaveKind } from '../protocol/panel-messages';
import type { PanelPicture, Plot, Section } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import { byId, setText } from './dom';
import { HeadingView } from './heading-view';
import type { Host } from './host';
import type { PlotTarget } from './plot-view';
import { SectionView } from './section-view';
import { freshPlot, plotKey, withPlot } from './view-state';
import type { PanelState } from './view-state';

/** The page. */
export class Panel {
  private state: PanelState;
  private picture: PanelPicture | null = null;
  private sequence = -1;
  private place: PlaceName | null = null;
  private readonly heading: HeadingView;
  private readonly sections = new Map<string, SectionView>();
  private readonly main = byId('sections');
  private readonly notice = byId('notice');
  private readonly announcer = byId('announcer');

  constructor(
    private readonly host: Host,
    private theme: Theme,
  ) {
    this.state = host.readState();
    this.heading = new HeadingView(byId('heading'), {
      pin: () => {
        this.togglePin();
      },
      refresh: () => {
        host.post({ kind: 'request-refresh' });
      },
    });
    // In the heading, which stays in sight when the page is scrolled.
    byId('heading').append(this.notice);
    this.explain('Waiting for the first picture.');
    // Kept at once: a page without state is not revived after a reload.
    this.keep(this.state);
    this.listen();
  }

  /** Does what a message asks. */
  take(message: HostMessage): void {
    switch (message.kind) {
      case 'show':
        if (message.sequence >= this.sequence) this.show(message);
        return;
      case 'stale':
        if (message.sequence >= this.sequence) this.stale(message);
        return;
      case 'lit':
        this.place = message.place;
        for (const section of this.sections.values()) section.light(message.place);
    }
  }

  /** Wears another theme. */
  wear(theme: Theme): void {
    this.theme = theme;
    if (this.picture !== null) this.draw(this.picture);
  }

  private show(message: HostMessage & { readonly kind: 'show' }): void {
    const { picture, sequence, uri, pinned } = message;
    const first = this.picture === null;
    this.sequence = sequence;
    this.picture = picture;
    this.keepFor(uri, { channel: picture.channel, pinned });
    this.notice.hidden = true;
    document.body.classList.remove('stale');
    this.heading.fresh('up to date');
    this.draw(picture);
    if (first) window.scrollTo({ top: this.state.scroll });
    const items = picture.sections.flatMap((section) => section.plots).reduce((sum, plot) => sum + plot.items.length, 0);
    this.host.post({ kind: 'drawn', sequence, sections: picture.sections.length, items });
  }

  private stale(message: HostMessage & { readonly kind: 'stale' }): void {
    this.sequence = message.sequence;
    // Another spec's picture must not stand under this one's reason.
    if (this.picture !== null && this.state.uri !== message.uri) this.clear();
    this.keepFor(message.uri, {});
    if (this.picture === null) {
      this.explain(message.reason);
      return;
    }
    setText(this.notice, `Not up to date. ${message.reason} Below is the last good picture.`);
    this.notice.hidden = false;
    document.body.classList.add('stale');
    this.heading.fresh('not up to date');
  }

  /** Says why there is no picture. */
  private explain(reason: string): void {
    document.body.classList.remove('stale');
    this.heading.fresh('');
    this.heading.empty();
    setText(this.notice, reason);
    this.notice.hidden = false;
  }

  private draw(picture: PanelPicture): void {
    this.heading.show(picture.channel, picture.heading, this.state.pinned ? 'pinned' : 'free');
    for (const [id, view] of this.sections) {
      if (picture.sections.some((section) => section.id === id)) continue;
      view.destroy();
      this.sections.delete(id);
    }
    // From the last one up, so that a new section can be put before the one that follows it and none that is there has to move.
    picture.sections.reduceRight<Element | null>((next, section) => this.drawSection(section, next), null);
  }

  private drawSection(section: Section, next: Element | null): Element {
    const view = this.sections.get(section.id) ?? this.addSection(section.id, next);
    view.show(section, this.foldOf(section.id), this.theme);
    view.light(this.place);
    return view.element;
  }

  private addSection(id: string, next: Element | null): SectionView {
    const view = new SectionView(id, {
      fold: (section) => {
        this.toggleFold(section);
      },
      stateOf: (plotId) => this.state.plots[this.keyOf(plotId)] ?? freshPlot,
      targetOf: (plotId) => this.targetOf(plotId),
    });
    this.sections.set(id, view);
    this.main.insertBefore(view.element, next);
    return view;
  }

  private targetOf(plotId: string): PlotTarget {
    return {
      remember: (plot) => {
        this.keep(withPlot(this.state, this.keyOf(plotId), plot));
      },
      reveal: (place) => {
        this.host.post({ kind: 'reveal', place });
      },
      announce: (words) => {
        setText(this.announcer, words);
      },
      save: (format, plot, data) => {
        this.host.post({ kind: 'save', format, name: this.fileName(plot, format), data });
      },
    };
  }

  private toggleFold(section: string): void {
    const { folded } = this.state;
    this.keep({ ...this.state, folded: folded.includes(section) ? folded.filter((id) => id !== section) : [...folded, section] });
    this.sections.get(section)?.fold(this.foldOf(section));
  }

  private togglePin(): void {
    if (this.picture === null) return;
    this.keep({ ...this.state, pinned: !this.state.pinned });
    this.heading.pin(this.state.pinned ? 'pinned' : 'free');
    this.host.post({ kind: 'pin', channel: this.state.pinned ? this.picture.channel : null });
  }

  private foldOf(section: string): 'folded' | 'open' {
    return this.state.folded.includes(section) ? 'folded' : 'open';
  }

  private keyOf(plotId: string): string {
    return plotKey(this.picture?.channel ?? '', plotId);
  }

  private fileName(plot: Plot, format: SaveKind): string {
    const words = `${this.picture?.channel ?? 'channel'} ${plot.title}`.toLowerCase();
    return `${words.replaceAll(/[^\p{L}\p{N}]+/gu, '-').replaceAll(/^-|-$/g, '')}.${format}`;
  }

  private listen(): void {
    window.addEventListener('scrollend', () => {
      this.keep({ ...this.state, scroll: Math.round(window.scrollY) });
    });
    window.addEventListener('keydown', (event) => {
      const elsewhere = event.target === document.body && !event.ctrlKey && !event.metaKey && !event.altKey;
      if (elsewhere && event.key.toLowerCase() === 't') for (const section of this.sections.values()) section.toggleTables();
    });
  }

  /** Zoom and tables belong to one spec; another begins afresh. */
  private keepFor(uri: string, change: Partial<PanelState>): void {
    const plots = this.state.uri === null || this.state.uri === uri ? this.state.plots : {};
    this.keep({ ...this.state, uri, plots, ...change });
  }

  private clear(): void {
    this.picture = null;
    for (const view of this.sections.values()) view.destroy();
    this.sections.clear();
  }

  private keep(state: PanelState): void {
    this.state = state;
    this.host.keepState(state);
  }
}
