/** A foldable section: its one-line answer is always in sight, its plots are drawn only while it is open. */
import type { Theme } from '../drawing/theme';
import type { Section } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import { element, setText } from './dom';
import { PlotView } from './plot-view';
import type { PlotTarget } from './plot-view';
import type { PlotState } from './view-state';

/** What a section asks of the page. */
export interface SectionTarget {
  fold: (section: string) => void;
  /** What is remembered of a plot. */
  stateOf: (plotId: string) => PlotState;
  targetOf: (plotId: string) => PlotTarget;
}

/** One section. */
export class SectionView {
  readonly element: HTMLElement;
  private readonly toggle: HTMLButtonElement;
  private readonly title = element('span', { class: 'title' });
  private readonly answer = element('span', { class: 'answer' });
  private readonly body = element('div', { class: 'body' });
  private readonly plots = new Map<string, PlotView>();

  constructor(
    readonly id: string,
    private readonly target: SectionTarget,
  ) {
    const chevron = element('span', { class: 'chevron', attributes: { 'aria-hidden': 'true' } });
    this.toggle = element(
      'button',
      { class: 'fold', attributes: { type: 'button', 'aria-controls': `body-${id}` } },
      chevron,
      this.title,
    );
    this.toggle.append(this.answer);
    this.toggle.addEventListener('click', () => {
      target.fold(id);
    });
    this.body.id = `body-${id}`;
    this.element = element('section', { attributes: { 'data-section': id } }, element('h2', {}, this.toggle), this.body);
  }

  /** Shows a newer picture of this section; plots that stay keep their charts. */
  show(section: Section, folded: 'folded' | 'open', theme: Theme): void {
    setText(this.title, section.title);
    setText(this.answer, section.answer.text);
    this.answer.dataset['standing'] = section.answer.standing;
    this.body.hidden = folded === 'folded';
    for (const plot of section.plots) this.plotFor(plot.id, section, theme).show(plot, this.target.stateOf(plot.id), theme);
    for (const [id, view] of this.plots) if (!section.plots.some((plot) => plot.id === id)) this.drop(id, view);
    this.fold(folded);
  }

  /** Opens or folds. */
  fold(folded: 'folded' | 'open'): void {
    this.toggle.setAttribute('aria-expanded', String(folded === 'open'));
    this.body.hidden = folded === 'folded';
    if (folded === 'open') for (const view of this.plots.values()) if (view.drawn === null) view.draw();
  }

  /** Lights the items of the editor's line. */
  light(place: PlaceName | null): void {
    for (const view of this.plots.values()) view.light(place);
  }

  /** Shows or hides every table. */
  toggleTables(): void {
    for (const view of this.plots.values()) view.toggleTable();
  }

  /** The plots, for the page's own tests. */
  get views(): ReadonlyMap<string, PlotView> {
    return this.plots;
  }

  /** Frees every chart. */
  destroy(): void {
    for (const [id, view] of this.plots) this.drop(id, view);
    this.element.remove();
  }

  private plotFor(id: string, section: Section, theme: Theme): PlotView {
    const present = this.plots.get(id);
    const plot = section.plots.find((candidate) => candidate.id === id);
    if (present !== undefined || plot === undefined) return present ?? this.missing(id);
    const made = new PlotView(plot, this.target.stateOf(id), theme, this.target.targetOf(id));
    this.plots.set(id, made);
    this.body.append(made.element);
    return made;
  }

  private missing(id: string): never {
    throw new Error(`no plot \`${id}\` in section \`${this.id}\``);
  }

  private drop(id: string, view: PlotView): void {
    view.destroy();
    this.plots.delete(id);
  }
}
