/** Measured stages from CSV and Touchstone files, from the text of a spec to its figures and findings. */
import assert from 'node:assert/strict';
import { createJudgeStore, judge } from '../../src/findings';
import { read } from '../../src/spec';
import { assertClose, assertWithin } from '../support/tolerance';

const csv = `frequency (kHz), gain (dB), phase (deg)
0.1, 0, -1
1, -0.1, -10
10, -1, -100
20, -12, 170
50, -40, 90
200, -70, 45
`;

// The same gains as a voltage ratio between matched ends, with the other parameters at rest.
const touchstone = `! a pick-up cable
# kHz S DB R 50
0.1  -60 0   0 -1      0 -1      -60 0
1    -60 0  -0.1 -10  -0.1 -10   -60 0
10   -60 0  -1 -100   -1 -100    -60 0
20   -60 0  -12 170   -12 170    -60 0
50   -60 0  -40 90    -40 90     -60 0
200  -60 0  -70 45    -70 45     -60 0
`;

const files = {
  path: 'gate.bandkeep.yaml',
  content: (path: string) => {
    const text = { 'pick-up.csv': csv, 'pick-up.s2p': touchstone, 'silent.csv': csv.replaceAll(/, [^,\n]*$/gm, '') }[path];
    return text === undefined ? { fault: 'missing' as const } : { text };
  },
};

const capture = (stage: string, source = 'band: 40 kHz .. 3 MHz', wanted = '200 Hz .. 10 kHz') => `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: ${wanted}, level: -3 dBFS }
    unwanted: { name: drive hash, ${source}, level: -55 dBFS }
    reference: 1 kHz
    rate: 51.2 kHz
    filter: [{ bandwidth: 400 kHz }, { name: pick-up, ${stage} }]
    bits: 16
    limits: { alias: -96 dBFS, flatness: 2 dB, snr: 84 dB }
`;

function judged(text: string) {
  const { findings, channels } = judge(read(text, undefined, files), createJudgeStore());
  const [channel] = channels;
  return { findings, figures: channel?.figures ?? assert.fail(findings.map(({ message }) => message).join('\n')) };
}

/** The amplifier in front of the table. */
const amplifierDb = (f: number): number => -10 * Math.log10(1 + (f / 400e3) ** 2);

describe('a measured stage', () => {
  for (const path of ['pick-up.csv', 'pick-up.s2p']) {
    it(`is judged as the table of ${path} has it`, () => {
      const { figures } = judged(capture(`measured: ${path}, beyond: -40 dB/decade`));
      // 41.2 kHz lies on the straight line from −12 dB at 20 kHz to −40 dB at 50 kHz.
      const at41 = -12 - (28 * 21.2) / 30 + amplifierDb(41.2e3);
      assertWithin(figures.alias?.level ?? NaN, -55 + at41, 1e-6);
      assert.equal(figures.alias?.frequency, 41200);
      const departs = 0.9 + amplifierDb(1e3) - amplifierDb(10e3);
      assertWithin(figures.limits.find(({ limit }) => limit === 'flatness')?.value ?? NaN, departs, 1e-6);
      // At a point of the table the delay is the mean of both sides.
      const table = (9 / 900 + 90 / 9000) / 2 / 360;
      const pole = 1 / (2 * Math.PI * 400e3 * (1 + (1 / 400) ** 2));
      assertClose(figures.delay ?? NaN, table + pole, 1e-9);
      // Both pieces of the table in the band turn by 10 degrees in a kilohertz, so that only the pole spreads.
      const poles = (1 / (2 * Math.PI * 400e3)) * (1 / (1 + (0.2 / 400) ** 2) - 1 / (1 + (10 / 400) ** 2));
      assertWithin(figures.delaySpread ?? NaN, poles, 1e-12);
    });
  }

  it('moves with its corner', () => {
    const { figures } = judged(capture('measured: pick-up.csv, beyond: hold, tolerance: { corner: 5 % }'));
    const moved = 41.2e3 / 1.05;
    assertWithin(figures.alias?.level ?? NaN, -55 - 12 - (28 * (moved - 20e3)) / 30e3 + amplifierDb(41.2e3), 1e-6);
    assert.deepEqual(figures.alias?.worstAt, { 'pick-up, corner': 0.05 });
    assert.deepEqual(figures.beyondData, []);
  });

  it('has no delay without a phase', () => {
    const { figures } = judged(capture('measured: silent.csv, beyond: hold'));
    assert.deepEqual([figures.delay, figures.delaySpread], [null, null]);
    assert.equal(figures.alias?.frequency, 41200);
  });
});

