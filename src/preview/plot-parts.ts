/** The elements of which a plot on the page consists; made once and then only filled. */
import type { SaveKind } from '../protocol/panel-messages';
import { button, element } from './dom';
import { keyWords } from './keys';

/** The elements of a plot. */
export interface PlotParts {
  readonly root: HTMLElement;
  /** Opens a plot that is drawn on demand. */
  readonly opener: HTMLButtonElement;
  readonly openerTitle: HTMLElement;
  /** All but the opener. */
  readonly content: HTMLElement;
  /** Takes the focus, the pointer and the keys. */
  readonly stage: HTMLElement;
  readonly canvas: HTMLCanvasElement;
  /** What is read out, beside the pointer. */
  readonly tip: HTMLElement;
  readonly words: HTMLElement;
  readonly legend: HTMLElement;
  /** One button a pane, for its scale. */
  readonly scales: HTMLElement;
  readonly whole: HTMLButtonElement;
  readonly tableButton: HTMLButtonElement;
  readonly table: HTMLElement;
}

/** What the tools ask for. */
export interface ToolTarget {
  open: () => void;
  table: () => void;
  whole: () => void;
  save: (format: SaveKind) => void;
}

/** Makes the elements; `id` is unique on the page. */
export function plotParts(id: string, target: ToolTarget): PlotParts {
  const canvas = element('canvas', { attributes: { 'aria-hidden': 'true' } });
  const tip = element('p', { class: 'tip', attributes: { hidden: '', 'aria-hidden': 'true' } });
  const words = element('p', { class: 'unseen', attributes: { id: `${id}-words` } });
  const stage = element('div', {
    class: 'stage',
    attributes: {
      tabindex: '0',
      role: 'application',
      'aria-roledescription': 'plot',
      'aria-describedby': `${id}-words ${id}-keys`,
    },
  });
  stage.append(canvas, tip);
  const keys = element('p', { class: 'unseen', text: keyWords, attributes: { id: `${id}-keys` } });
  const legend = element('ul', { class: 'legend' });
  const scales = element('span', { class: 'scales' });
  const whole = button('Show all', 'Show the whole plot again (0, or a double click)', target.whole);
  const tableButton = button('Table', 'Show the same data as a table (T)', target.table);
  const saves = (['png', 'svg', 'csv'] as const).map((format) => saveButton(format, target));
  const tools = element(
    'div',
    { class: 'tools', attributes: { role: 'toolbar', 'aria-label': 'Plot' } },
    scales,
    whole,
    tableButton,
    ...saves,
  );
  const table = element('div', { class: 'table', attributes: { hidden: '', tabindex: '0', role: 'region' } });
  const openerTitle = element('span', { class: 'answer' });
  const opener = openerOf(openerTitle, target);
  const content = element('div', {}, words, keys, tools, stage, legend, table);
  const root = element('div', { class: 'plot' }, opener, content);
  return { root, opener, openerTitle, content, stage, canvas, tip, words, legend, scales, whole, tableButton, table };
}

function openerOf(title: HTMLElement, target: ToolTarget): HTMLButtonElement {
  const chevron = element('span', { class: 'chevron', attributes: { 'aria-hidden': 'true' } });
  const opener = element('button', { class: 'fold', attributes: { type: 'button' } }, chevron, title);
  opener.addEventListener('click', target.open);
  return opener;
}

function saveButton(format: SaveKind, target: ToolTarget): HTMLButtonElement {
  const what = { png: 'the picture as PNG', svg: 'the picture as SVG', csv: 'the data as CSV' }[format];
  const made = button(format.toUpperCase(), `Save ${what}`, () => {
    target.save(format);
  });
  made.dataset['save'] = format;
  return made;
}
