/** Reading takes over what has not changed, counts its work, and brings names and faults together across slices. */
import assert from 'node:assert/strict';
import { read } from '../../src/spec/read';
import type { Reading } from '../../src/spec/reading';
import { lagoonChannel, lagoonHead, lagoonNames, lagoonSpec } from '../support/lagoon';

function channelsOf(reading: Reading): Map<string, unknown> {
  return new Map(reading.entries.map(({ name, channel }) => [name, channel]));
}

/** The names whose channel is not the same object any more. */
function renewed(before: Reading, after: Reading): string[] {
  const old = channelsOf(before);
  return [...channelsOf(after)].filter(([name, channel]) => old.get(name) !== channel).map(([name]) => name);
}

describe('reading after an edit', () => {
  const text = lagoonSpec(1000);
  const before = read(text);

  it('starts with every slice read and every channel resolved', () => {
    assert.deepEqual(before.problems, []);
    assert.deepEqual(before.counts, { slices: 1005, slicesRead: 1005, channelsResolved: 1000 });
  });

  it('reads one slice and resolves one channel for an edit in one of 1000', () => {
    const after = read(text.replace(/(gate-500:[^]*?alias: )-60/, '$1-61'), before);
    assert.deepEqual(after.counts, { slices: 1005, slicesRead: 1, channelsResolved: 1 });
    assert.deepEqual(renewed(before, after), ['gate-500']);
  });

  it('reads nothing for a text that is the same', () => {
    const after = read(text, before);
    assert.deepEqual(after.counts, { slices: 1005, slicesRead: 0, channelsResolved: 0 });
    assert.deepEqual(renewed(before, after), []);
  });

  it('reads one slice for a line put in front of everything', () => {
    assert.deepEqual(read(`# a comment\n${text}`, before).counts, { slices: 1005, slicesRead: 0, channelsResolved: 0 });
    assert.equal(read(text.replace('bandkeep: 1', 'bandkeep: 1\nnotes: x'), before).counts.slicesRead, 1);
  });

  it('reads one slice for a channel put in or taken out', () => {
    const added = text.replace('  gate-500:\n', `${lagoonChannel('new').join('\n')}\n  gate-500:\n`);
    const after = read(added, before);
    assert.deepEqual(after.counts, { slices: 1006, slicesRead: 1, channelsResolved: 1 });
    assert.deepEqual(read(text, after).counts, { slices: 1005, slicesRead: 0, channelsResolved: 0 });
  });

  it('knows a channel again that has been moved', () => {
    const block = `${lagoonChannel('gate-500').join('\n')}\n`;
    const moved = text.replace(block, '').replace('  gate-100:\n', `${block}  gate-100:\n`);
    const after = read(moved, before);
    assert.deepEqual(after.counts, { slices: 1005, slicesRead: 0, channelsResolved: 0 });
    assert.deepEqual(renewed(before, after), []);
  });

  it('takes nothing over whose indentation has become right through its neighbours', () => {
    const [first = [], ...others] = lagoonNames(3).map(lagoonChannel);
    const shifted = [` ${first[0] ?? ''}`, ...first.slice(1)];
    const off = read([lagoonHead.trimEnd(), ...shifted, ...others.flat()].join('\n'));
    assert.deepEqual(
      off.entries.map(({ channel }) => channel !== null),
      [false, true, true],
    );
    const all = others.map((lines) => [` ${lines[0] ?? ''}`, ...lines.slice(1)]);
    const right = read([lagoonHead.trimEnd(), ...shifted, ...all.flat()].join('\n'), off);
    assert.deepEqual(right.problems, []);
    assert.ok(right.entries.every(({ channel }) => channel !== null));
  });

  it('gives the same reading as reading afresh', () => {
    const edited = text.replace('corner: 14 kHz', 'corner: 13 kHz').replace('  gate-07:', '  gate 7:');
    const shown = ({ entries, names, problems, title }: Reading): unknown =>
      JSON.parse(JSON.stringify({ entries, names, problems, title }));
    assert.deepEqual(shown(read(edited, before)), shown(read(edited)));
  });
});

