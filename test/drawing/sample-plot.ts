/** A small plot with one of everything, for tests of drawing and of the page's logic. */
import type { Item, Plot } from '../../src/protocol/picture';

/** An item with what a test leaves out filled in. */
export function sampleItem(parts: Partial<Item> & Pick<Item, 'id'>): Item {
  return {
    series: parts.id,
    pane: 'input',
    role: 'source',
    name: parts.id,
    words: `About ${parts.id}.`,
    place: { channel: 'x', path: ['unwanted', 0] },
    joins: [],
    shapes: [],
    label: null,
    ...parts,
  };
}

/** Two panes: a block, a curve and a ribbon above, its landing and a mark below. */
export const samplePlot: Plot = {
  id: 'sampling',
  title: 'Before & after <sampling>',
  words: 'Two panes with "everything" in them.',
  shown: 'always',
  panes: [
    {
      id: 'input',
      x: { title: 'Hz at the input', lowHz: 0, highHz: 1e6, logLowHz: 10, scale: 'log' },
      y: { title: 'dBFS', unit: 'dBFS', low: -140, high: 0 },
    },
    {
      id: 'output',
      x: { title: 'Hz after sampling, to half the rate', lowHz: 0, highHz: 25_600, logLowHz: 2.56, scale: 'linear' },
      y: { title: 'dBFS', unit: 'dBFS', low: -140, high: 0 },
    },
  ],
  series: [
    { id: 'wanted', name: 'wanted', role: 'wanted', place: { channel: 'x', path: ['wanted', 0] } },
    { id: 'hash', name: 'hash <i>', role: 'source', place: { channel: 'x', path: ['unwanted', 0] } },
  ],
  items: [
    sampleItem({
      id: 'ribbon',
      series: 'hash',
      role: 'harm',
      joins: ['hash', 'landing'],
      shapes: [
        {
          kind: 'ribbon',
          lowHz: 41_200,
          highHz: 51_200,
          landsPane: 'output',
          landsLowHz: 0,
          landsHighHz: 10_000,
          inverted: true,
          strength: 1,
        },
      ],
    }),
    sampleItem({
      id: 'wanted',
      role: 'wanted',
      place: { channel: 'x', path: ['wanted', 0] },
      shapes: [{ kind: 'block', lowHz: 10, highHz: 10_000, top: -3, tone: 'pale' }],
      label: { text: 'wanted', frequencyHz: 300, level: -3, prefer: 'below', priority: 7 },
    }),
    sampleItem({
      id: 'hash',
      joins: ['landing', 'ribbon'],
      shapes: [
        { kind: 'curve', points: { x: [40_000, 100_000, 1e6], y: [-60, -80, -120] }, stroke: 'dashed', weight: 'bold' },
        { kind: 'stem', frequencyHz: 310_000, top: -24, tone: 'pale' },
      ],
      label: { text: 'hash & co', frequencyHz: 100_000, level: -80, prefer: 'above', priority: 8 },
    }),
    sampleItem({
      id: 'landing',
      series: 'hash',
      pane: 'output',
      role: 'landing',
      joins: ['hash', 'ribbon'],
      shapes: [
        { kind: 'area', upper: { x: [0, 25_600], y: [-100, -70], from: [51_200, 25_600] }, lower: null, tone: 'pale' },
        { kind: 'mark', frequencyHz: 10_000, level: -88, mark: 'over' },
      ],
    }),
    sampleItem({
      id: 'limit',
      pane: 'output',
      role: 'limit',
      place: { channel: 'x', path: ['limits', 'alias'] },
      shapes: [
        { kind: 'forbidden', boundary: { x: [0, 10_000], y: [-96, -96] }, side: 'above' },
        { kind: 'rule', frequencyHz: 10_000 },
      ],
      label: { text: 'limit', frequencyHz: 5000, level: -96, prefer: 'above', priority: 9 },
    }),
  ],
  table: {
    caption: 'Everything',
    columns: [
      { title: 'what', unit: null },
      { title: 'worst at', unit: 'Hz' },
      { title: 'level', unit: 'dBFS' },
    ],
    rows: [
      { item: 'wanted', cells: ['wanted', 10_000, -3] },
      { item: 'hash', cells: ['=hash, "loud"', null, -88.25] },
    ],
  },
};
