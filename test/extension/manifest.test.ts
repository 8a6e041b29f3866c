import assert from 'node:assert/strict';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { isRecord } from '../../src/protocol/guards';

const root = new URL('../../', import.meta.url);
const text = (path: string): string => readFileSync(new URL(path, root), 'utf8');

function json(path: string): Record<string, unknown> {
  const value: unknown = JSON.parse(text(path));
  assert.ok(isRecord(value), path);
  return value;
}

/** Every string anywhere in a JSON value. */
function strings(value: unknown): string[] {
  if (typeof value === 'string') return [value];
  if (Array.isArray(value)) return value.flatMap(strings);
  return isRecord(value) ? Object.values(value).flatMap(strings) : [];
}

const manifest = json('package.json');
const words = json('package.nls.json');
const { contributes } = manifest;

describe('the manifest', () => {
  it('has a text for every placeholder, and no text that nobody shows', () => {
    const used = strings(manifest).flatMap((value) => /^%(.+)%$/.exec(value)?.[1] ?? []);
    assert.deepEqual(used.sort(), Object.keys(words).sort());
  });

  it('names only files that are there', () => {
    const named = strings(contributes).filter((value) => value.startsWith('./'));
    assert.ok(named.length >= 5);
    for (const path of [...named, 'media/icon.png', 'media/icon.svg']) assert.ok(existsSync(new URL(path, root)), path);
  });

  it('declares exactly the commands and settings that the extension uses', () => {
    const declared = strings(contributes).filter((value) => /^bandkeep\.[a-z]+[A-Z]\w+$/.test(value));
    const registered = [...text('src/extension/commands.ts').matchAll(/'(bandkeep\.\w+)':/g)].map(([, name]) => name);
    assert.deepEqual([...new Set(declared)].sort(), registered.sort());
  });

  it('wakes the extension for specs and for a panel that comes back', () => {
    assert.deepEqual(manifest['activationEvents'], ['onLanguage:bandkeep', 'onWebviewPanel:bandkeep.panel']);
  });

  it('is open to untrusted and virtual workspaces, since nothing of the workspace is run', () => {
    assert.deepEqual(manifest['capabilities'], { untrustedWorkspaces: { supported: true }, virtualWorkspaces: true });
  });

  it('warns that the tool is a design aid', () => {
    assert.match(String(words['description']), /design aid: verify on hardware/);
  });

  it('bundles everything: there is nothing to install beside it', () => {
    assert.equal(manifest['dependencies'], undefined);
  });

  it('does not ask for a newer editor than its types describe', () => {
    const { engines, devDependencies } = manifest;
    assert.ok(isRecord(engines) && isRecord(devDependencies));
    assert.equal(engines['vscode'], `^${String(devDependencies['@types/vscode'])}`);
  });
});

describe('the list of examples', () => {
  it('names every example in the folder and no other', () => {
    const listed = [...text('src/extension/examples.ts').matchAll(/file: '([^']+)'/g)].map(([, name]) => name);
    const all = readdirSync(new URL('examples', root), { recursive: true, encoding: 'utf8' });
    const present = all.map((name) => name.replaceAll('\\', '/')).filter((name) => name.endsWith('.bandkeep.yaml'));
    assert.deepEqual(listed.sort(), present.sort());
  });
});
