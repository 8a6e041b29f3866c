/** The numbers in the page about sampling a band above half the rate, each computed anew from the page's own spec. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { jitterNoiseDb, rateWindowsOf } from '../../src/analysis';
import { createJudgeStore, judge } from '../../src/findings';
import { read } from '../../src/spec';

const page = readFileSync(join(__dirname, '..', '..', 'docs', 'band-sampling.md'), 'utf8').replaceAll('\r\n', '\n');
const spec = /```yaml\n([^`]*)```/u.exec(page)?.[1] ?? '';
const reading = read(spec);
const channel = reading.entries[0]?.channel;

describe('the page about sampling a band above half the rate', () => {
  it('shows a spec that passes without a finding', () => {
    assert.deepEqual(judge(reading, createJudgeStore()).findings, []);
  });

  it('lists the windows as the tool computes them', () => {
    assert.ok(channel);
    const rows = [...page.matchAll(/^\| (\d+) \| ([\d.]+) \| ([\d.]+) \| (upright|inverted) \|$/gmu)];
    assert.equal(rows.length, 6);
    const { windows } = rateWindowsOf(channel);
    for (const [, zone, from, to, side] of rows) {
      const window = windows.find(({ zones }) => zones[0] === Number(zone));
      assert.equal(from, ((window?.low ?? NaN) / 1e6).toFixed(4));
      assert.equal(to, ((window?.high ?? NaN) / 1e6).toFixed(4));
      assert.equal(side, Number(zone) % 2 === 0 ? 'inverted' : 'upright');
    }
  });

  it('names the stretches that land on the band', () => {
    // Mirrors of 0.104 .. 0.404 MHz about 4 and 5 times the rate.
    const mirrors = [4 * 1.024 - 0.404, 4 * 1.024 - 0.104, 5 * 1.024 - 0.404, 5 * 1.024 - 0.104].map((mhz) => mhz.toFixed(3));
    assert.match(
      page,
      new RegExp(`${mirrors[0]} \\.\\. ${mirrors[1]} MHz below and ${mirrors[2]} \\.\\. ${mirrors[3]} MHz above`, 'u'),
    );
  });

  it('gives what jitter costs', () => {
    assert.equal(Math.round(-jitterNoiseDb(4.5e6, 5e-12)), 77);
  });
});
