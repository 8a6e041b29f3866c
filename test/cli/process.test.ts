/** The command as a process: the bundle that `npm run build` leaves at package.json's `bin`, run by `node` with nothing else. */
import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { ResultFile } from '../../src/output';

const root = join(__dirname, '..', '..');
const manifest = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as { version: string; bin: { bandkeep: string } };
const command = join(root, manifest.bin.bandkeep);

function bandkeep(args: readonly string[], input?: string) {
  return spawnSync(process.execPath, [command, ...args], { cwd: join(root, 'examples'), encoding: 'utf8', input: input ?? '' });
}

describe('the built command', () => {
  it('passes the examples that hold, with plain text and nothing on standard error', () => {
    const passing = ['gate-bearing', 'fish-sounder', 'echo-receiver'].map((name) => `${name}.bandkeep.yaml`);
    const { status, stdout, stderr } = bandkeep(['check', ...passing]);
    assert.equal(status, 0);
    assert.match(stdout, /3 files, 4 channels: 0 errors, 0 warnings, 0 hints\n$/);
    assert.equal(stderr, '');
  });

  it('fails the broken example with exactly its two violations as JSON', () => {
    const { status, stdout } = bandkeep(['check', 'gate-bearing-broken.bandkeep.yaml', '--format', 'json']);
    const result = JSON.parse(stdout) as ResultFile;
    assert.equal(status, 1);
    assert.equal(result.tool, manifest.version);
    assert.deepEqual(
      result.files.flatMap((file) => file.findings.map((finding) => finding.code)),
      ['alias-over-limit', 'flatness-over-limit'],
    );
  });

  it('checks standard input', () => {
    const text = readFileSync(join(root, 'examples', 'gate-bearing.bandkeep.yaml'), 'utf8');
    const { status, stdout } = bandkeep(['check', '-', '--name', 'typed.bandkeep.yaml'], text);
    assert.equal(status, 0);
    assert.match(stdout, /^typed\.bandkeep\.yaml$/m);
  });

  it('exits with 2 for a missing file and says so on standard error only', () => {
    const { status, stdout, stderr } = bandkeep(['check', 'no-such.bandkeep.yaml']);
    assert.equal(status, 2);
    assert.equal(stdout, '');
    assert.match(stderr, /no-such\.bandkeep\.yaml/);
  });

  it('prints its version and its help', () => {
    assert.equal(bandkeep(['--version']).stdout, `${manifest.version}\n`);
    assert.match(bandkeep(['--help']).stdout, /Exit codes/);
  });

  it('ends the language server with 1 when its input ends without a shutdown', () => {
    const { status, stdout } = bandkeep(['language-server', '--stdio']);
    assert.equal(status, 1);
    assert.equal(stdout, '');
  });
});
