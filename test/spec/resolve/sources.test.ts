/** Tests of sources: shared ones, harmonics, and where they enter. */
import assert from 'node:assert/strict';
import { resolveFaults, wholeChannel } from '../tree-of';

const head =
  'sources:\n  mains: { tone: 50 Hz ± 1 %, level: -20 dBFS, harmonics: 40 }\n  renamed: { name: ripple, tone: 1 MHz, level: -40 dBFS, enters: sampler }\n';

const spec = (unwanted: string) =>
  `${head}channels:\n  x:\n    direction: capture\n    wanted: { band: 1 kHz .. 2 kHz }\n    rate: 48 kHz\n    filter: [ { bandwidth: 1 MHz }, { name: guard, bandwidth: 20 kHz } ]\n    unwanted: ${unwanted}\n`;

describe('resolving sources', () => {
  it('takes shared sources by name, beside others', () => {
    const { unwanted } = wholeChannel(spec('[ mains, anything, renamed ]'), 'x');
    assert.deepEqual(
      unwanted.map(({ kind, name, enters }) => [kind, name, enters]),
      [
        ['tone', 'mains', 'input'],
        ['anything', 'anything', 'input'],
        ['tone', 'ripple', 'sampler'],
      ],
    );
  });

  it('reads harmonics in short and long form', () => {
    const harmonics = (text: string) => {
      const [source] = wholeChannel(spec(`{ band: 30 kHz .. 40 kHz, level: 0 dBFS, harmonics: ${text} }`), 'x').unwanted;
      return source?.kind === 'band' ? source.harmonics : undefined;
    };
    assert.deepEqual(harmonics('20'), { to: 20, slopeDbPerDecade: -20, odd: false });
    assert.deepEqual(harmonics('{ to: 9, slope: -40 dB/decade, odd: true }'), { to: 9, slopeDbPerDecade: -40, odd: true });
  });

  it('lets a source enter in front of a stage of that name', () => {
    const [source] = wholeChannel(spec('{ tone: 1 MHz, level: 0 dBFS, enters: guard }'), 'x').unwanted;
    assert.deepEqual(source?.enters, { stage: 1 });
  });

  it('keeps a source from entering behind the sampler of a relay channel', () => {
    const relay = spec('{ tone: 1 MHz, level: 0 dBFS, enters: guard }')
      .replace('capture', 'relay')
      .replace('filter:', 'output-filter:');
    assert.deepEqual(resolveFaults(relay, 'x'), ['contradiction at unwanted.0.enters']);
  });

  const faults: readonly [string, string, readonly string[]][] = [
    ['a source that is not defined', '[ mians ]', ['unknown-name at unwanted.0']],
    ['a stage that is not there', '{ tone: 1 MHz, level: 0 dBFS, enters: gaurd }', ['unknown-name at unwanted.0.enters']],
    ['one source twice', '[ mains, mains ]', ['duplicate-name at unwanted.1.name']],
  ];
  for (const [title, unwanted, expected] of faults) {
    it(`finds ${title}`, () => {
      assert.deepEqual(resolveFaults(spec(unwanted), 'x'), expected);
    });
  }
});
