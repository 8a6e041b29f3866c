/** Everyday typing mistakes in one of 22 channels leave the 21 others whole. */
import assert from 'node:assert/strict';
import { read } from '../../src/spec/read';
import { lagoonChannel, lagoonHead, lagoonNames } from '../support/lagoon';

type Lines = readonly string[];

/** Replaces the first line that begins with `key` by others. */
function instead(lines: Lines, key: string, ...others: Lines): string[] {
  const at = lines.findIndex((line) => line.trim().startsWith(key));
  assert.ok(at >= 0);
  return [...lines.slice(0, at), ...others, ...lines.slice(at + 1)];
}

const mistakes: Record<string, (lines: Lines) => string[]> = {
  'an unclosed double quote': (lines) => instead(lines, 'bits', '    bits: 16', '    ref: "R4'),
  'an unclosed single quote': (lines) => instead(lines, 'bits', "    ref: 'R4", '    bits: 16'),
  'an unclosed list': (lines) => instead(lines, 'bits', '    rate-choices: [48 kHz, 96 kHz', '    bits: 16'),
  'an unclosed map': (lines) => instead(lines, 'wanted', '    wanted: { band: 0 Hz .. 10 kHz, level: -3 dBFS'),
  'a bracket too many': (lines) => instead(lines, 'rate', '    rate: { clock: board, divide: 480 }}'),
  'a tab in the indentation': (lines) => instead(lines, 'bits', '\tbits: 16'),
  'a tab in front of the name': (lines) => [`\t${lines[0]?.trim() ?? ''}`, ...lines.slice(1)],
  'a merge conflict': (lines) =>
    instead(lines, 'bits', '<<<<<<< HEAD', '    bits: 16', '=======', '    bits: 18', '>>>>>>> branch'),
  'half a merge conflict': (lines) => instead(lines, 'bits', '    bits: 16', '======='),
  'no space behind a colon': (lines) => instead(lines, 'bits', '    bits:16'),
  'no space behind the colon of a name': (lines) => [`${lines[0] ?? ''}{ direction: capture }`],
  'too much indentation': (lines) => instead(lines, 'bits', '     bits: 16'),
  'too little indentation': (lines) => instead(lines, 'bits', '   bits: 16'),
  'a key as far left as the names': (lines) => instead(lines, 'bits', '  bits: 16'),
  'a key at the left edge': (lines) => instead(lines, 'bits', 'bits: 16'),
  'a name with one space too many': (lines) => [` ${lines[0] ?? ''}`, ...lines.slice(1)],
  'a name with one space too few': (lines) => [(lines[0] ?? '').slice(1), ...lines.slice(1)],
  'a name at the left edge': (lines) => [(lines[0] ?? '').trim(), ...lines.slice(1)],
  'a name without its colon': (lines) => [(lines[0] ?? '').replace(':', ''), ...lines.slice(1)],
  'a half-typed name': (lines) => [...lines, '  gat'],
  'a repeated key': (lines) => [...lines, '    bits: 12'],
  'a repeated name': (lines) => [...lines, ...lines],
  'stray text': (lines) => instead(lines, 'bits', '    bits: 16', '    some stray text'),
  'stray text at the left edge': (lines) => instead(lines, 'bits', 'some stray text', '    bits: 16'),
  'a half-typed key': (lines) => instead(lines, 'bits', '    bi'),
  'a key without a colon': (lines) => instead(lines, 'bits', '    bits 16'),
  'no space behind a dash': (lines) => instead(lines, '- name', '      -name: sump pump'),
  'a space behind a minus': (lines) => instead(lines, 'alias', '      alias: - 60 dBFS'),
  'a decimal comma': (lines) => instead(lines, 'flatness', '      flatness: 3,5 dB'),
  'text that begins with @': (lines) => [...lines, '    ref: @gate'],
  'text that begins with >': (lines) => [...lines, '    ref: > 3 dB'],
  'an anchor': (lines) => [`${lines[0] ?? ''} &gate`, ...lines.slice(1)],
  'an alias': (lines) => instead(lines, 'filter', '    filter: *guard'),
  'a merge key': (lines) => [...lines, '    <<: *gate'],
  'a tag': (lines) => instead(lines, 'bits', '    bits: !!int 16'),
  'a lone carriage return': (lines) => instead(lines, 'bits', '    bits: 16\r    guard: 1 Hz'),
  'a no-break space in the indentation': (lines) => instead(lines, 'bits', '  \u00a0\u00a0bits: 16'),
  'a no-break space in front of the name': (lines) => [(lines[0] ?? '').replace('  ', '\u00a0\u00a0'), ...lines.slice(1)],
  'a document marker': (lines) => instead(lines, 'bits', '---', '    bits: 16'),
  'a directive': (lines) => instead(lines, 'bits', '%YAML 1.2', '    bits: 16'),
  'a colon in a text': (lines) => [...lines, '    ref: Gate 3: bearing'],
  'an explicit key': (lines) => [...lines, '    ? ref', '    : R4'],
  'a list where a map belongs': (lines) => [lines[0] ?? '', '  - direction: capture', ...lines.slice(2)],
};

describe('a typing mistake in one of 22 channels', () => {
  const names = lagoonNames(22);

  it('is the only fault there is', () => {
    const { problems, entries } = read(lagoonHead + names.flatMap(lagoonChannel).join('\n'));
    assert.deepEqual(problems, []);
    assert.ok(entries.every(({ channel }) => channel !== null));
  });

  for (const [title, mistaken] of Object.entries(mistakes)) {
    it(`leaves the others whole: ${title}`, () => {
      for (const at of [0, 10, 21]) {
        const blocks = names.map((name, index) => (index === at ? mistaken(lagoonChannel(name)) : lagoonChannel(name)));
        const reading = read(`${lagoonHead}${blocks.flat().join('\n')}\n`);
        const whole = reading.entries.filter(({ channel }) => channel !== null).map(({ name }) => name);
        assert.deepEqual(
          whole.filter((name) => name !== names[at]),
          names.filter((_, index) => index !== at),
          reading.problems.map(({ message }) => message).join('\n'),
        );
        assert.ok(!whole.includes(names[at] ?? ''), 'a channel with a fault in it is not whole');
        assert.ok(reading.problems.length >= 1 && reading.problems.length <= 3, JSON.stringify(reading.problems, null, 1));
      }
    });
  }
});
