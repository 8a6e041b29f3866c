/** A plot as SVG text: the same primitives the page paints, with the plot's words as its title and description. */
import type { Plot } from '../protocol/picture';
import { axesOf, gridOf } from './axes';
import { frameOf } from './frame';
import type { PaneView } from './frame';
import { labelWritings, placedLabels } from './labels';
import type { Look } from './look';
import type { Primitive } from './primitive';
import { curvesOf, fillsOf, marksOf } from './scene';
import { definitions, element, escaped, idOf } from './svg-elements';
import { approximateWidth } from './text-width';
import type { Theme } from './theme';

/** What a drawing shows and how large. */
export interface DrawingOptions {
  readonly width: number;
  readonly theme: Theme;
  /** What of each pane is in view; null: all of it. */
  readonly viewOf: (pane: string) => PaneView | null;
}

/** The whole of a plot as a standalone SVG document. */
export function plotSvg(plot: Plot, options: DrawingOptions): string {
  const { width, theme } = options;
  const frame = frameOf(plot, width, options.viewOf);
  const look: Look = { theme, emphasisOf: () => 'plain' };
  const widthOf = approximateWidth(theme.fontPx);
  const primitives: Primitive[] = [
    ...gridOf(frame, theme),
    ...fillsOf(plot, frame, look),
    ...curvesOf(plot, frame, look),
    ...axesOf(plot, frame, theme, widthOf),
    ...marksOf(plot, frame, look),
    ...labelWritings(placedLabels(plot, frame, theme, widthOf), plot, theme),
  ];
  const prefix = idOf(plot.id);
  const body = primitives.map((primitive) => element(primitive, prefix, theme.fontPx));
  const size = `viewBox="0 0 ${width} ${frame.height}" width="${width}" height="${frame.height}"`;
  const type = `font-family="${escaped(theme.fontFamily)}" font-size="${theme.fontPx}"`;
  return `<svg xmlns="http://www.w3.org/2000/svg" ${size} role="img" ${type}>
<title>${escaped(plot.title)}</title>
<desc>${escaped(plot.words)}</desc>
<defs>${definitions(primitives, prefix)}</defs>
<rect width="100%" height="100%" fill="${escaped(theme.background)}"/>
${body.join('\n')}
</svg>
`;
}
