/** What each key does in a plot; shown to the reader as it stands here. */

/** What the reader asks of a plot by a key. */
export type PlotAction =
  | { readonly kind: 'zoom'; readonly factor: number }
  | { readonly kind: 'pan'; readonly share: number }
  | { readonly kind: 'whole' }
  | { readonly kind: 'step'; readonly by: number }
  | { readonly kind: 'end'; readonly which: 'first' | 'last' }
  | { readonly kind: 'item'; readonly by: 1 | -1 }
  | { readonly kind: 'follow' }
  | { readonly kind: 'leave' }
  | { readonly kind: 'table' }
  | { readonly kind: 'scale' };

/** A pressed key. */
export interface Press {
  readonly key: string;
  readonly shiftKey: boolean;
  readonly ctrlKey: boolean;
  readonly altKey: boolean;
  readonly metaKey: boolean;
}

/** The keys in words, for the plot's description. */
export const keyWords =
  'Left and right move along a curve, up and down choose what is read, Enter goes to its line, plus and minus zoom, ' +
  'Shift with left and right moves what is in view, 0 shows all, L changes the frequency scale, T shows the table.';

/** The action of a key; null where it is not ours, so that the workbench keeps its own shortcuts. */
export function actionOf(press: Press): PlotAction | null {
  if (press.ctrlKey || press.altKey || press.metaKey) return null;
  if (press.shiftKey && (press.key === 'ArrowLeft' || press.key === 'ArrowRight')) {
    return { kind: 'pan', share: press.key === 'ArrowLeft' ? -0.2 : 0.2 };
  }
  return actions.get(press.key.length === 1 ? press.key.toLowerCase() : press.key) ?? null;
}

// A map, since a key may be called anything.
const actions: ReadonlyMap<string, PlotAction> = new Map<string, PlotAction>([
  ['+', { kind: 'zoom', factor: 1.5 }],
  ['=', { kind: 'zoom', factor: 1.5 }],
  ['-', { kind: 'zoom', factor: 1 / 1.5 }],
  ['−', { kind: 'zoom', factor: 1 / 1.5 }],
  ['0', { kind: 'whole' }],
  ['ArrowLeft', { kind: 'step', by: -4 }],
  ['ArrowRight', { kind: 'step', by: 4 }],
  ['PageUp', { kind: 'step', by: -40 }],
  ['PageDown', { kind: 'step', by: 40 }],
  ['Home', { kind: 'end', which: 'first' }],
  ['End', { kind: 'end', which: 'last' }],
  ['ArrowUp', { kind: 'item', by: -1 }],
  ['ArrowDown', { kind: 'item', by: 1 }],
  ['Enter', { kind: 'follow' }],
  ['Escape', { kind: 'leave' }],
  ['t', { kind: 'table' }],
  ['l', { kind: 'scale' }],
]);
