import assert from 'node:assert/strict';
import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';

const script = join(__dirname, '..', '..', '..', 'scripts', 'start.mjs');

/** What `npm start` prints, up to and with the address it names. */
async function addressFrom(child: ChildProcess): Promise<string> {
  let printed = '';
  for await (const chunk of child.stdout ?? []) {
    printed += String(chunk);
    const address = /http:\/\/127\.0\.0\.1:\d+\/\S+/.exec(printed)?.[0];
    if (address !== undefined && printed.includes('Ctrl+C')) return address;
  }
  throw new Error(`It ended without an address:\n${printed}`);
}

describe('npm start', () => {
  it('serves the workbench on loopback to whoever has the token, and ends it with itself', async () => {
    const child = spawn(process.execPath, [script, '--workbench'], { stdio: ['ignore', 'pipe', 'inherit'] });
    const ended = once(child, 'exit');
    const address = new URL(await addressFrom(child));
    assert.equal(address.hostname, '127.0.0.1');
    assert.match(address.searchParams.get('tkn') ?? '', /^[0-9a-f]{32}$/);
    assert.match(address.searchParams.get('payload') ?? '', /gate-bearing-broken\.bandkeep\.yaml/);

    const welcome = await fetch(address, { redirect: 'manual' });
    assert.ok(welcome.status === 200 || welcome.status === 302, String(welcome.status));
    const stranger = await fetch(`${address.origin}/?folder=${String(address.searchParams.get('folder'))}`);
    assert.equal(stranger.status, 403);

    child.kill('SIGINT');
    await ended;
    await assert.rejects(fetch(address), 'the workbench still answers');
  });
});
