/** Comments that accept a finding are found with the line they speak for. */
import assert from 'node:assert/strict';
import { read } from '../../src/spec/read';
import { lagoonSpec } from '../support/lagoon';

const spec = lagoonSpec(2);

/** The spec with its first `flatness` line replaced. */
function withLines(...lines: readonly string[]): string {
  return spec.replace('      flatness: 3 dB', lines.join('\n'));
}

function accepted(text: string): unknown {
  return read(text).acceptances.map(({ code, reason, downTo, line }) => [code, reason, downTo, text.slice(line.start, line.end)]);
}

describe('an acceptance', () => {
  it('speaks for the next line when it stands on a line of its own', () => {
    const text = withLines('      # bandkeep: accept flatness-over-limit, agreed in review 7', '      flatness: 3 dB');
    assert.deepEqual(accepted(text), [['flatness-over-limit', 'agreed in review 7', null, '      flatness: 3 dB']]);
    assert.deepEqual(read(text).problems, []);
    assert.ok(read(text).entries.every(({ channel }) => channel !== null));
  });

  it('speaks for its own line when it stands at the end of one', () => {
    const line = '      flatness: 3 dB   # bandkeep: accept flatness-over-limit, agreed, as said';
    assert.deepEqual(accepted(withLines(line)), [['flatness-over-limit', 'agreed, as said', null, line]]);
  });

  it('may have a bound', () => {
    const line = '      flatness: 3 dB # bandkeep: accept flatness-over-limit down to -1.5 dB, agreed';
    assert.deepEqual(accepted(withLines(line)), [['flatness-over-limit', 'agreed', -1.5, line]]);
    assert.deepEqual(accepted(withLines(line.replace('-1.5', '\u22121.5'))), [
      ['flatness-over-limit', 'agreed', -1.5, line.replace('-1.5', '\u22121.5')],
    ]);
  });

  it('may stand above another, and both speak for the line below', () => {
    const text = withLines(
      '      # bandkeep: accept flatness-over-limit, a',
      '      # another comment',
      '      # bandkeep: accept thin-margin, b',
      '      flatness: 3 dB',
    );
    assert.deepEqual(accepted(text), [
      ['flatness-over-limit', 'a', null, '      flatness: 3 dB'],
      ['thin-margin', 'b', null, '      flatness: 3 dB'],
    ]);
  });

  it('may speak for the first line of the next slice', () => {
    const text = spec.replace('  gate-02:', '  # bandkeep: accept no-limits, b\n  gate-02:');
    assert.deepEqual(accepted(text), [['no-limits', 'b', null, '  gate-02:']]);
  });

  it('is read where lines end with a carriage return and a line feed', () => {
    const text = withLines('      flatness: 3 dB # bandkeep: accept thin-margin, b').replaceAll('\n', '\r\n');
    assert.deepEqual(accepted(text), [['thin-margin', 'b', null, '      flatness: 3 dB # bandkeep: accept thin-margin, b']]);
  });

  for (const [title, comment] of Object.entries({
    'without a reason': '# bandkeep: accept thin-margin',
    'with an empty reason': '# bandkeep: accept thin-margin,',
    'without a code': '# bandkeep: accept , reason',
    'that is no acceptance': '# bandkeep: ignore thin-margin, reason',
    'without its comma': '# bandkeep: accept thin-margin agreed in review 7',
    'with a bound that is none': '# bandkeep: accept thin-margin down to some dB, agreed',
  })) {
    it(`${title} is a syntax error, and its channel is not whole`, () => {
      const text = withLines(`      flatness: 3 dB ${comment}`);
      const { problems, acceptances, entries } = read(text);
      assert.deepEqual(acceptances, []);
      assert.deepEqual(
        problems.map(({ code, channel, span }) => [code, channel, text.slice(span.start, span.end)]),
        [['syntax', 'gate-01', comment.trimEnd()]],
      );
      assert.deepEqual(
        entries.map(({ channel }) => channel !== null),
        [false, true],
      );
    });
  }

  it('is text inside a scalar', () => {
    for (const notes of [
      'notes: "# bandkeep: accept x"',
      'notes: |\n  # bandkeep: accept x',
      "notes: 'a\n  # bandkeep: accept x'",
    ]) {
      const { acceptances, problems } = read(spec.replace('clocks:', `${notes}\nclocks:`));
      assert.deepEqual([acceptances, problems], [[], []]);
    }
  });

  it('is not the key of the language', () => {
    assert.deepEqual(read(spec).acceptances, []);
  });
});