describe('reading after an edit of what channels name', () => {
  const own = lagoonNames(4).flatMap(lagoonChannel);
  const text = `${lagoonHead}${[
    ...own,
    '  derived:',
    '    like: gate-02',
    '    bits: 12',
    '  twice derived:',
    '    like: derived',
    '  apart:',
    '    direction: generate',
    '    wanted: { band: 0 Hz .. 10 kHz }',
    '    rate: { clock: spare, divide: 400 }',
    '    filter: other',
  ].join('\n')}\n`;
  const before = read(text);

  it('is done on a spec without faults', () => {
    assert.deepEqual(before.problems, []);
    assert.ok(before.entries.every(({ channel }) => channel !== null));
  });

  it('resolves again the channel and those that are like it', () => {
    const after = read(text.replace(/(gate-02:[^]*?bits: )16/, '$114'), before);
    assert.deepEqual(renewed(before, after), ['gate-02', 'derived', 'twice derived']);
    assert.deepEqual(after.counts.slicesRead, 1);
    assert.deepEqual(after.counts.channelsResolved, 3);
  });

  it('resolves again the users of a filter, and not those of its neighbour', () => {
    const after = read(text.replace('bandwidth: 100 kHz', 'bandwidth: 90 kHz'), before);
    assert.deepEqual(renewed(before, after), ['apart']);
    assert.deepEqual(after.counts, { slices: 12, slicesRead: 1, channelsResolved: 1 });
  });

  it('resolves again the users of a clock', () => {
    const after = read(text.replace('20 MHz', '21 MHz'), before);
    assert.deepEqual(renewed(before, after), ['apart']);
  });

  it('resolves a channel again when a name that was missing comes', () => {
    const missing = read(text.replace('  other:', '  oter:'), before);
    assert.deepEqual(
      missing.problems.map(({ code, channel }) => [code, channel]),
      [['unknown-name', 'apart']],
    );
    assert.deepEqual(read(text, missing).problems, []);
  });

  it('offers a name that has come after the fault', () => {
    const first = read(text.replace('filter: other', 'filter: othre'), before);
    assert.match(first.problems[0]?.message ?? '', /did you mean `other`/);
    const second = read(text.replace('filter: other', 'filter: othre').replace('  other:', '  othr:'), first);
    assert.match(second.problems[0]?.message ?? '', /did you mean `othr`/);
  });

  it('keeps a channel from being whole when what it names has a fault, which is reported once', () => {
    const { problems, entries } = read(text.replace('order: 4', 'order: 400'), before);
    assert.equal(problems.length, 1);
    assert.deepEqual(
      entries.filter(({ channel }) => channel !== null).map(({ name }) => name),
      ['apart'],
    );
  });

  it('does not take a name for missing that a fault has swallowed', () => {
    const { problems } = read(text.replace('  other: { bandwidth', '  other { bandwidth'), before);
    assert.deepEqual(
      problems.map(({ code }) => code),
      ['syntax'],
    );
  });

  it('tells who uses what', () => {
    const users = new Map(before.names.map(({ space, name, users: of }) => [`${space} ${name}`, of]));
    const lagoon = [...lagoonNames(4), 'derived', 'twice derived'];
    assert.deepEqual(users.get('clocks board'), lagoon);
    assert.deepEqual(users.get('filters guard'), lagoon);
    assert.deepEqual(users.get('filters other'), ['apart']);
    assert.deepEqual(users.get('clocks spare'), ['apart']);
  });
});

describe('reading a file', () => {
  it('asks for the version of the language', () => {
    const text = '# a file\ntitle: x\n';
    const [problem, ...more] = read(text).problems;
    assert.deepEqual(more, []);
    assert.equal(problem?.code, 'missing-key');
    assert.equal(text.slice(problem.span.start, problem.span.end), 'title');
    assert.deepEqual(problem.cures[0]?.edits, [{ span: { start: 9, end: 9 }, newText: 'bandkeep: 1\n' }]);
  });

  it('gives an empty reading for an empty text', () => {
    const { entries, problems, title } = read('');
    assert.deepEqual([entries, title, problems.length], [[], null, 1]);
  });

  it('does not mind a byte order mark or the line ends of another system', () => {
    const { problems, entries } = read(`\uFEFF${lagoonSpec(3).replaceAll('\n', '\r\n')}`);
    assert.deepEqual(problems, []);
    assert.equal(entries.filter(({ channel }) => channel !== null).length, 3);
  });

  it('reads channels that stand in brackets', () => {
    const channel = '{ direction: capture, wanted: { band: 0 Hz .. 1 kHz }, rate: 48 kHz, bits: 99 }';
    const { entries, problems } = read(`bandkeep: 1\nchannels: { a: ${channel.replace('99', '9')},\n  b: ${channel} }\n`);
    assert.deepEqual(
      entries.map(({ name, channel: whole }) => [name, whole !== null]),
      [
        ['a', true],
        ['b', false],
      ],
    );
    assert.deepEqual(
      problems.map(({ code, channel: owner }) => [code, owner]),
      [['out-of-range', 'b']],
    );
  });

  it('refuses a text of more than 16 MiB with one problem', () => {
    const { problems, entries } = read(`bandkeep: 1\n${'#'.repeat(16 * 1024 * 1024)}`);
    assert.deepEqual(entries, []);
    assert.deepEqual(
      problems.map(({ code }) => code),
      ['too-large'],
    );
  });

  it('finds repeated keys of the file and repeated names across slices', () => {
    const text = `${lagoonSpec(2)}${lagoonChannel('gate-01').join('\n')}\nclocks:\n  board: { frequency: 1 MHz }\n`;
    const { problems, entries } = read(text);
    assert.deepEqual(
      problems.map(({ code, span }) => [code, text.slice(span.start, span.end)]),
      [
        ['duplicate-name', 'gate-01'],
        ['duplicate-name', 'clocks'],
        ['duplicate-name', 'board'],
      ],
    );
    assert.ok(entries.every(({ channel }) => channel === null));
  });

  it('marks every channel that a merge conflict reaches into', () => {
    const [first = [], second = [], third = []] = lagoonNames(3).map(lagoonChannel);
    const conflict = ['<<<<<<< mine', ...second.slice(10), '=======', '    bits: 3', '>>>>>>> theirs'];
    const text = [lagoonHead.trimEnd(), ...first, ...second.slice(0, 10), ...conflict, ...third].join('\n');
    const { problems, entries } = read(text);
    assert.equal(problems.length, 1);
    assert.deepEqual(
      entries.map(({ channel }) => channel !== null),
      [true, false, true],
    );
  });
});
