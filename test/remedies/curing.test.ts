import assert from 'node:assert/strict';
import { exampleText } from '../support/examples';
import { after, cured, errorsIn, titles, type Cured } from '../support/cured';
import { bearingSpec, bearingWith } from '../support/whole-file';
import { createJudgeStore, judge } from '../../src/findings';
import { analysesAllowed } from '../../src/remedies/session';
import { cure } from '../../src/remedies';
import { applyEdits, read } from '../../src/spec';

const onlyThisRate = ['rate-choices: { clock: board, divide: 120 .. 480 } ', 'rate-choices: [51.2 kHz]'] as const;

describe('the fixes of the bearing pick-up', () => {
  let bearing: Cured;
  before(() => {
    bearing = cured(bearingSpec, 'alias-over-limit');
  });

  it('are a round rate of its clock, a higher order and a steeper family, each with the margin it leaves', () => {
    assert.equal(
      bearing.finding.message,
      '`drive hash` at 41.2 kHz lands on 10 kHz at −91.2 dBFS, 4.8 dB over the alias limit of −96 dBFS (worst case, corner +4 %; nominal −92.6).',
    );
    assert.deepEqual(titles(bearing), [
      'Raise the rate to 64 kHz (÷384): alias margin 4.6 dB',
      'Raise `pick-up guard` to order 5: alias margin 4.2 dB, flatness 0.22 dB',
      'Make `pick-up guard` a `legendre` filter: alias margin 2.2 dB, flatness 0.52 dB',
    ]);
  });

  it('come with the reason why no corner is among them', () => {
    assert.equal(
      bearing.cure.note,
      'No corner alone does it: the alias limit asks for 12.18 kHz or less, the flatness limit for 12.73 kHz or more.',
    );
    assert.equal(bearing.cure.blockedBy, null);
  });

  it('change only the value that they name', () => {
    const [rate, order, family] = bearing.cure.fixes.map((fix) => after(bearing, fix));
    assert.equal(rate, bearingWith(['divide: 480 }     ', 'divide: 384 }     ']));
    assert.equal(order, bearingWith(['order: 4', 'order: 5']));
    assert.equal(family, bearingWith(['family: butterworth', 'family: legendre']));
  });

  it('leave no error when judged from nothing', () => {
    for (const fix of bearing.cure.fixes) assert.deepEqual(errorsIn(after(bearing, fix)), [], fix.title);
  });

  it('say the margin that the changed spec then has', () => {
    for (const fix of bearing.cure.fixes) {
      const { channels } = judge(read(after(bearing, fix)), createJudgeStore());
      assert.equal(channels[0]?.figures?.limits.find(({ limit }) => limit === 'alias')?.margin, fix.margin);
    }
  });
});

