/** Tests of readings that lean on other files: tables and used specs, their faults, and what is taken over. */
import assert from 'node:assert/strict';
import type { FileSource, Reading } from '../../../src/spec';
import { readAccepting } from '../../../src/spec/read';
import { memoryFiles } from './memory-files';

/** Reads a text as if all that it may say were computed. */
const read = (text: string, previous?: Reading, files?: FileSource) =>
  readAccepting((resolution) => resolution, text, previous, files);

const csv = 'frequency (kHz),gain (dB)\n1,0\n10,-3\n';

const channel = (...keys: readonly string[]) =>
  `channels:\n  x:\n    direction: capture\n    wanted: { band: 1 kHz .. 2 kHz }\n    rate: 48 kHz\n${keys.map((key) => `    ${key}\n`).join('')}`;

const measured = `bandkeep: 1\n${channel('filter: { measured: data/probe.csv }')}`;

const problemsOf = (reading: Reading) =>
  reading.problems.map(({ code, span, message }) => `${code} at ${reading.text.slice(span.start, span.end)}: ${message}`);

const wholeOf = (reading: Reading) => reading.entries[0]?.channel ?? null;

describe('a spec that names a table', () => {
  it('reports its path, and is not whole before the table is there', () => {
    const reading = read(measured);
    assert.deepEqual(reading.paths, ['data/probe.csv']);
    assert.deepEqual(problemsOf(reading), ['file-not-read at data/probe.csv: `data/probe.csv` has not been read.']);
    assert.equal(wholeOf(reading), null);
  });

  it('holds the table in its model', () => {
    const reading = read(measured, undefined, memoryFiles('s.bandkeep.yaml', { 'data/probe.csv': csv }));
    assert.deepEqual(problemsOf(reading), []);
    assert.deepEqual(wholeOf(reading)?.stages[0]?.form, {
      kind: 'measured',
      path: 'data/probe.csv',
      table: { frequenciesHz: [1000, 10000], gainsDb: [0, -3], phasesRad: null },
      below: 'hold',
      beyond: 'refuse',
    });
  });

  it('keeps a channel as long as the content of its table stays the same', () => {
    const files = (text: string) => memoryFiles('s.bandkeep.yaml', { 'data/probe.csv': text });
    const first = read(measured, undefined, files(csv));
    const same = read(`${measured}# a comment\n`, first, files(csv));
    const other = read(measured, same, files(csv.replace('-3', '-4')));
    assert.ok(wholeOf(first));
    assert.equal(wholeOf(same), wholeOf(first));
    assert.notEqual(wholeOf(other), wholeOf(first));
  });

  const faults: readonly [string, FileSource, RegExp][] = [
    ['is missing', memoryFiles('s.bandkeep.yaml', {}), /^file-not-read at data\/probe\.csv: .*there is no such file/],
    [
      'is too large',
      { path: 's.bandkeep.yaml', content: () => ({ fault: 'too-large' }) },
      /^too-large at data\/probe\.csv: .*64 MiB/,
    ],
    [
      'cannot be read',
      { path: 's.bandkeep.yaml', content: () => ({ fault: 'unreadable' }) },
      /^file-not-read at data\/probe\.csv: .*cannot be read/,
    ],
    [
      'has a fault in a line',
      memoryFiles('s.bandkeep.yaml', { 'data/probe.csv': csv.replace('-3', 'low') }),
      /^file-not-read at data\/probe\.csv: `data\/probe\.csv`, line 3: `low` is not a number\.$/,
    ],
  ];
  for (const [title, files, expected] of faults) {
    it(`says at the path that the table ${title}`, () => {
      const reading = read(measured, undefined, files);
      const problems = problemsOf(reading);
      assert.equal(problems.length, 1);
      assert.match(problems[0] ?? '', expected);
      assert.equal(reading.problems[0]?.channel, 'x');
      assert.equal(wholeOf(reading), null);
    });
  }

  it('refuses `source` and `load` for a table that has the gain alone', () => {
    const text = measured.replace('probe.csv', 'probe.csv, source: 50 ohm, load: 50 ohm');
    const reading = read(text, undefined, memoryFiles('s.bandkeep.yaml', { 'data/probe.csv': csv }));
    assert.match(problemsOf(reading)[0] ?? '', /^contradiction at 50 ohm: .*Touchstone/);
  });

  it('reads a spectrum as an envelope and as lines', () => {
    const text = `bandkeep: 1\n${channel('full-scale: 2.828427125 V', 'unwanted: { spectrum: hash.csv, lines: true }')}`;
    const files = memoryFiles('s.bandkeep.yaml', { 'hash.csv': 'frequency (kHz);level (V rms)\n40;0.1\n80;1\n' });
    const [source] = wholeOf(read(text, undefined, files))?.unwanted ?? [];
    assert.ok(source?.kind === 'spectrum');
    // 1 V rms is full scale here, 0.1 V is 20 dB below it.
    assert.deepEqual(
      source.points.map(({ frequencyHz, levelDb }) => [frequencyHz, Math.round(levelDb * 1e6) / 1e6 + 0]),
      [
        [40000, -20],
        [80000, 0],
      ],
    );
    assert.equal(source.lines, true);
    assert.equal(source.name, 'hash.csv');
  });
});

