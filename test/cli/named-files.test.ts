/** The files that checked specs name: read within the root and nowhere else, each once, and listed with their digest. */
import assert from 'node:assert/strict';
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, truncateSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { buildSync } from 'esbuild';
import { run } from '../../src/cli/run';
import type { ResultFile } from '../../src/output';
import { memoryHost } from '../support/memory-host';

const table = 'frequency (kHz),level (dBFS)\n20,-70\n100,-40\n1000,-80\n';

const shared = `bandkeep: 1
sources:
  switcher: { tone: 310 kHz ± 10 %, harmonics: 20, level: -24 dBFS }
filters:
  guard: { family: butterworth, order: 4, corner: 14 kHz }
`;

const spec = (path = '../tables/hash.csv', use = 'shared.bandkeep.yaml') => `bandkeep: 1
use: [${use}]
channels:
  x:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: [switcher, { name: hash, spectrum: ${path} }]
    rate: 51.2 kHz
    filter: guard
    limits: { alias: -90 dBFS }
`;

const lagoon = {
  '/lagoon/specs/a.bandkeep.yaml': spec(),
  '/lagoon/specs/shared.bandkeep.yaml': shared,
  '/lagoon/tables/hash.csv': table,
};

/** At 41.2 kHz the envelope is straight in dB over log f between (20 kHz, −70) and (100 kHz, −40); then the Butterworth of order 4. */
const hashDb = -70 + 30 * (Math.log(41.2 / 20) / Math.log(5)) - 10 * Math.log10(1 + (41.2 / 14) ** 8);

const resultOf = async (host: ReturnType<typeof memoryHost>): Promise<ResultFile> => {
  await run(host);
  return JSON.parse(host.written.out) as ResultFile;
};

describe('files that a checked spec names', () => {
  it('are read from the folder of the spec, and judged', async () => {
    const result = await resultOf(memoryHost(['check', 'specs/a.bandkeep.yaml', '--format', 'json'], lagoon));
    const channel = result.files[0]?.channels[0];
    assert.equal(channel?.passes, true);
    assert.ok(Math.abs(Number(channel.alias?.level) - hashDb) < 0.001, String(channel.alias?.level));
    assert.deepEqual([channel.alias?.source, channel.alias?.frequency], ['hash', 41200]);
  });

  it('stand behind the specs in the inputs, tables included, each once with the digest of its bytes', async () => {
    const { inputs } = await resultOf(memoryHost(['check', '--format', 'json'], lagoon));
    assert.deepEqual(
      inputs.map(({ path }) => path),
      ['specs/a.bandkeep.yaml', 'specs/shared.bandkeep.yaml', 'tables/hash.csv'],
    );
    assert.equal(inputs[2]?.sha256, createHash('sha256').update(table).digest('hex'));
  });

  it('are found from where standard input is said to stand', async () => {
    const args = ['check', '-', '--name', 'specs/typed.bandkeep.yaml'];
    assert.equal(await run(memoryHost(args, lagoon, { input: spec() })), 0);
    const elsewhere = memoryHost(['check', '-', '--name', 'typed.bandkeep.yaml'], lagoon, { input: spec() });
    assert.equal(await run(elsewhere), 1);
    assert.match(elsewhere.written.out, /`\.\.\/tables\/hash\.csv` leads out of the root/);
  });

  it('lie in the root that is given, or are refused', async () => {
    const host = memoryHost(['check', 'specs/a.bandkeep.yaml', '--root', 'specs'], lagoon);
    assert.equal(await run(host), 1);
    assert.match(host.written.out, /`\.\.\/tables\/hash\.csv` leads out of the root/);
    const outside = memoryHost(['check', 'specs/a.bandkeep.yaml', '--root', 'tables'], lagoon);
    assert.equal(await run(outside), 1);
    assert.match(outside.written.out, /`shared\.bandkeep\.yaml` leads out of the root/);
  });

  it('are read the same with a byte order mark and carriage returns', async () => {
    const windows = { ...lagoon, '/lagoon/tables/hash.csv': `\uFEFF${table.replaceAll('\n', '\r\n')}` };
    const [plain, marked] = [lagoon, windows].map((files) => memoryHost(['check', 'specs/a.bandkeep.yaml'], files));
    assert.ok(plain && marked);
    assert.deepEqual([await run(plain), await run(marked)], [0, 0]);
    assert.equal(marked.written.out, plain.written.out);
  });

  it('that are no text are refused with that reason', async () => {
    const files = { ...lagoon, '/lagoon/tables/hash.csv': new Uint8Array([0x66, 0xff, 0xfe]) };
    const host = memoryHost(['check', 'specs/a.bandkeep.yaml'], files);
    assert.equal(await run(host), 1);
    assert.match(host.written.out, /`tables\/hash\.csv`: it is not UTF-8 text\. {2}\[file-not-read\]/);
  });

  it('that use each other in a circle are refused', async () => {
    const files = { ...lagoon, '/lagoon/specs/shared.bandkeep.yaml': `${shared}use: [a.bandkeep.yaml]\n` };
    const host = memoryHost(['check', 'specs/a.bandkeep.yaml'], files);
    assert.equal(await run(host), 1);
    assert.match(host.written.out, /goes round in a circle: `specs\/a\.bandkeep\.yaml` → `specs\/shared\.bandkeep\.yaml`/);
  });

  it('keep their own faults: those of a used spec are found where it is checked itself', async () => {
    const files = { ...lagoon, '/lagoon/specs/shared.bandkeep.yaml': `${shared}clocks:\n  c: { frequency: 3 }\n` };
    assert.equal(await run(memoryHost(['check', 'specs/a.bandkeep.yaml'], files)), 0);
    const own = memoryHost(['check', 'specs/shared.bandkeep.yaml'], files);
    assert.equal(await run(own), 1);
    assert.match(own.written.out, /7:19/);
  });
});

