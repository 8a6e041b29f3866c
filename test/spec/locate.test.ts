/** Places lead to spans, spans to places, and edits change only what they must. */
import assert from 'node:assert/strict';
import { applyEdits, editValue, exists, placeAt, read, spanOf } from '../../src/spec';
import type { Path, Place } from '../../src/spec';

const text = `bandkeep: 1
clocks:
  board: { frequency: 24.576 MHz, jitter: 3 ps }
filters:
  guard:
    - { bandwidth: 400 kHz }
    - { family: butterworth, order: 4, corner: 14 kHz }
  single: { bandwidth: 100 kHz }
channels:
  x:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }   # the band
    unwanted:
      - { name: hash, band: 40 kHz .. 3 MHz, level: -55 dBFS }
      - name: pump
        tone: 310 kHz
        level: -24 dBFS
    rate: { clock: board, divide: 480 }
    filter: guard
    limits:
      alias: -96 dBFS   # agreed
      flatness: { at: 0.8 dB }
  y:
    like: x
    filter: single
    wanted:
      - band: 5 Hz .. 8 kHz
  z:
    like: y
    filter: { family: chebyshev, order: 3, corner: 9 kHz, ripple: 0.1 dB }
`;
const reading = read(text);

function at(channel: string | null, ...path: Path): Place {
  return { channel, path };
}

function written(place: Place): string {
  const { start, end } = spanOf(reading, place);
  return text.slice(start, end);
}

describe('a place', () => {
  it('is in a spec without faults', () => {
    assert.deepEqual(reading.problems, []);
  });

  for (const [place, expected] of [
    [at('x', 'rate', 'divide'), '480'],
    [at('x', 'rate'), '{ clock: board, divide: 480 }'],
    [at('x', 'wanted', 0, 'band'), '5 Hz .. 10 kHz'],
    [at('x', 'wanted', 'band'), '5 Hz .. 10 kHz'],
    [at('x', 'unwanted', 1, 'tone'), '310 kHz'],
    [at('x', 'limits', 'alias'), '-96 dBFS'],
    [at('x', 'limits', 'alias', 'at'), '-96 dBFS'],
    [at('x', 'limits', 'flatness', 'at'), '0.8 dB'],
    [at('x', 'filter'), 'guard'],
    [at('x', 'filter', 1, 'corner'), '14 kHz'],
    [at('x', 'filter', 0), '{ bandwidth: 400 kHz }'],
    [at('x', 'rate', 'clock'), 'board'],
    [at('x', 'rate', 'clock', 'jitter'), '3 ps'],
    [at('y', 'rate', 'divide'), '480'],
    [at('y', 'filter', 0, 'bandwidth'), '100 kHz'],
    [at('y', 'wanted', 0, 'band'), '5 Hz .. 8 kHz'],
    [at('z', 'filter', 0, 'order'), '3'],
    [at('z', 'wanted', 0, 'band'), '5 Hz .. 8 kHz'],
    [at('z', 'unwanted', 1, 'level'), '-24 dBFS'],
    [at(null, 'clocks', 'board', 'frequency'), '24.576 MHz'],
    [at(null, 'filters', 'guard', 1, 'order'), '4'],
    [at(null, 'bandkeep'), '1'],
    [at(null, 'channels', 'y', 'like'), 'x'],
  ] as const) {
    it(`leads to what is written there: ${place.channel ?? 'file'} ${place.path.join('.')}`, () => {
      assert.equal(written(place), expected);
      assert.ok(exists(reading, place));
    });
  }

  it('may mean the key, or key and value', () => {
    assert.equal(written({ ...at('x', 'rate', 'divide'), part: 'key' }), 'divide');
    assert.equal(written({ ...at('x', 'rate', 'divide'), part: 'pair' }), 'divide: 480');
    assert.equal(written({ ...at('y'), part: 'key' }), 'y');
  });

  it('that is missing is shown at the key of the nearest thing above it', () => {
    for (const [place, expected] of [
      [at('x', 'limits', 'snr'), 'limits'],
      [at('x', 'bits'), 'x'],
      [at('x', 'unwanted', 1, 'ref'), 'name'],
      [at('x', 'unwanted', 7, 'level'), 'unwanted'],
      [at('x', 'filter', 1, 'tolerance'), 'family'],
      [at(null, 'clocks', 'none'), 'clocks'],
      [at('none', 'rate'), 'bandkeep'],
    ] as const) {
      assert.equal(written(place), expected);
      assert.ok(!exists(reading, place));
    }
  });

  it('ends where `like` goes round in a circle', () => {
    const circle = read('bandkeep: 1\nchannels:\n  a:\n    like: b\n  b:\n    like: a\n');
    assert.ok(!exists(circle, at('a', 'rate')));
  });
});

