/** Tests of Touchstone files: options, formats, both versions, and gains with and without loads. */
import assert from 'node:assert/strict';
import { loadedResponse } from '../../../src/spec/tables/loaded-response';
import { readTouchstone } from '../../../src/spec/tables/touchstone';

function networkOf(text: string) {
  const reading = readTouchstone(text);
  assert.ok('table' in reading, 'fault' in reading ? reading.fault : '');
  assert.ok(reading.table.kind === 'network');
  return reading.table.network;
}

/** Two points of a two-port with S11 = 0.1, S21 = j0.5, S12 = 0.2, S22 = 0.3. */
const rows = (format: 'MA' | 'DB' | 'RI') => {
  const size = (gain: number) => (format === 'DB' ? String(20 * Math.log10(gain)) : String(gain));
  const parameters = [`${size(0.1)} 0`, format === 'RI' ? '0 0.5' : `${size(0.5)} 90`, `${size(0.2)} 0`, `${size(0.3)} 0`].join(
    '  ',
  );
  return `1 ${parameters}\n2 ${parameters} ! the same again\n`;
};

const near = (actual: number | undefined, expected: number) => {
  assert.ok(actual !== undefined && Math.abs(actual - expected) < 1e-12, `${actual} is not ${expected}`);
};

describe('a Touchstone file', () => {
  for (const format of ['MA', 'DB', 'RI'] as const) {
    it(`reads ${format}`, () => {
      const { s11, s21, s12, s22, frequenciesHz } = networkOf(`! probe\n# MHz S ${format} R 75\n${rows(format)}`);
      assert.deepEqual(frequenciesHz, [1e6, 2e6]);
      near(s11[0]?.re, 0.1);
      near(s21[1]?.re, 0);
      near(s21[1]?.im, 0.5);
      near(s12[0]?.re, 0.2);
      near(s22[0]?.re, 0.3);
    });
  }

  it('takes GHz, S, MA and 50 Ω where nothing is said, and options in any order and case', () => {
    const usual = networkOf(rows('MA'));
    assert.deepEqual([usual.frequenciesHz[0], usual.referenceOhm], [1e9, 50]);
    const other = networkOf(`# r 75 ri s khz\n# GHz S MA R 50\n${rows('RI')}`);
    assert.deepEqual([other.frequenciesHz[0], other.referenceOhm], [1e3, 75]);
  });

  it('leaves the noise data of version 1 alone', () => {
    const { frequenciesHz } = networkOf(`# MHz S MA R 50\n${rows('MA')}1 2.5 0.3 40 0.2\n2 2.6 0.3 40 0.2\n`);
    assert.deepEqual(frequenciesHz, [1e6, 2e6]);
  });

  const second = (order: string, more = '') =>
    `[Version] 2.0\n# MHz S MA R 50\n[Number of Ports] 2\n[Two-Port Data Order] ${order}\n[Number of Frequencies] 2\n[Reference] 75 75\n${more}[Network Data]\n${rows('MA')}[End]\n`;

  it('reads version 2 in both orders', () => {
    const first = networkOf(second('21_12'));
    near(first.s21[0]?.im, 0.5);
    assert.equal(first.referenceOhm, 75);
    // 12_21: the second pair is S12.
    const swapped = networkOf(second('12_21'));
    near(swapped.s12[0]?.im, 0.5);
    near(swapped.s21[0]?.re, 0.2);
  });

  it('reads half a matrix as that of a reciprocal two-port', () => {
    const text = second('21_12', '[Matrix Format] Lower\n').replace(rows('MA'), '1 0.1 0 0.5 90 0.3 0\n2 0.1 0 0.5 90 0.3 0\n');
    const { s21, s12, s22 } = networkOf(text);
    assert.deepEqual(s21, s12);
    near(s22[0]?.re, 0.3);
  });

  const faults: readonly [string, string, RegExp, number | null][] = [
    ['other parameters', `# MHz Z MA R 50\n${rows('MA')}`, /Z parameters/, 1],
    ['an odd option', `# MHz S XY R 50\n${rows('MA')}`, /`XY` is no option/, 1],
    ['no resistance', `# MHz S MA R\n${rows('MA')}`, /reference resistance/, 1],
    ['a word among the numbers', `# MHz S MA R 50\n1 a 0 0 0 0 0 0 0\n`, /`a` is not a number/, 2],
    ['too few numbers', `# MHz S MA R 50\n${rows('MA')}3 0 0\n`, /3 numbers of 9/, 4],
    ['too many numbers', `# MHz S MA R 50\n1 0 0 0 0 0 0 0 0 0\n`, /10 numbers/, 2],
    ['frequencies that fall', `# MHz S MA R 50\n${rows('MA')}${rows('MA')}`, /must rise/, 4],
    ['one point', '# MHz S MA R 50\n1 0 0 1 0 0 0 0 0\n', /at least two/, null],
    ['three ports', second('21_12').replace('Ports] 2', 'Ports] 3'), /two ports/, 3],
    ['no order in version 2', second('21_12').replace('[Two-Port Data Order] 21_12\n', ''), /Two-Port Data Order/, null],
    ['another count of points', second('21_12').replace('Frequencies] 2', 'Frequencies] 3'), /says 3, and 2 points/, null],
    ['two references', second('21_12').replace('75 75', '75 50'), /different reference/, 6],
  ];
  for (const [title, text, message, line] of faults) {
    it(`finds ${title}`, () => {
      const reading = readTouchstone(text);
      assert.ok('fault' in reading, 'it was read');
      assert.match(reading.fault, message);
      assert.equal(reading.line, line);
    });
  }
});

describe('the gain of a two-port', () => {
  it('is S21 alone, with its phase', () => {
    const response = loadedResponse(networkOf(`# MHz S RI R 50\n${rows('RI')}`), null);
    assert.ok('table' in response);
    near(response.table.gainsDb[0], 20 * Math.log10(0.5));
    near(response.table.phasesRad?.[0], Math.PI / 2);
  });

  it('is 6.02 dB less than S21 between matched loads', () => {
    const response = loadedResponse(networkOf(`# MHz S RI R 50\n${rows('RI')}`), { sourceOhm: 50, loadOhm: 50 });
    assert.ok('table' in response);
    near(response.table.gainsDb[0], 20 * Math.log10(0.25));
  });

  it('is that of a divider for a series resistor between any loads', () => {
    // A series R between reference Z0: S11 = S22 = R/(R + 2·Z0), S21 = S12 = 2·Z0/(R + 2·Z0); R = 100 Ω, Z0 = 50 Ω give 0.5 each.
    const series = '# MHz S RI R 50\n1 0.5 0 0.5 0 0.5 0 0.5 0\n2 0.5 0 0.5 0 0.5 0 0.5 0\n';
    for (const [sourceOhm, loadOhm] of [
      [0, 300],
      [600, 50],
      [10, 1e6],
    ] as const) {
      const response = loadedResponse(networkOf(series), { sourceOhm, loadOhm });
      assert.ok('table' in response);
      near(response.table.gainsDb[1], 20 * Math.log10(loadOhm / (sourceOhm + 100 + loadOhm)));
    }
  });

  it('cannot be nothing', () => {
    const response = loadedResponse(networkOf('# MHz S RI R 50\n1 0 0 0 0 0 0 0 0\n2 0 0 1 0 0 0 0 0\n'), null);
    assert.match('fault' in response ? response.fault : '', /1 MHz is nothing/);
  });
});
