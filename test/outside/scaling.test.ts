/** Every figure of a whole channel scales with its frequencies: all of them times a factor and all times over it give the same levels. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import { read } from '../../src/spec';
import { exampleText } from '../support/examples';

/** A text with every frequency times a factor, and every time and capacitor over it. */
function scaled(text: string, factor: number): string {
  const quantity = /name: [^,}\n]+|(?<![\w.])(\d+(?:\.\d+)?)( *[pnuµmkMG]?)(Hz|s|F)\b/g;
  return text.replaceAll(/#.*$/gm, '').replaceAll(quantity, (whole, digits?: string, prefix?: string, unit?: string) => {
    if (digits === undefined || prefix === undefined) return whole;
    const value = unit === 'Hz' ? Number(digits) * factor : Number(digits) / factor;
    return `${value}${prefix}${unit ?? ''}`;
  });
}

/** What a figure is in: frequencies and times scale, everything else stays. */
const frequencies =
  /(^|\/)(rate|outputRate|halfRate|reference|low|high|lowHz|highHz|edgeHz|appearsLow|appearsHigh|frequency|lands|from)$/;
const times = /(^|\/)(delay|delaySpread)$/;
const inSeconds = /\/(at|value|nominal|margin|gap)$/;
/**
 * How much work it was is no figure; how tight a bound turned out is between 0 and what is promised; which end of a tolerance is worst may
 * be a tie to a thousandth of a dB.
 */
const notCompared = /(^|\/)(evaluations|gap)$|\/worstAt(\/|$)/;
/** Where an extreme is: of a filter whose stop band peaks at many frequencies alike, any of them. */
const places = /(^|\/)(where|masks|alias|aliases|image|images)\/.*(frequency|lands|from|fold|inverted)$|^alias\/|^image\//;
const stopbandsRipple = /elliptic/;

interface Leaf {
  readonly path: string;
  readonly value: unknown;
  readonly scale: 'frequency' | 'time' | 'none';
}

function leavesOf(value: unknown, path = '', seconds = false): readonly Leaf[] {
  if (typeof value !== 'object' || value === null) {
    const isTime = times.test(path) || (seconds && inSeconds.test(path));
    return [{ path, value, scale: isTime ? 'time' : frequencies.test(path) ? 'frequency' : 'none' }];
  }
  const unit = 'unit' in value ? value.unit === 's' : seconds;
  return Object.entries(value).flatMap(([key, inner]) => leavesOf(inner, path === '' ? key : `${path}/${key}`, unit));
}

function figuresOf(text: string): readonly Leaf[] {
  const reading = read(text);
  assert.deepEqual(reading.problems, []);
  const leaves = reading.entries.flatMap(({ channel }) => {
    assert.ok(channel !== null);
    return leavesOf(analyse(channel));
  });
  const ties = stopbandsRipple.test(text) ? places : /^$/;
  return leaves.filter(({ path }) => !notCompared.test(path) && !ties.test(path));
}

/** dB; two searches end anywhere within what is proved of each. */
const levelDb = 0.002;

function assertScales(before: readonly Leaf[], after: readonly Leaf[], factor: number): void {
  assert.deepEqual(
    after.map(({ path }) => path),
    before.map(({ path }) => path),
  );
  before.forEach(({ path, value, scale }, index) => {
    const found = after[index]?.value;
    if (typeof value !== 'number' || typeof found !== 'number' || !Number.isFinite(value)) {
      assert.deepEqual(found, value, path);
      return;
    }
    const expected = scale === 'none' ? value : scale === 'frequency' ? value * factor : value / factor;
    const allowed = scale === 'none' ? levelDb : 1e-6 * Math.abs(expected);
    assert.ok(Math.abs(found - expected) <= allowed, `${path}: ${found} is not ${expected}`);
  });
}

const examples = [
  'gate-bearing',
  'gate-bearing-broken',
  'fish-sounder',
  'echo-receiver',
  'strain-link',
  'standards/bt601-video',
  'standards/g712-speech',
  'standards/aes17-measurement',
];

describe('scaling', () => {
  for (const name of examples) {
    it(`leaves every level of ${name} alone, and moves every frequency and time by the factor`, () => {
      const text = exampleText(name);
      const before = figuresOf(text);
      assert.ok(before.length > 50 && before.some(({ scale }) => scale === 'time'));
      for (const factor of [8, 2.5]) assertScales(before, figuresOf(scaled(text, factor)), factor);
    });
  }
});