describe('the place at an offset', () => {
  function placeOf(needle: string, from = 0): unknown {
    const found = placeAt(reading, text.indexOf(needle, from) + 1);
    return found && [found.place.channel, found.place.path.join('.'), found.part, text.slice(found.span.start, found.span.end)];
  }

  it('is the innermost', () => {
    assert.deepEqual(placeOf('480 }'), ['x', 'rate.divide', 'value', '480']);
    assert.deepEqual(placeOf('divide'), ['x', 'rate.divide', 'key', 'divide']);
    assert.deepEqual(placeOf('310 kHz'), ['x', 'unwanted.1.tone', 'value', '310 kHz']);
    assert.deepEqual(placeOf('5 Hz .. 10'), ['x', 'wanted.0.band', 'value', '5 Hz .. 10 kHz']);
    assert.deepEqual(placeOf('chebyshev'), ['z', 'filter.0.family', 'value', 'chebyshev']);
    assert.deepEqual(placeOf('guard\n    limits'), ['x', 'filter', 'value', 'guard']);
  });

  it('is outside every channel in what they name', () => {
    assert.deepEqual(placeOf('14 kHz'), [null, 'filters.guard.1.corner', 'value', '14 kHz']);
    assert.deepEqual(placeOf('100 kHz'), [null, 'filters.single.0.bandwidth', 'value', '100 kHz']);
    assert.deepEqual(placeOf('guard'), [null, 'filters.guard', 'key', 'guard']);
    assert.deepEqual(placeOf('24.576'), [null, 'clocks.board.frequency', 'value', '24.576 MHz']);
  });

  it('is the channel where only a comment stands', () => {
    const { place, part } = placeAt(reading, text.indexOf('# the band') + 1) ?? {};
    assert.deepEqual([place, part], [at('x'), 'value']);
    const last = placeAt(read(`${text}    # the end\n`), text.length + 8);
    assert.deepEqual([last?.place, last?.span], [at('z'), { start: text.length + 8, end: text.length + 8 }]);
  });

  it('knows what the declaration says of it', () => {
    assert.match(placeAt(reading, text.indexOf('310 kHz'))?.about?.about ?? '', /frequency of a tone/);
    assert.match(placeAt(reading, text.indexOf('ripple'))?.about?.about ?? '', /ripple/);
    assert.equal(placeAt(reading, text.indexOf('  x:') + 2)?.about ?? null, null);
  });

  it('is null in front of everything', () => {
    assert.equal(placeAt(read('# only a comment\n'), 3), null);
  });

  it('leads back to where it was found', () => {
    for (let offset = 0; offset < text.length; offset += 1) {
      const found = placeAt(reading, offset);
      if (found === null || found.place.path.length === 0) continue;
      const { start, end } = spanOf(reading, { ...found.place, part: found.part });
      assert.deepEqual({ start, end }, found.span, `${String(offset)} ${found.place.path.join('.')}`);
    }
  });
});