describe('the command on a disk', () => {
  let folder = '';
  let command = '';
  const put = (path: string, text: string): void => {
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), text);
  };
  const check = (path: string, root = '.') => {
    writeFileSync(join(folder, 'lagoon', 'specs', 'a.bandkeep.yaml'), spec(path));
    const options = { cwd: join(folder, 'lagoon'), encoding: 'utf8' } as const;
    return spawnSync(process.execPath, [command, 'check', 'specs/a.bandkeep.yaml', '--no-fixes', '--root', root], options);
  };

  before(() => {
    folder = mkdtempSync(join(tmpdir(), 'lagoon-'));
    command = join(folder, 'bandkeep.js');
    buildSync({
      entryPoints: [join(__dirname, '..', '..', 'src', 'cli', 'main.ts')],
      outfile: command,
      bundle: true,
      platform: 'node',
      format: 'cjs',
      define: { BANDKEEP_VERSION: '"0.0.0-test"' },
      logLevel: 'error',
    });
    put('lagoon/specs/shared.bandkeep.yaml', shared);
    put('lagoon/tables/hash.csv', table);
    put('secret.csv', table);
    symlinkSync(join(folder, 'secret.csv'), join(folder, 'lagoon', 'tables', 'way-out.csv'));
    symlinkSync(join(folder, 'lagoon', 'tables', 'hash.csv'), join(folder, 'lagoon', 'tables', 'other-name.csv'));
    put('lagoon/tables/huge.csv', '');
    // A sparse file: it takes no room on the disk.
    truncateSync(join(folder, 'lagoon', 'tables', 'huge.csv'), 64 * 1024 * 1024 + 1);
  });
  after(() => {
    rmSync(folder, { recursive: true });
  });

  it('reads tables and used specs', () => {
    const { status, stdout, stderr } = check('../tables/hash.csv');
    assert.deepEqual([status, stderr], [0, ''], stdout);
    assert.match(stdout, /x: holds/);
  });

  it('follows a link that stays in the root', () => {
    assert.equal(check('../tables/other-name.csv').status, 0);
  });

  for (const [path, reason] of [
    ['../tables/way-out.csv', /`tables\/way-out\.csv`: it lies outside the root/],
    ['../../secret.csv', /leads out of the root/],
    ['../tables', /`tables`: it is a folder/],
    ['../tables/none.csv', /`tables\/none\.csv`: there is no such file/],
    ['../tables/hash.csv/x', /`tables\/hash\.csv\/x`: there is no such file/],
    ['../tables/huge.csv', /`tables\/huge\.csv` is larger than 64 MiB.*\[too-large\]/],
    ['..\\tables\\hash.csv', /parted by `\/`/],
  ] as const) {
    it(`refuses \`${path}\` and says why`, () => {
      const { status, stdout } = check(path);
      assert.equal(status, 1);
      assert.match(stdout, reason);
    });
  }
});
