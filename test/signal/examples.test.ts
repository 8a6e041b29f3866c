/** Every example in the documentation of src/signal is run, and gives what its comment says; no exported function goes without one. */
import assert from 'node:assert/strict';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { runInNewContext } from 'node:vm';
import { assertClose } from '../support/tolerance';

const root = join(import.meta.dirname, '../../src/signal');
const files = readdirSync(root, { recursive: true, encoding: 'utf8' })
  .filter((name) => name.endsWith('.ts'))
  .sort();

interface Documented {
  readonly name: string;
  readonly doc: string;
  readonly returns: string;
}

/** Exported functions with the documentation in front of them. */
function functionsOf(file: string): readonly Documented[] {
  const source = readFileSync(join(root, file), 'utf8');
  const pattern = /(\/\*\*(?:(?!\*\/)[\s\S])*\*\/\n)?export function (\w+)[\s\S]*?\): ([^\n]*) \{\n/g;
  return [...source.matchAll(pattern)].map(([, doc, name, returns]) => ({
    name: name ?? '',
    doc: doc ?? '',
    returns: returns ?? '',
  }));
}

async function everything(): Promise<Record<string, unknown>> {
  const modules = await Promise.all(files.map((file) => import(join(root, file)) as Promise<Record<string, unknown>>));
  return Object.assign({}, ...modules) as Record<string, unknown>;
}

/** One literal, read as JSON with single quotes and Infinity allowed. */
function literal(text: string): unknown {
  return runInNewContext(text);
}

function assertGives(actual: unknown, expected: unknown, what: string): void {
  if (typeof actual === 'number' && typeof expected === 'number') assertClose(actual, expected, 1e-6, what);
  else assert.equal(actual, expected, what);
}

describe('the documentation of the signal layer', () => {
  it('stands in front of every exported function, and in front of every other export', () => {
    assert.ok(files.length > 15);
    for (const file of files) {
      const source = readFileSync(join(root, file), 'utf8');
      assert.match(source, /^\/\*\* .* \*\/\n/, `${file} does not open with a sentence`);
      const exports = [...source.matchAll(/^(.*)\nexport (?!type \{|\{)/gm)];
      for (const [, before] of exports) assert.match(before ?? '', /\*\/$/, `${file}: an export without documentation`);
    }
  });

  for (const file of files) {
    for (const { name, doc, returns } of functionsOf(file)) {
      if (returns === 'void') continue;
      it(`runs the example of ${name} (${file})`, async () => {
        const [, expression, result] = /@example (.*) \/\/ (.*?)(?: \*\/)?$/m.exec(doc) ?? [];
        assert.ok(expression !== undefined && result !== undefined, `${name} has no example`);
        const actual: unknown = runInNewContext(expression, { ...(await everything()) });
        assertGives(actual, literal(result.trim()), `${name}: ${expression}`);
      });
    }
  }
});