describe('an edit', () => {
  function edited(place: Place, newText: string, of = text): string {
    const edit = editValue(read(of), place, newText);
    assert.ok(edit);
    return applyEdits(of, [edit]);
  }

  it('replaces only the value', () => {
    assert.equal(edited(at('x', 'rate', 'divide'), '384'), text.replace('480', '384'));
    assert.equal(edited(at('x', 'filter', 1, 'order'), '5'), text.replace('order: 4', 'order: 5'));
    assert.equal(edited(at('x', 'limits', 'alias', 'at'), '-90 dBFS'), text.replace('-96 dBFS', '-90 dBFS'));
  });

  it('puts a missing key behind the last of a block, with its indentation', () => {
    assert.equal(
      edited(at('x', 'limits', 'snr'), '84 dB'),
      text.replace('flatness: { at: 0.8 dB }\n', 'flatness: { at: 0.8 dB }\n      snr: 84 dB\n'),
    );
    assert.equal(edited(at('x', 'bits'), '16'), text.replace('{ at: 0.8 dB }\n', '{ at: 0.8 dB }\n    bits: 16\n'));
    assert.equal(
      edited(at('x', 'unwanted', 1, 'ref'), 'R4'),
      text.replace('level: -24 dBFS\n', 'level: -24 dBFS\n        ref: R4\n'),
    );
  });

  it('puts a missing key into brackets', () => {
    assert.equal(edited(at('x', 'rate', 'multiply'), '2'), text.replace('divide: 480 }', 'divide: 480, multiply: 2 }'));
    assert.equal(edited(at(null, 'x'), '1', 'x: {}\n'), 'x: 1\n');
    assert.equal(edited(at(null, 'x', 'y'), '1', 'x: {}\n'), 'x: { y: 1 }\n');
    assert.equal(edited(at(null, 'x', 'y'), '1', 'x: { a: }\n'), 'x: { a:, y: 1 }\n');
  });

  it('puts several missing levels in at once', () => {
    assert.equal(
      edited(at('x', 'filter', 1, 'tolerance', 'corner'), '4 %'),
      text.replace('corner: 14 kHz }', 'corner: 14 kHz, tolerance: { corner: 4 % } }'),
    );
  });

  it('gives a key its missing value, and a name its first key', () => {
    assert.equal(
      edited(at('a', 'rate'), '48 kHz', 'channels:\n  a:\n    rate:  # none\n'),
      'channels:\n  a:\n    rate: 48 kHz  # none\n',
    );
    assert.equal(edited(at('a', 'rate'), '48 kHz', 'channels:\n  a: # new\n'), 'channels:\n  a: # new\n    rate: 48 kHz\n');
  });

  it('keeps the line ends of the text', () => {
    const windows = text.replaceAll('\n', '\r\n');
    assert.equal(edited(at('x', 'bits'), '16', windows), edited(at('x', 'bits'), '16').replaceAll('\n', '\r\n'));
    assert.equal(
      edited(at('x', 'rate', 'divide'), '2', windows),
      edited(at('x', 'rate', 'divide'), '2').replaceAll('\n', '\r\n'),
    );
  });

  it('works at the end of a text without a line end', () => {
    assert.equal(
      edited(at('a', 'bits'), '16', 'channels:\n  a:\n    rate: 1 kHz'),
      'channels:\n  a:\n    rate: 1 kHz\n    bits: 16',
    );
  });

  it('leaves everything readable, wherever a key is missing', () => {
    for (const key of ['bits', 'guard', 'jitter', 'full-scale']) {
      for (const channel of ['x', 'y', 'z']) {
        const value = { bits: '12', guard: '1 Hz', jitter: '1 ps', 'full-scale': '4 V' }[key] ?? '';
        const { problems } = read(edited(at(channel, key), value));
        assert.deepEqual(problems, []);
      }
    }
  });

  it('is not made where nothing can be written', () => {
    assert.equal(editValue(reading, at('none', 'rate'), '1'), null);
    assert.equal(editValue(reading, at('x', 'unwanted', 7, 'level'), '1'), null);
    assert.equal(editValue(reading, at('x', 'wanted', 'band', 'low'), '1'), null);
  });

  it('can be applied with others', () => {
    const edits = [
      editValue(reading, at('x', 'rate', 'multiply'), '2'),
      editValue(reading, at('x', 'rate', 'divide'), '960'),
      editValue(reading, at('x', 'bits'), '16'),
      editValue(reading, at('x', 'guard'), '5 Hz'),
    ].flatMap((edit) => edit ?? []);
    const after = read(applyEdits(text, edits));
    assert.deepEqual(after.problems, []);
    assert.equal(after.entries[0]?.channel?.rate.hz, (24.576e6 * 2) / 960);
    assert.equal(after.entries[0].channel.guardHz, 5);
  });

  it('that overlaps an earlier one is left out', () => {
    const edits = [
      { span: { start: 0, end: 3 }, newText: 'x' },
      { span: { start: 2, end: 4 }, newText: 'y' },
    ];
    assert.equal(applyEdits('abcdef', edits), 'xdef');
  });
});
