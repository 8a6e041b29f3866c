/** The command against a host in memory: what it prints, where, and its exit codes. */
import assert from 'node:assert/strict';
import { run } from '../../src/cli/run';
import type { ResultFile } from '../../src/output';
import { exampleText } from '../support/examples';
import { memoryHost } from '../support/memory-host';

const passing = exampleText('gate-bearing');
const broken = exampleText('gate-bearing-broken');

describe('bandkeep check', () => {
  it('exits with 0 and says that the limits hold where they do', async () => {
    const host = memoryHost(['check', 'gate.bandkeep.yaml'], { '/lagoon/gate.bandkeep.yaml': passing });
    assert.equal(await run(host), 0);
    assert.match(host.written.out, /bearing-x: holds · alias −100\.62 dBFS \(4\.62 dB in hand\)/);
    assert.match(host.written.out, /1 file, 2 channels: 0 errors, 0 warnings, 0 hints\n$/);
    assert.equal(host.written.err, '');
  });

  it('exits with 1 where a limit is broken, naming it with its code, its place and the first fix', async () => {
    const host = memoryHost(['check', '.'], { '/lagoon/a/gate.bandkeep.yaml': broken });
    assert.equal(await run(host), 1);
    assert.match(host.written.out, /^a\/gate\.bandkeep\.yaml$/m);
    assert.match(host.written.out, / {2}\d+:\d+ {2}error {2}`drive hash` .*\[alias-over-limit\]/);
    assert.match(host.written.out, /fix: Raise the rate to 64 kHz \(÷384\)/);
    assert.match(host.written.out, /\[flatness-over-limit\]/);
  });

  it('lets warnings pass, but not under --strict', async () => {
    const thin = { '/lagoon/thin.bandkeep.yaml': passing.replaceAll('at: -96 dBFS', 'at: -100 dBFS') };
    assert.equal(await run(memoryHost(['check', '.'], thin)), 0);
    assert.equal(await run(memoryHost(['check', '.', '--strict'], thin)), 1);
  });

  it('reads standard input under the name that it is given', async () => {
    const host = memoryHost(['check', '-', '--name', 'x/gate.bandkeep.yaml', '--format', 'json'], {}, { input: passing });
    assert.equal(await run(host), 0);
    const result = JSON.parse(host.written.out) as ResultFile;
    assert.deepEqual(
      result.files.map((file) => file.path),
      ['x/gate.bandkeep.yaml'],
    );
  });

  it('names each input with its digest and orders files by path', async () => {
    const files = { '/lagoon/b.bandkeep.yaml': passing, '/lagoon/a.bandkeep.yml': passing };
    const host = memoryHost(['check', '--format', 'json'], files);
    await run(host);
    const { inputs } = JSON.parse(host.written.out) as ResultFile;
    assert.deepEqual(
      inputs.map((input) => input.path),
      ['a.bandkeep.yml', 'b.bandkeep.yaml'],
    );
    assert.match(inputs[0]?.sha256 ?? '', /^[0-9a-f]{64}$/);
  });

  it('checks a file once that is named twice', async () => {
    const host = memoryHost(['check', 'a.bandkeep.yaml', '.', '--format', 'json'], { '/lagoon/a.bandkeep.yaml': passing });
    await run(host);
    assert.equal((JSON.parse(host.written.out) as ResultFile).files.length, 1);
  });

  it('exits with 1 for a text with faults and with its place in the report', async () => {
    const host = memoryHost(['check', 'a.bandkeep.yaml'], { '/lagoon/a.bandkeep.yaml': 'bandkeep: 1\nchanels: {}\n' });
    assert.equal(await run(host), 1);
    assert.match(host.written.out, /2:1 {2}error .*`channels`.*\[unknown-key\]/);
  });

  it('keeps colour for terminals, and none of it under NO_COLOR', async () => {
    const files = { '/lagoon/a.bandkeep.yaml': broken };
    const coloured = memoryHost(['check'], files, { isTerminal: true });
    const plain = memoryHost(['check'], files, { isTerminal: true, env: { NO_COLOR: '1' } });
    const piped = memoryHost(['check'], files);
    for (const host of [coloured, plain, piped]) await run(host);
    const escape = String.fromCharCode(27);
    assert.ok(coloured.written.out.includes(`${escape}[31merror${escape}[0m`));
    assert.equal(plain.written.out, piped.written.out);
    assert.ok(!piped.written.out.includes(escape));
  });
});

describe('a call that cannot be carried out', () => {
  const cases: readonly [string, readonly string[], RegExp][] = [
    ['no command', [], /Say what to do/],
    ['an unknown command', ['judge'], /no command `judge`/],
    ['an unknown option', ['check', '--loud'], /--loud/],
    ['an unknown format', ['check', '--format', 'xml'], /`xml` is not supported yet/],
    ['a path that leads nowhere', ['check', 'nowhere.bandkeep.yaml'], /neither a file nor a folder/],
    ['a folder without specs', ['check', 'empty'], /no \*\.bandkeep\.yaml below `empty`/],
    ['a name without standard input', ['check', '--name', 'x', 'a.bandkeep.yaml'], /goes with `-`/],
    ['standard input among files', ['check', '-', 'a.bandkeep.yaml'], /stands alone/],
    ['bytes that are not UTF-8', ['check', 'latin.bandkeep.yaml'], /not UTF-8/],
    ['an unknown finding', ['explain', 'alias-below-limit'], /no finding `alias-below-limit`/],
  ];
  const files = {
    '/lagoon/a.bandkeep.yaml': passing,
    '/lagoon/empty/readme.txt': '',
    '/lagoon/latin.bandkeep.yaml': Uint8Array.of(0x62, 0xb5, 0x0a),
  };
  for (const [what, args, message] of cases) {
    it(`exits with 2 for ${what} and prints nothing on standard output`, async () => {
      const host = memoryHost(args, files);
      assert.equal(await run(host), 2);
      assert.match(host.written.err, message);
      assert.equal(host.written.out, '');
    });
  }

  it('exits with 3 for a fault of the program and asks for a report', async () => {
    const host = { ...memoryHost(['check', 'a.bandkeep.yaml'], files), sha256: () => assert.fail('the digest broke') };
    assert.equal(await run(host), 3);
    assert.match(host.written.err, /Please report it[\s\S]*the digest broke/);
  });
});

describe('the other commands', () => {
  it('print help with the caution, and the version', async () => {
    const help = memoryHost(['--help']);
    const version = memoryHost(['--version']);
    assert.deepEqual([await run(help), await run(version)], [0, 0]);
    assert.match(help.written.out, /bandkeep check[\s\S]*verify on hardware/);
    assert.equal(version.written.out, '0.0.0-test\n');
  });

  it('explain a finding', async () => {
    const host = memoryHost(['explain', 'alias-over-limit']);
    assert.equal(await run(host), 0);
    assert.match(host.written.out, /alias-over-limit/);
  });
});
