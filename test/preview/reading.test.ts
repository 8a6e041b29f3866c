/** Tests of what an item says at a frequency, and of the keyboard's cursor along it. */
import assert from 'node:assert/strict';
import { frameOf } from '../../src/drawing/frame';
import { atEnd, onNextItem, rereadIn, stepped } from '../../src/preview/cursor';
import { extentOf, readAt, readingWords } from '../../src/preview/reading';
import { samplePlot } from '../drawing/sample-plot';

const frame = frameOf(samplePlot, 700, () => null);
const item = (id: string): (typeof samplePlot.items)[0] => samplePlot.items.find((one) => one.id === id)!;
const pane = (id: string): (typeof samplePlot.panes)[0] => samplePlot.panes.find((one) => one.id === item(id).pane)!;

describe('reading', () => {
  it('reads a curve between its points and not beyond its ends', () => {
    assert.equal(readAt(item('hash'), 70_000, pane('hash'))?.level, -70);
    assert.equal(readAt(item('hash'), 5, pane('hash'))?.frequencyHz, 40_000);
  });

  it('says value, frequency and where it comes from', () => {
    const reading = readAt(item('landing'), 25_600, pane('landing'))!;
    assert.equal(readingWords(reading, pane('landing')), 'landing: −70 dBFS at 25.6 kHz, from 25.6 kHz');
  });

  it('says the sentence of whatever is no curve', () => {
    assert.equal(readingWords(readAt(item('ribbon'), 1, pane('ribbon'))!, pane('ribbon')), 'About ribbon.');
    assert.equal(readingWords(readAt(item('limit'), 1, pane('limit'))!, pane('limit')), 'About limit.');
  });

  it('knows what each item covers', () => {
    assert.deepEqual(extentOf(item('ribbon')), { low: 41_200, high: 51_200 });
    assert.deepEqual(extentOf(item('wanted')), { low: 10, high: 10_000 });
    assert.equal(extentOf({ ...item('wanted'), shapes: [] }), null);
  });
});

describe('the keyboard cursor', () => {
  it('starts on the first item, goes through all of them and round again', () => {
    const ids: (string | undefined)[] = [];
    let reading = stepped(samplePlot, frame, null, 4);
    for (let count = 0; count <= samplePlot.items.length; count += 1) {
      ids.push(reading?.item.id);
      reading = onNextItem(samplePlot, frame, reading, 1);
    }
    assert.deepEqual(ids, [...samplePlot.items.map(({ id }) => id), 'ribbon']);
  });

  it('moves along a curve and stops at its end', () => {
    const start = readAt(item('hash'), 100_000, pane('hash'));
    const right = stepped(samplePlot, frame, start, 10);
    assert.ok(right !== null && right.frequencyHz > 100_000);
    assert.equal(stepped(samplePlot, frame, start, 10_000)?.frequencyHz, 1e6);
    assert.equal(atEnd(samplePlot, frame, start, 'first')?.frequencyHz, 40_000);
  });

  it('stays where it is when the picture is drawn again, and lets go of an item that is gone', () => {
    const reading = readAt(item('hash'), 100_000, pane('hash'));
    assert.equal(rereadIn(samplePlot, frame, reading)?.frequencyHz, 100_000);
    assert.equal(rereadIn({ ...samplePlot, items: [] }, frame, reading), null);
  });
});
