/** What holds of any judgement, whatever the channel: no limit is broken in silence, and none is reported that holds. */
import assert from 'node:assert/strict';
import { counts, createJudgeStore, judge } from '../../src/findings';
import { read } from '../../src/spec';

/** Ends of a channel that differ in how they sample; each is held to limits that it cannot all meet. */
const heads = {
  'a capture channel':
    'direction: capture\n    aperture: 20 %\n    filter: { family: bessel, order: 3, corner: 3 kHz }\n    bits: 10',
  'a generate channel':
    'direction: generate\n    hold: { shape: trapezoid, width: 90 %, edge: 10 % }\n    filter: { rc: { r: 1k, c: 47n ± 5 % } }\n    bits: 10',
  'a naturally gated relay':
    'direction: relay\n    gate: 15 %\n    output-filter: { rc: { r: 1k, c: 47n } }\n    slots: { count: 4, guard: 1 µs, link: 200 kHz }\n    jitter: 1 µs',
  'a relay that tracks and holds':
    'direction: relay\n    gate: { track: 40 % }\n    input-filter: { family: gaussian, order: 3, corner: 3 kHz }\n    jitter: 1 µs',
} as const;

const strict = {
  alias: '-150 dBFS',
  image: '-150 dBc',
  flatness: '0.0001 dB',
  delay: '1 ns',
  'delay-spread': '1 ps',
  level: '-3.001 dBFS .. -3 dBFS',
  response: '[{ band: 100 Hz .. 1 kHz, within: ± 0.0001 dB }, { band: 5 kHz .. , below: -150 dB }]',
  through: '[{ band: 100 Hz .. 1 kHz, below: -20 dB, to: -30 dB }]',
  output: '[{ band: 5 kHz .. 1 MHz, below: -150 dBFS }]',
  snr: '200 dB',
  headroom: '60 dB',
  crosstalk: '-200 dB',
} as const;

const foreign: Readonly<Record<string, readonly string[]>> = {
  capture: ['image', 'output', 'crosstalk'],
  generate: ['alias', 'crosstalk'],
  relay: [],
};

function specOf(head: string, limits: Readonly<Record<string, string>>): string {
  const direction = /direction: (\w+)/.exec(head)?.[1] ?? '';
  const own = Object.entries(limits).filter(([key]) => foreign[direction]?.includes(key) !== true);
  const unwanted = direction === 'generate' ? '' : '    unwanted: { name: gate drive, band: 9 kHz .. 1 MHz, level: -20 dBFS }\n';
  return `bandkeep: 1
channels:
  x:
    ${head}
    wanted: { band: 100 Hz .. 1 kHz, level: -3 dBFS }
${unwanted}    rate: 20 kHz ± 50 ppm
    limits:
${own.map(([key, at]) => `      ${key}: ${at}\n`).join('')}`;
}

const judged = (text: string) => {
  const judgement = judge(read(text), createJudgeStore());
  const figures = judgement.channels[0]?.figures;
  assert.ok(figures, judgement.findings.map(({ message }) => message).join('\n'));
  return { judgement, figures };
};

const sorted = (keys: Iterable<string>): string[] => [...new Set(keys)].sort();

describe('a limit of any kind', () => {
  for (const [name, head] of Object.entries(heads)) {
    it(`that ${name} breaks is an error, and one that it meets is none`, () => {
      const { judgement, figures } = judged(specOf(head, strict));
      const broken = figures.limits.filter(({ judged: is, passes }) => is && !passes).map(({ limit }) => limit);
      const errors = judgement.findings.filter(counts).flatMap(({ limit }) => (limit === null ? [] : [limit]));
      assert.deepEqual(sorted(errors), sorted(broken));
      assert.ok(broken.length >= 7, broken.join(', '));
      assert.equal(judgement.channels[0]?.passes, false);
    });

    it(`that ${name} cannot break is said not to be judged`, () => {
      const { judgement, figures } = judged(specOf(head, strict));
      const open = figures.limits.filter(({ judged: is }) => !is).map(({ limit }) => limit);
      const said = judgement.findings.filter(({ code }) => code === 'not-judged').map(({ limit }) => limit ?? '');
      assert.deepEqual(sorted(said), sorted(open));
    });
  }
});
