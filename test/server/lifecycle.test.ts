/** The server as a process: how it starts, what it says of itself, how it ends. */
import assert from 'node:assert/strict';
import { fork, spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import type { InitializeResult } from 'vscode-languageserver/node';
import { buildServer, LanguageClient, plainEditor, pullingEditor } from '../support/language-client';
import { passingSpec } from '../support/spec-texts';

async function codeOf(child: ChildProcess): Promise<number | null> {
  const [code] = (await once(child, 'exit')) as [number | null];
  return code;
}

describe('the server process', () => {
  let server = '';
  before(() => {
    server = buildServer();
  });

  it('offers what it can do, in UTF-16 and with incremental changes', async () => {
    const client = new LanguageClient(server);
    const { capabilities, serverInfo } = await client.initialize(pullingEditor);
    assert.equal(capabilities.positionEncoding, 'utf-16');
    assert.deepEqual(capabilities.textDocumentSync, { openClose: true, change: 2 });
    assert.deepEqual(capabilities.diagnosticProvider, {
      identifier: 'bandkeep',
      interFileDependencies: true,
      workspaceDiagnostics: false,
    });
    assert.deepEqual(serverInfo, { name: 'bandkeep', version: '0.0.0-test' });
    assert.equal(await client.stop(), 0);
  });

  it('does not offer to be asked for diagnostics where the client only takes them', async () => {
    const client = new LanguageClient(server);
    const { capabilities } = await client.initialize(plainEditor);
    assert.equal(capabilities.diagnosticProvider, undefined);
    assert.equal(await client.stop(), 0);
  });

  it('exits with 0 after shutdown', async () => {
    const client = new LanguageClient(server);
    await client.initialize(plainEditor);
    assert.equal(await client.stop(), 0);
    assert.equal(client.errors, '');
  });

  it('exits with 1 where nobody has asked it to shut down', async () => {
    const client = new LanguageClient(server);
    await client.initialize(plainEditor);
    assert.equal(await client.exit(), 1);
  });

  it('goes when its input ends', async () => {
    const child = spawn(process.execPath, [server, '--stdio'], { stdio: 'pipe' });
    child.stdin.end();
    assert.equal(await codeOf(child), 1);
  });

  it('says how it is started where it is started wrongly, and prints nothing to its output', async () => {
    const child = spawn(process.execPath, [server], { stdio: 'pipe' });
    let [out, err] = ['', ''];
    child.stdout.on('data', (chunk: Buffer) => (out += chunk.toString('utf8')));
    child.stderr.on('data', (chunk: Buffer) => (err += chunk.toString('utf8')));
    assert.equal(await codeOf(child), 2);
    assert.equal(out, '');
    assert.match(err, /--stdio/);
  });

  it('speaks over IPC to the process that made it', async () => {
    const child = fork(server, ['--node-ipc'], { stdio: 'pipe' });
    const ask = async (message: object): Promise<unknown> => {
      child.send(message);
      const [answer] = (await once(child, 'message')) as [unknown];
      return answer;
    };
    const params = { processId: process.pid, rootUri: null, capabilities: {} };
    const answer = (await ask({ jsonrpc: '2.0', id: 1, method: 'initialize', params })) as { result: InitializeResult };
    assert.equal(answer.result.capabilities.hoverProvider, true);
    await ask({ jsonrpc: '2.0', id: 2, method: 'shutdown' });
    const exited = codeOf(child);
    child.send({ jsonrpc: '2.0', method: 'exit' });
    assert.equal(await exited, 0);
  });

  it('writes nothing but messages to its output', async () => {
    const child = spawn(process.execPath, [server, '--stdio'], { stdio: 'pipe' });
    let out = Buffer.alloc(0);
    child.stdout.on('data', (chunk: Buffer) => (out = Buffer.concat([out, chunk])));
    const exited = codeOf(child);
    const textDocument = { uri: 'file:///gate.bandkeep.yaml', languageId: 'bandkeep', version: 1, text: passingSpec };
    const line = passingSpec.split('\n').findIndex((each) => each.startsWith('    rate:'));
    const send = (message: object): void => {
      const body = Buffer.from(JSON.stringify({ jsonrpc: '2.0', ...message }));
      child.stdin.write(Buffer.concat([Buffer.from(`Content-Length: ${body.length}\r\n\r\n`), body]));
    };
    // All at once, without waiting for an answer: what comes before the server has loaded all of itself must not be lost.
    send({ id: 1, method: 'initialize', params: { processId: null, rootUri: null, capabilities: {} } });
    send({ method: 'initialized', params: {} });
    send({ method: 'textDocument/didOpen', params: { textDocument } });
    send({ id: 2, method: 'textDocument/hover', params: { textDocument, position: { line, character: 4 } } });
    send({ id: 3, method: 'shutdown' });
    while (!out.includes('"id":3')) await once(child.stdout, 'data');
    send({ method: 'exit' });
    assert.equal(await exited, 0);
    const answers = messagesIn(out);
    assert.match(JSON.stringify(answers.find(({ id }) => id === 2)), /64 kHz/);
    assert.deepEqual(answers.flatMap((message) => (message.id === undefined ? [] : [message.id])).sort(), [1, 2, 3]);
  });
});

/** Takes the output apart; throws on anything that is not a message. */
function messagesIn(bytes: Buffer): { id?: number }[] {
  const messages: { id?: number }[] = [];
  for (let rest = bytes; rest.length > 0;) {
    const end = rest.indexOf('\r\n\r\n');
    const header = rest.subarray(0, end).toString('ascii');
    const length = Number(/^Content-Length: (\d+)$/.exec(header)?.[1]);
    if (end < 0 || !Number.isFinite(length)) throw new Error(`Not a message: ${rest.toString('utf8').slice(0, 200)}`);
    messages.push(JSON.parse(rest.subarray(end + 4, end + 4 + length).toString('utf8')) as { id?: number });
    rest = rest.subarray(end + 4 + length);
  }
  return messages;
}