describe('a search for fixes', () => {
  it('offers a corner, in the unit that the spec uses, where one satisfies every limit', () => {
    const flat = cured(
      bearingWith(['flatness: 0.8 dB', 'flatness: 1.8 dB'], onlyThisRate, ['corner: 14 kHz', 'corner: 0.014 MHz']),
      'alias-over-limit',
    );
    assert.equal(flat.cure.fixes[0]?.kind, 'corner');
    assert.deepEqual(
      flat.cure.fixes[0].edits.map(({ newText }) => newText),
      ['0.0118 MHz'],
    );
    assert.match(
      titles(flat)[0] ?? '',
      /^Lower the corner of `pick-up guard` to 11\.8 kHz: alias margin 1\.\d dB, flatness 1\.\d+ dB$/,
    );
  });

  it('raises a corner for flatness, and a note names the alias limit where that goes too far', () => {
    const text = bearingWith(
      ['corner: 14 kHz', 'corner: 12.3 kHz'],
      ['order: 4', 'order: 3'],
      ['alias: -96 dBFS', 'alias: -80 dBFS'],
    );
    const flat = cured(text, 'flatness-over-limit');
    assert.ok(
      flat.cure.fixes.some(({ kind }) => kind === 'corner'),
      titles(flat).join('\n'),
    );
    for (const fix of flat.cure.fixes) assert.deepEqual(errorsIn(after(flat, fix)), [], fix.title);
  });

  it('takes two changes at once where no single one works, and neither alone would do', () => {
    const text = bearingWith(
      onlyThisRate,
      ['order: 4', 'order: 11'],
      ['corner: 14 kHz', 'corner: 13 kHz'],
      ['alias: -96 dBFS', 'alias: -172 dBFS'],
      ['flatness: 0.8 dB', 'flatness: 0.06 dB'],
    );
    const pair = cured(text, 'alias-over-limit');
    const [fix, ...others] = pair.cure.fixes;
    assert.ok(fix !== undefined && others.length === 0, titles(pair).join('\n'));
    assert.equal(fix.kind, 'two');
    assert.match(fix.title, /^Raise `pick-up guard` to order 12 and lower its corner to 12\.\d+ kHz: alias margin 1\.\d dB/);
    assert.deepEqual(errorsIn(after(pair, fix)), []);
    for (const edit of fix.edits) assert.notDeepEqual(errorsIn(after(pair, { ...fix, edits: [edit] })), []);
  });

  it('says what is in the way, and by how much, where nothing works', () => {
    const text = bearingWith(
      onlyThisRate,
      ['order: 4', 'order: 12'],
      ['alias: -96 dBFS', 'alias: -190 dBFS'],
      ['flatness: 0.8 dB', 'flatness: 0.01 dB'],
    );
    const hopeless = cured(text, 'alias-over-limit');
    assert.deepEqual(hopeless.cure.fixes, []);
    assert.ok((hopeless.cure.blockedBy?.misses ?? 0) > 0);
    assert.match(
      hopeless.cure.note ?? '',
      /Nothing simple works\. What comes nearest \(.*\) misses the (alias|flatness) limit by/,
    );
  });

  it('never costs more analyses than it may', () => {
    const text = bearingWith(
      ['order: 4', 'order: 12'],
      ['alias: -96 dBFS', 'alias: -190 dBFS'],
      ['flatness: 0.8 dB', 'flatness: 0.01 dB'],
    );
    assert.ok(cured(text, 'alias-over-limit').cure.analyses <= analysesAllowed);
  });

  it('finds the same again, and analyses nothing but the channel that a change is in', () => {
    const others = Array.from(
      { length: 20 },
      (_, index) =>
        `  other-${index}:\n    like: bearing-x\n    rate: 96 kHz\n    filter: { family: butterworth, order: 6, corner: ${14 + index / 100} kHz }\n`,
    );
    const inline = bearingWith([
      'filter: pick-up guard',
      'filter: { family: butterworth, order: 4, corner: 14 kHz, tolerance: { corner: 4 % } }',
    ]);
    const alone = cured(inline, 'alias-over-limit');
    const among = cured(
      `${inline}${others.join('').replaceAll('    like: bearing-x\n', ownKeys)}`,
      'alias-over-limit',
      'bearing-x',
    );
    assert.deepEqual(titles(among), titles(alone));
    assert.equal(among.cure.analyses, alone.cure.analyses);
  });

  it('proves a change of a shared filter on every channel that uses it', () => {
    const roomy = bearingWith(['flatness: 0.8 dB', 'flatness: 1.8 dB'], onlyThisRate);
    // 12 kHz is within 1.8 dB below a corner of 14 kHz − 4 %, and no longer below one of 11.8 kHz.
    const wider = `  bearing-y:
    like: bearing-x
    wanted: { band: 5 Hz .. 12 kHz, level: -3 dBFS }
    rate: 128 kHz
    rate-choices: [128 kHz]
    limits: { flatness: 1.8 dB }
`;
    const kinds = (text: string): readonly string[] =>
      cured(text, 'alias-over-limit', 'bearing-x').cure.fixes.map(({ kind }) => kind);
    assert.deepEqual(kinds(roomy), ['corner', 'order', 'family']);
    assert.deepEqual(kinds(`${roomy}${wider}`), ['order', 'family']);
    const { note } = cured(`${roomy}${wider}`, 'alias-over-limit', 'bearing-x').cure;
    assert.match(
      note ?? '',
      /^No corner alone does it: the alias limit asks for 12\.18 kHz or less, the flatness limit for 13\.\d+ kHz or more\.$/,
    );
  });

  it('puts a fix that leaves a new warning last and says so', () => {
    const tight = cured(
      bearingWith([
        'rate-choices: { clock: board, divide: 120 .. 480 }',
        'rate-choices: { clock: board, divide: [384, 425, 480] }',
      ]),
      'alias-over-limit',
    );
    const kinds = tight.cure.fixes.map(({ kind, leaves }) => [kind, leaves === null]);
    assert.deepEqual(kinds, [
      ['rate', true],
      ['order', true],
      ['family', true],
      ['rate', false],
    ]);
    assert.match(
      titles(tight)[3] ?? '',
      /^Raise the rate to 57\.83 kHz \(÷425\): alias margin 0\.4 dB; leaves a new warning \(thin alias margin\)$/,
    );
  });

  it('gives a thin margin room without making another one thin', () => {
    const thin = cured(bearingWith(['alias: -96 dBFS', 'alias: -90.5 dBFS']), 'thin-margin');
    assert.ok(thin.cure.fixes.length > 0);
    for (const fix of thin.cure.fixes.filter(({ leaves }) => leaves === null)) {
      const codes = judge(read(after(thin, fix)), createJudgeStore()).findings.map(({ code }) => code);
      assert.ok(!codes.includes('thin-margin'), fix.title);
    }
  });

  it('changes both factors of a clock where its choices are multiples', () => {
    const multiplied = cured(
      bearingWith([
        'rate-choices: { clock: board, divide: 120 .. 480 }',
        'rate-choices: { clock: board, multiply: 5, divide: [1920, 2500] }',
      ]),
      'rate-unavailable',
    );
    const [fix] = multiplied.cure.fixes;
    assert.equal(titles(multiplied)[0], 'Raise the rate to 64 kHz (÷1920): alias margin 4.6 dB');
    assert.ok(fix !== undefined);
    assert.match(after(multiplied, fix), /rate: \{ clock: board, divide: 1920, multiply: 5 \}/);
  });

  it('keeps the tolerance of a plain rate, and changes an inherited one where it stands', () => {
    const plain = bearingWith(
      ['rate: { clock: board, divide: 480 } ', 'rate: 51.2 kS/s ± 20 ppm'],
      ['rate-choices: { clock: board, divide: 120 .. 480 }', 'rate-choices: [51.2 kHz, 64 kHz]'],
    );
    const heir = cured(`${plain}  bearing-y:\n    like: bearing-x\n`, 'alias-over-limit', 'bearing-y');
    const [fix] = heir.cure.fixes;
    assert.equal(fix?.kind, 'rate');
    assert.match(after(heir, fix), /rate: 64 kS\/s ± 20 ppm/);
    assert.deepEqual(errorsIn(after(heir, fix)), []);
  });

  it('moves a rate that folds the wanted band to one that keeps it whole', () => {
    const folds = cured(bearingWith(['divide: 480 }     ', 'divide: 1500 }    '], ['120 .. 480', '120 .. 1500']), 'wanted-folds');
    assert.ok(folds.cure.fixes.length > 0);
    for (const fix of folds.cure.fixes) assert.ok(!errorsIn(after(folds, fix)).includes('wanted-folds in bearing-x'), fix.title);
  });

  it('offers the rates there are where the rate is none of them', () => {
    const listed = cured(
      bearingWith(['rate-choices: { clock: board, divide: 120 .. 480 }', 'rate-choices: [64 kHz, 96 kHz]']),
      'rate-unavailable',
    );
    assert.deepEqual(titles(listed), ['Raise the rate to 64 kHz (÷384): alias margin 4.6 dB']);
  });

  it('cures a copy of a generated band by rate, order or another way to hold', () => {
    const sounder = cured(
      `bandkeep: 1
channels:
  fish-sounder:
    direction: generate
    wanted: { band: 100 Hz .. 2 kHz, level: -6 dBFS }
    rate: 16 kHz
    filter: { family: butterworth, order: 3, corner: 4 kHz }
    limits: { image: -60 dBc, flatness: 0.5 dB }
`,
      'image-over-limit',
    );
    assert.deepEqual(
      [...new Set(sounder.cure.fixes.map(({ kind }) => kind))].sort(),
      ['order', 'pulse', 'rate'],
      titles(sounder).join('\n'),
    );
    for (const fix of sounder.cure.fixes) assert.deepEqual(errorsIn(after(sounder, fix)), [], fix.title);
  });

  it('leaves a finding alone that no change can cure', () => {
    const short = cured(
      bearingWith(['unwanted:\n', 'guard: 1 Hz\n    unwanted:\n      - { name: far, tone: 5 kHz, level: -90 dBFS }\n']),
      'overlaps-wanted',
    );
    assert.deepEqual(short.cure, { fixes: [], blockedBy: null, note: null, analyses: 0 });
  });
});

describe('the broken example', () => {
  it('passes once the first fix of each error has been accepted in turn', () => {
    let text = exampleText('gate-bearing-broken');
    const taken: string[] = [];
    for (let step = 0; step < 4; step += 1) {
      const store = createJudgeStore();
      const judgement = judge(read(text), store);
      const error = judgement.findings.find(({ severity }) => severity === 'error');
      if (error === undefined) break;
      const [fix] = cure(judgement, error, store).fixes;
      assert.ok(fix !== undefined, error.message);
      taken.push(error.code);
      text = applyEdits(text, fix.edits);
    }
    assert.deepEqual(errorsIn(text), []);
    assert.deepEqual(taken, ['alias-over-limit', 'flatness-over-limit']);
  });
});

/** What `like: bearing-x` stands for, written out, so that no channel depends on another. */
const ownKeys = `    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 90 kHz .. 3 MHz, level: -55 dBFS }
    limits: { flatness: 0.8 dB }
`;
