/** The check of a whole text with the files that it names: the same source said in different ways, and what is said of files. */
import assert from 'node:assert/strict';
import type { Figures } from '../../src/analysis';
import { spanOfFinding } from '../../src/findings';
import { checkText } from '../../src/jobs';
import type { FileSource } from '../../src/spec';
import { assertWithin } from '../support/tolerance';

const filesOf = (texts: Readonly<Record<string, string>>): FileSource => ({
  path: 'quay.bandkeep.yaml',
  content: (path) => {
    const text = texts[path];
    return text === undefined ? { fault: 'missing' } : { text };
  },
});

const checked = (text: string, texts: Readonly<Record<string, string>> = {}) =>
  checkText('quay.bandkeep.yaml', text, { fixes: false, files: filesOf(texts) }).judgement;

const spec = (unwanted: string, more = '') => `bandkeep: 1
${more}channels:
  x:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    full-scale: 4 V
    impedance: 50 Ω
    unwanted: ${unwanted}
    rate: 51.2 kHz
    filter: [ { family: butterworth, order: 4, corner: 14 kHz }, { name: driver, bandwidth: 200 kHz } ]
    limits: { alias: -140 dBFS }
`;

const figuresOf = (text: string, texts: Readonly<Record<string, string>> = {}): Figures => {
  const { channels, findings } = checked(text, texts);
  const figures = channels[0]?.figures;
  assert.ok(figures, findings.map(({ message }) => message).join('\n'));
  return figures;
};

const levelOf = (text: string, texts: Readonly<Record<string, string>> = {}): number =>
  figuresOf(text, texts).alias?.level ?? NaN;

describe('the check of a text', () => {
  // 0 dBFS of 4 Vpp is 1.41421 V rms, so 100 mV rms are −23.0103 dBFS; dBV, dBu (0 dBu = √0.6 V) and dBm (1 mW into 50 Ω) by definition.
  const tenthOfAVolt = -20 * Math.log10(Math.SQRT2 / 0.1);
  const levels: readonly (readonly [said: string, level: string])[] = [
    ['100 mV', '100 mV'],
    ['100 mV rms', '100 mV rms'],
    ['its peak', `${0.1 * Math.SQRT2} V pk`],
    ['its peak to peak', `${0.2 * Math.SQRT2} V pp`],
    ['−20 dBV', '-20 dBV'],
    ['its dBu', `${20 * Math.log10(0.1 / Math.sqrt(0.6))} dBu`],
    ['its dBm', `${10 * Math.log10(0.1 ** 2 / 50 / 1e-3)} dBm`],
    ['its dBFS', `${tenthOfAVolt} dBFS`],
  ];
  const filterDb = (hz: number): number => -10 * Math.log10(1 + (hz / 14e3) ** 8) - 10 * Math.log10(1 + (hz / 200e3) ** 2);

  for (const [said, level] of levels) {
    it(`takes ${said} of a tone, of a band, of anything and of a table for the same level`, () => {
      const landed = tenthOfAVolt + filterDb(41.2e3);
      assertWithin(levelOf(spec(`{ tone: 41.2 kHz, level: ${level} }`)), landed, 1e-6);
      assertWithin(levelOf(spec(`{ band: 30 kHz .. 3 MHz, level: ${level} }`)), landed, 0.001);
      assertWithin(levelOf(spec(`{ anything: ${level} }`)), landed, 0.001);
      const [, value = '', unit = ''] = /^(\S+) (.*)$/u.exec(level) ?? [];
      const table = `frequency (Hz),level (${unit})\n30000,${value}\n3000000,${value}\n`;
      assertWithin(levelOf(spec('{ spectrum: t.csv }'), { 't.csv': table }), landed, 0.001);
    });
  }

  it('says what is missing where a table has a unit that the channel cannot reckon with', () => {
    const text = spec('{ spectrum: t.csv }').replace('    impedance: 50 Ω\n', '');
    const { findings } = checked(text, { 't.csv': 'frequency (Hz),level (dBm)\n30000,-20\n3000000,-20\n' });
    assert.deepEqual(
      findings.map(({ code }) => code),
      ['wrong-unit'],
    );
    assert.match(findings[0]?.message ?? '', /dBm needs the channel's `impedance`/);
  });

  const shared = 'sources:\n  pump: { tone: 310 kHz ± 10 %, harmonics: 20, level: -24 dBFS, enters: driver, ref: P-3 }\n';

  it('gives a shared source the figures of one that stands in place, from this file and from another', () => {
    const own = figuresOf(spec('{ name: pump, tone: 310 kHz ± 10 %, harmonics: 20, level: -24 dBFS, enters: driver, ref: P-3 }'));
    const named = figuresOf(spec('pump', shared));
    const used = figuresOf(spec('pump', 'use: [parts.bandkeep.yaml]\n'), { 'parts.bandkeep.yaml': `bandkeep: 1\n${shared}` });
    assert.deepEqual(named.aliases, own.aliases);
    assert.deepEqual(used.aliases, own.aliases);
    // Only the driver stands in its way: at 297.2 kHz, which lands on 10 kHz, and its own −24 dBFS.
    assertWithin(own.alias?.level ?? NaN, -24 - 10 * Math.log10(1 + (297.2 / 200) ** 2), 0.001);
  });

  it('puts what a shared source breaks at its definition here, or at its name where that stands in another file', () => {
    const loud = (text: string) => text.replace('alias: -140', 'alias: -200');
    const here = checked(loud(spec('pump', shared)));
    const there = checked(loud(spec('[ pump ]', 'use: [parts.bandkeep.yaml]\n')), {
      'parts.bandkeep.yaml': `bandkeep: 1\n${shared}`,
    });
    const marked = [here, there].map(({ reading, findings }) =>
      findings.map((finding) => {
        const { start, end } = spanOfFinding(reading, finding);
        return [finding.code, finding.ref, reading.text.slice(start, end)];
      }),
    );
    assert.deepEqual(marked, [[['alias-over-limit', 'P-3', '310 kHz ± 10 %']], [['alias-over-limit', 'P-3', 'pump']]]);
  });

  it('reads chains of used specs, each path from its own folder', () => {
    const chained = spec('pump', 'use: [parts/all.bandkeep.yaml]\n');
    const parts = {
      'parts/all.bandkeep.yaml': 'bandkeep: 1\nsources:\n  pump: { spectrum: ../tables/t.csv }\n',
      'tables/t.csv': 'frequency (kHz);level (dBFS)\n30;-20\n60;-20\n',
    };
    assertWithin(levelOf(chained, parts), -20 + filterDb(41.2e3), 0.001);
  });

  it('stays not whole without the files, and says so at each path', () => {
    const text = spec('{ spectrum: t.csv }', 'use: [parts.bandkeep.yaml]\n');
    const { channels, findings } = checkText('quay.bandkeep.yaml', text, { fixes: false }).judgement;
    assert.deepEqual(
      channels.map(({ passes }) => passes),
      [null],
    );
    assert.deepEqual(
      findings.map(({ code }) => code),
      ['file-not-read', 'file-not-read'],
    );
  });

  it('tries its fixes on the same files', () => {
    const text = spec('{ spectrum: t.csv }').replace('alias: -140', 'alias: -75');
    const files = filesOf({ 't.csv': 'frequency (kHz),level (dBFS)\n30,-20\n3000,-20\n' });
    const { judgement, cures } = checkText('quay.bandkeep.yaml', text, { fixes: true, files });
    const alias = judgement.findings.find(({ code }) => code === 'alias-over-limit');
    assert.ok(alias);
    assert.ok((cures.get(alias)?.fixes.length ?? 0) > 0);
  });
});