const common = `bandkeep: 1
clocks:
  board: { frequency: 24.576 MHz }
filters:
  guard: { measured: probe.csv }
sources:
  pump: { tone: 310 kHz, level: -24 dBFS }
masks:
  template: [ { band: 0 Hz .. 2 kHz, within: ± 1 dB } ]
`;

const using = `bandkeep: 1
use: [ shared/common.bandkeep.yaml ]
channels:
  x:
    direction: capture
    wanted: { band: 1 kHz .. 2 kHz }
    rate: { clock: board, divide: 512 }
    filter: guard
    unwanted: pump
    limits: { response: template }
`;

const lagoon = (texts: Readonly<Record<string, string>> = {}) =>
  memoryFiles('s.bandkeep.yaml', { 'shared/common.bandkeep.yaml': common, 'shared/probe.csv': csv, ...texts });

describe('a spec that uses another', () => {
  it('may name its clocks, filters, sources and masks', () => {
    const reading = read(using, undefined, lagoon());
    assert.deepEqual(problemsOf(reading), []);
    assert.deepEqual(reading.paths, ['shared/common.bandkeep.yaml', 'shared/probe.csv']);
    const found = wholeOf(reading);
    assert.equal(found?.rate.hz, 48000);
    assert.deepEqual([found.stages[0]?.label, found.unwanted[0]?.name, found.masks[0]?.mask], ['guard', 'pump', 'template']);
  });

  it('keeps its channels while what they name in the other stays the same', () => {
    const first = read(using, undefined, lagoon());
    const more = lagoon({ 'shared/common.bandkeep.yaml': `${common}notes: more\n` });
    const second = read(using, first, more);
    const moved = read(using, second, lagoon({ 'shared/common.bandkeep.yaml': common.replace('310', '320') }));
    assert.ok(wholeOf(first));
    assert.equal(wholeOf(second), wholeOf(first));
    assert.notEqual(wholeOf(moved), wholeOf(first));
  });

  it('does not call a name unknown that a file may hold which was not read', () => {
    const reading = read(using, undefined, memoryFiles('s.bandkeep.yaml', {}));
    assert.deepEqual(
      reading.problems.map(({ code }) => code),
      ['file-not-read'],
    );
    assert.equal(wholeOf(reading), null);
  });

  it('says where a channel leans on a fault of the other file', () => {
    const broken = lagoon({ 'shared/common.bandkeep.yaml': common.replace('310 kHz', '310') });
    assert.deepEqual(problemsOf(read(using, undefined, broken)), [
      'file-not-read at pump: `pump` of `shared/common.bandkeep.yaml` is not whole: cure the faults of that file first.',
    ]);
    const missing = lagoon({ 'shared/probe.csv': 'nothing' });
    assert.deepEqual(problemsOf(read(using, undefined, missing)), [
      'file-not-read at guard: `probe.csv`, which `shared/common.bandkeep.yaml` names, could not be read.',
    ]);
  });

  it('refuses circles, however long', () => {
    const direct = read('bandkeep: 1\nuse: [ s.bandkeep.yaml ]\n', undefined, lagoon());
    assert.match(problemsOf(direct)[0] ?? '', /^contradiction at s\.bandkeep\.yaml: .*`s\.bandkeep\.yaml` → `s\.bandkeep\.yaml`/);
    const files = lagoon({
      'a.bandkeep.yaml': 'bandkeep: 1\nuse: [ b.bandkeep.yaml ]\n',
      'b.bandkeep.yaml': 'bandkeep: 1\nuse:\n  - s.bandkeep.yaml\n',
    });
    const long = read('bandkeep: 1\nuse: [ a.bandkeep.yaml ]\n', undefined, files);
    assert.match(
      problemsOf(long)[0] ?? '',
      /`s\.bandkeep\.yaml` → `a\.bandkeep\.yaml` → `b\.bandkeep\.yaml` → `s\.bandkeep\.yaml`/,
    );
  });

  it('refuses paths out of the root, absolute ones, and one file twice', () => {
    const codes = (list: string) =>
      problemsOf(read(`bandkeep: 1\nuse: [ ${list} ]\n`, undefined, lagoon())).map((said) => said.split(':')[0]);
    assert.deepEqual(codes('../other.yaml'), ['file-not-read at ../other.yaml']);
    assert.deepEqual(codes('/etc/other.yaml'), ['file-not-read at /etc/other.yaml']);
    assert.deepEqual(codes('shared/common.bandkeep.yaml, ./shared/common.bandkeep.yaml'), [
      'duplicate-name at ./shared/common.bandkeep.yaml',
    ]);
  });

  it('refuses a name that both files define', () => {
    const reading = read(`${using}clocks: { board: { frequency: 1 MHz } }\n`, undefined, lagoon());
    assert.match(problemsOf(reading)[0] ?? '', /^duplicate-name at shared\/common\.bandkeep\.yaml: `board` stands in `clocks`/);
  });
});
