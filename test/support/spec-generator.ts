/** Generates legal specs as text, in many layouts, for property tests of the reader; nothing random but fast-check's own seed. */
import fc from 'fast-check';

// `→` stands for one more level of indentation.
const channelLines = [
  'direction: capture',
  'wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }   # the band',
  'unwanted:\n→- { name: hash, band: 40 kHz .. 3 MHz }\n→- name: sump pump\n→  tone: 310 kHz ± 10 %',
  'unwanted:\n- anything',
  'filter: [{bandwidth: 4 kHz}, {rc: {r: 4k7, c: 2n2}}]',
  'filter: {\n→family: butterworth,\n→order: 4\n}',
  "ref: 'it''s #4'",
  'limits:\n→alias: -96 dBFS\n\n→# a comment\n→flatness: { at: 0.8 dB,\n→  ref: R4 }',
  'ref: >\n→folded\n→text',
  'ref: "a text\n→over lines"',
  '"rate": 51.2 kHz',
  '# only a comment',
  'guard:',
  'gate: { track: 40 % }',
  'input-filter:\n→- measured: a.csv\n→  beyond: -40 dB/decade',
  'rate-choices: [48 kHz,\n→96 kHz]',
];

/** One legal YAML text in the form of a spec: keys at the left edge, `channels` with names below, any layout in between. */
export const legalSpec: fc.Arbitrary<string> = fc
  .record({
    head: fc.constantFrom('', '# a comment\n', '\uFEFF', '---\n', '\n\n'),
    sections: fc.array(
      fc.constantFrom(
        'title: Sluice gate 3\n',
        "title: 'a: b, # c'\n",
        'title: "tone:3 kHz\\n- x"\n',
        'notes: |\n  channels:\n    - 96 dB\n\n  \u00a0text # no comment\n',
        'notes: >-\n   first\n   second\n\n   third\n',
        'notes: a text\n  over three\n\n  lines\n',
        'clocks:\n  board: { frequency: 24.576 MHz, jitter: 3 ps }\n',
        'clocks: {board: {frequency: 1 MHz}}\n',
        'clocks: {\n  board: { frequency: 1 MHz },\n}\n',
        'filters:\n  guard:\n  - { bandwidth: 4 kHz }\n  -\n    bandwidth: 5 kHz # end\n',
        'use: [ shared/common.bandkeep.yaml ]\n',
        'sources:\n  pump: { tone: 310 kHz, level: -24 dBFS }\n  hash:\n    spectrum: hash.csv # a table\n',
        'masks:\n  studio:\n  - { band: 0 Hz .. 5 MHz, within: ± 0.1 dB }\n',
        'filters:\n- a\n- b: c\n',
        'filters:\n    guard:\n        - bandwidth: 4 kHz\n\n        # between\n        - rc: {r: 1 kΩ, c: 2n2}\n',
      ),
      { maxLength: 5 },
    ),
    channels: fc.array(fc.tuple(fc.nat(9), fc.array(fc.nat(channelLines.length - 1), { maxLength: 6 })), { maxLength: 5 }),
    indent: fc.constantFrom(1, 2, 4, 7),
    deeper: fc.constantFrom(1, 2, 3),
    at: fc.nat(5),
    lineEnd: fc.constantFrom('\n', '\r\n'),
    tail: fc.constantFrom('', '# end\n', '...\n', '  # end'),
  })
  .map(({ head, sections, channels, indent, deeper, at, lineEnd, tail }) => {
    const block = `channels:\n${channels.map(([name, lines], index) => channelText(`c${name} ${index}`, lines, indent, deeper)).join('')}`;
    const parts: string[] = [...sections];
    if (channels.length > 0) parts.splice(Math.min(at, parts.length), 0, block);
    return (head + parts.join('') + tail).replaceAll('\n', lineEnd);
  });

function channelText(name: string, lines: readonly number[], indent: number, deeper: number): string {
  const own = ' '.repeat(indent + deeper);
  const body = lines.map((line) => `${own}${(channelLines[line] ?? '').replaceAll('\n', `\n${own}`).replaceAll('→', '  ')}\n`);
  return `${' '.repeat(indent)}${name}:\n${body.join('')}`;
}