describe('a table that refuses to be asked', () => {
  it('says what is asked beyond it, and leaves the limit unjudged', () => {
    const { findings, figures } = judged(capture('measured: pick-up.csv'));
    assert.deepEqual(
      findings.map(({ code }) => code),
      ['beyond-data'],
    );
    const message = findings[0]?.message ?? '';
    for (const words of [
      '`pick-up` ends at 200 kHz',
      '`drive hash` may stand at 3 MHz',
      '`alias` is not judged',
      '`beyond: hold`',
    ])
      assert.ok(message.includes(words), message);
    assert.deepEqual(
      figures.limits.map(({ limit, judged: known }) => [limit, known]),
      [
        ['alias', false],
        ['flatness', true],
        ['snr', true],
      ],
    );
    assert.equal(figures.alias, null);
  });

  it('is not asked where everything lies within it', () => {
    const { findings } = judged(capture('measured: pick-up.csv', 'band: 60 kHz .. 200 kHz'));
    assert.deepEqual(
      findings.map(({ code }) => code).filter((code) => code === 'beyond-data'),
      [],
    );
  });

  it('counts the tolerance of its corner, which moves its end', () => {
    const { figures } = judged(capture('measured: pick-up.csv, tolerance: { corner: 5 % }', 'band: 60 kHz .. 195 kHz'));
    assertWithin(figures.beyondData[0]?.endHz ?? NaN, 190e3, 1e-6);
  });

  it('cannot be asked by a source that may stand anywhere', () => {
    const text = capture('measured: pick-up.csv').replace(/unwanted: .*/, 'unwanted: anything');
    const message = judged(text).findings.find(({ code }) => code === 'beyond-data')?.message ?? '';
    assert.match(message, /may stand at any frequency/);
  });

  it('is asked by the wanted band below it only where it refuses that', () => {
    const low = '50 Hz .. 10 kHz';
    assert.deepEqual(judged(capture('measured: pick-up.csv, beyond: hold', undefined, low)).figures.beyondData, []);
    const refused = judged(capture('measured: pick-up.csv, below: refuse, beyond: hold', undefined, low));
    assert.deepEqual(
      refused.figures.limits.map(({ judged: known }) => known),
      [false, false, false],
    );
    assert.match(refused.findings[0]?.message ?? '', /begins at 100 Hz, but the wanted band reaches 50 Hz/);
  });

  it('lets a generate channel pass whose copies nobody limits, and only shows no images', () => {
    const text = capture('measured: pick-up.csv')
      .replace('direction: capture', 'direction: generate')
      .replace(/ {4}unwanted: .*\n/, '')
      .replace('alias: -96 dBFS, ', '');
    const quiet = judged(text);
    assert.deepEqual(
      quiet.findings.filter(({ code }) => code === 'beyond-data'),
      [],
    );
    assert.deepEqual([quiet.figures.images.length, quiet.figures.image], [0, null]);
    const limited = judged(text.replace('flatness: 2 dB', 'flatness: 2 dB, image: -60 dBc'));
    assert.match(
      limited.findings.find(({ code }) => code === 'beyond-data')?.message ?? '',
      /copies leave at ever higher frequencies/,
    );
  });
});
