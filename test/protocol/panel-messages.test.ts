/** Tests of the guards at either side's door. */
import assert from 'node:assert/strict';
import { panelHtml } from '../../src/protocol/panel-html';
import { isHostMessage, isPageMessage } from '../../src/protocol/panel-messages';
import type { HostMessage, PageMessage } from '../../src/protocol/panel-messages';
import { isPicture } from '../../src/protocol/picture-guard';
import { samplePlot } from '../drawing/sample-plot';

const answer = { text: 'alias 4.8 dB over', standing: 'over' } as const;
const picture = {
  channel: 'x',
  heading: { summary: 'capture', verdict: answer, words: 'Alias over.' },
  sections: [{ id: 'sampling', title: 'Before and after sampling', answer, place: null, plots: [samplePlot] }],
} as const;

describe('panel messages', () => {
  it('lets every message of the extension in', () => {
    const messages: HostMessage[] = [
      { kind: 'show', sequence: 0, uri: 'file:///a', pinned: false, picture },
      { kind: 'stale', sequence: 1, uri: 'file:///a', reason: 'broken' },
      { kind: 'lit', place: { channel: 'x', path: ['unwanted', 0] } },
      { kind: 'lit', place: null },
    ];
    assert.deepEqual(messages.map(isHostMessage), [true, true, true, true]);
  });

  it('lets every message of the page in', () => {
    const messages: PageMessage[] = [
      { kind: 'ready' },
      { kind: 'drawn', sequence: 3, sections: 2, items: 30 },
      { kind: 'reveal', place: { channel: null, path: ['filters', 'guard', 0] } },
      { kind: 'save', format: 'svg', name: 'x.svg', data: '<svg/>' },
      { kind: 'pin', channel: 'x' },
      { kind: 'pin', channel: null },
      { kind: 'request-refresh' },
      { kind: 'failed', message: 'no canvas' },
    ];
    assert.deepEqual(
      messages.filter((message) => !isPageMessage(message)),
      [],
    );
  });

  it('keeps out what is none, or half of one', () => {
    const odd: unknown[] = [
      null,
      7,
      [],
      {},
      { kind: 'show' },
      { kind: 'evaluate', code: '1' },
      { kind: 'drawn', sequence: -1, sections: 1, items: 1 },
    ];
    const halves: unknown[] = [
      { kind: 'save', format: 'exe', name: 'a', data: '' },
      { kind: 'reveal', place: { channel: 3, path: [] } },
      { kind: 'reveal', place: { channel: 'x', path: [null] } },
    ];
    for (const value of [...odd, ...halves]) assert.deepEqual([isHostMessage(value), isPageMessage(value)], [false, false]);
  });

  it('refuses a picture that could not be drawn', () => {
    const broken = (change: (plot: Record<string, unknown>) => void): unknown => {
      const copy = structuredClone(picture) as unknown as { sections: { plots: Record<string, unknown>[] }[] };
      change(copy.sections[0]!.plots[0]!);
      return copy;
    };
    assert.equal(isPicture(broken(() => undefined)), true);
    assert.equal(isPicture(broken((plot) => (plot['panes'] = []))), false);
    assert.equal(isPicture(broken((plot) => ((plot['items'] as { pane: string }[])[0]!.pane = 'gone'))), false);
    assert.equal(isPicture(broken((plot) => ((plot['items'] as { role: string }[])[0]!.role = 'villain'))), false);
    assert.equal(
      isPicture(broken((plot) => ((plot['items'] as { shapes: unknown[] }[])[0]!.shapes = [{ kind: 'script' }]))),
      false,
    );
    assert.equal(isPicture(broken((plot) => ((plot['panes'] as { x: { highHz: number } }[])[0]!.x.highHz = NaN))), false);
    assert.equal(
      isPicture(
        JSON.parse(
          JSON.stringify(broken((plot) => ((plot['items'] as { label: { level: number } }[])[1]!.label.level = Infinity))),
        ),
      ),
      false,
    );
  });
});

describe('the page as HTML', () => {
  const html = panelHtml({
    cspSource: 'https://panel.invalid',
    nonce: 'abc',
    scriptUri: 'https://panel.invalid/panel.js',
    styleUri: 'https://panel.invalid/panel.css?"><script>',
  });

  it('allows nothing but its own script and style', () => {
    assert.match(html, /default-src 'none'; script-src 'nonce-abc'; style-src https:\/\/panel\.invalid;/);
    assert.doesNotMatch(html, /unsafe/);
  });

  it('escapes what it is given', () => {
    assert.equal(html.match(/<script/g)?.length, 1);
  });

  it('carries no text of its own that a spec could have written', () => {
    assert.match(html, /<main id="sections"><\/main>/);
  });
});
