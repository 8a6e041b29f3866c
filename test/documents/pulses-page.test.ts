/** The numbers in the page about sampling with pulses, each computed anew from the page's own spec. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Figures } from '../../src/analysis';
import { createJudgeStore, judge } from '../../src/findings';
import { read } from '../../src/spec';

const page = readFileSync(join(__dirname, '..', '..', 'docs', 'pulses.md'), 'utf8').replaceAll('\r\n', '\n');
const spec = /```yaml\n([^`]*)```/u.exec(page)?.[1] ?? '';

const figuresOf = (text: string): Figures => {
  const reading = read(text);
  assert.deepEqual(reading.problems, []);
  const figures = judge(reading, createJudgeStore()).channels[0]?.figures;
  assert.ok(figures);
  return figures;
};

const withGate = (gate: string): string => spec.replace('gate: 12 %', `gate: ${gate}`);

/** The rows of the table with this head, as cells. */
const rowsUnder = (head: string): string[][] => {
  const at = page.indexOf(`| ${head} |\n`);
  assert.ok(at >= 0, head);
  const lines = page.slice(at).split('\n').slice(2);
  const end = lines.findIndex((line) => !line.startsWith('|'));
  return lines.slice(0, end).map((line) =>
    line
      .split('|')
      .slice(1, -1)
      .map((cell) => cell.trim()),
  );
};

const printed = (value: number, decimals: number): string => value.toFixed(decimals).replace('-', '−');
const db = (ratio: number): number => 20 * Math.log10(ratio);

describe('the page about sampling with pulses', () => {
  it('gives the weights of the copies as the tool computes them', () => {
    const rows = rowsUnder('gate | own loss, dB | copy 1, dB | copy 2, dB | copy 3, dB');
    assert.equal(rows.length, 6);
    for (const [gate = '', own, ...copies] of rows) {
      const figures = figuresOf(withGate(gate));
      assert.equal(own, printed(-db(parseFloat(gate) / 100), 1), gate);
      const found = figures.copyWeights?.slice(1, 4).map((weight) => (weight < 1e-9 ? 'none' : printed(db(weight), 1)));
      assert.deepEqual(copies, found, gate);
    }
  });

  it('gives the strongest copy behind the filter as the tool computes it', () => {
    const rows = rowsUnder('gate | strongest copy, dBc');
    assert.equal(rows.length, 6);
    for (const [gate = '', strongest] of rows)
      assert.equal(strongest, printed(figuresOf(withGate(gate)).image?.relative ?? 0, 1), gate);
  });

  it('gives the corner that just meets the limit, and its flatness', () => {
    const rows = rowsUnder('gate | highest corner, Hz | flatness, dB');
    assert.equal(rows.length, 5);
    for (const [gate = '', corner = '', flatness] of rows) {
      const at = (cornerHz: number): Figures =>
        figuresOf(withGate(gate).replace('r: 10 kΩ', `r: ${1 / (2 * Math.PI * cornerHz * 10e-9)} Ω`));
      if (corner === 'none') {
        // One pole that lies far below everything parts 100 Hz from 7.9 kHz as well as any.
        assert.ok((at(0.5).image?.relative ?? 0) > -40, gate);
        continue;
      }
      const cornerHz = parseFloat(corner);
      assert.ok((at(cornerHz - 0.1).image?.relative ?? 0) < -40 && (at(cornerHz + 0.1).image?.relative ?? 0) > -40, gate);
      assert.equal(flatness, printed(at(cornerHz).limits.find(({ limit }) => limit === 'flatness')?.value ?? 0, 2), gate);
    }
  });

  it('says what a higher rate does', () => {
    const said = [...page.matchAll(/(−[\d.]+) dBc at (\d+ kHz)/gu)].map(([, level, rate]) => [level, rate] as const);
    assert.equal(said.length, 3);
    for (const [level, rate = ''] of said)
      assert.equal(level, printed(figuresOf(spec.replace('rate: 8 kHz', `rate: ${rate}`)).image?.relative ?? 0, 1), rate);
  });
});
