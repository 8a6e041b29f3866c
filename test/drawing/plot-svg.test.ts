/** Tests of a plot as SVG text. */
import assert from 'node:assert/strict';
import { plotSvg } from '../../src/drawing/plot-svg';
import { escaped } from '../../src/drawing/svg-elements';
import { paperTheme } from '../../src/drawing/theme';
import { samplePlot } from './sample-plot';

const options = { width: 760, theme: paperTheme, viewOf: () => null };

/** The names of all elements, after checking that each is closed in turn and that text holds no stray markup. */
function elementsOf(svg: string): string[] {
  const open: string[] = [];
  const seen: string[] = [];
  for (const [, close, name, , alone] of svg.matchAll(/<(\/?)([a-zA-Z]+)((?:\s+[\w:-]+="[^"<]*")*)\s*(\/?)>/g)) {
    if (name === undefined) continue;
    if (close === '/') assert.equal(open.pop(), name);
    else {
      seen.push(name);
      if (alone !== '/') open.push(name);
    }
  }
  assert.deepEqual(open, []);
  const text = svg.replaceAll(/<\/?[a-zA-Z]+(?:\s+[\w:-]+="[^"<]*")*\s*\/?>/g, '');
  assert.doesNotMatch(text, /[<>]|&(?!amp;|lt;|gt;|quot;)/);
  return seen;
}

describe('a plot as SVG', () => {
  it('is well-formed, whatever stands in its texts', () => {
    const elements = elementsOf(plotSvg(samplePlot, options));
    assert.equal(elements[0], 'svg');
    assert.ok(['title', 'desc', 'path', 'text', 'pattern', 'clipPath'].every((name) => elements.includes(name)));
  });

  it('escapes text and says what it shows', () => {
    const svg = plotSvg(samplePlot, options);
    assert.match(svg, /<title>Before &amp; after &lt;sampling&gt;<\/title>/);
    assert.match(svg, /<desc>Two panes with &quot;everything&quot; in them\.<\/desc>/);
    assert.match(svg, />hash &amp; co<\/text>/);
  });

  it('turns control characters, which XML forbids, into spaces', () => {
    assert.equal(escaped('a\u0000b\u001fc\td'), 'a b c\td');
  });

  it('holds no number that is not finite', () => {
    assert.doesNotMatch(plotSvg(samplePlot, options), /NaN|Infinity/);
  });

  it('names only hatches and clips that it defines', () => {
    const svg = plotSvg(samplePlot, options);
    const named = [...svg.matchAll(/url\(#([^)]+)\)/g)].map(([, id]) => id);
    const defined = new Set([...svg.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id));
    assert.ok(named.length > 3);
    assert.deepEqual(
      named.filter((id) => !defined.has(id ?? '')),
      [],
    );
  });

  it('draws what is in view', () => {
    const zoom = { x: { low: 100_000, high: 900_000 }, y: null, scale: null };
    const zoomed = plotSvg(samplePlot, { ...options, viewOf: (pane) => (pane === 'input' ? zoom : null) });
    assert.match(zoomed, />500\u00a0k<\/text>/);
    assert.doesNotMatch(zoomed, />1\u00a0k<\/text>/);
  });

  it('takes its colours from the theme', () => {
    const svg = plotSvg(samplePlot, { ...options, theme: { ...paperTheme, harm: 'rgb(1, 2, 3)' } });
    assert.match(svg, /fill="rgb\(1, 2, 3\)"/);
    assert.ok(!svg.includes(paperTheme.harm));
  });
});
