/** Reads a text with the TextMate grammar, as the editor does, and gives each token with the innermost scope it got. */
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { INITIAL, parseRawGrammar, Registry, type IGrammar } from 'vscode-textmate';
import { createOnigScanner, createOnigString, loadWASM } from 'vscode-oniguruma';

const grammarPath = new URL('../../syntaxes/bandkeep.tmLanguage.json', import.meta.url);

/** One token of a text: its characters without surrounding blanks, and its scope without the language's own suffix. */
export interface Token {
  readonly text: string;
  readonly scope: string;
}

/** Loads the grammar; the test keeps it for all its texts. */
export async function loadGrammar(): Promise<IGrammar> {
  const wasm = createRequire(import.meta.url).resolve('vscode-oniguruma/release/onig.wasm');
  await loadWASM(readFileSync(wasm));
  const registry = new Registry({
    onigLib: Promise.resolve({ createOnigScanner, createOnigString }),
    loadGrammar: () => Promise.resolve(parseRawGrammar(readFileSync(grammarPath, 'utf8'), 'bandkeep.tmLanguage.json')),
  });
  const grammar = await registry.loadGrammar('source.bandkeep');
  if (grammar === null) throw new Error('The grammar was not found.');
  return grammar;
}

/** All tokens of a text that have a scope of their own; blanks are left out. */
export function tokensOf(grammar: IGrammar, text: string): Token[] {
  const tokens: Token[] = [];
  let state = INITIAL;
  for (const line of text.split('\n')) {
    const { tokens: found, ruleStack } = grammar.tokenizeLine(line, state);
    state = ruleStack;
    for (const { startIndex, endIndex, scopes } of found) {
      const scope = (scopes.at(-1) ?? '').replace(/\.bandkeep$/, '');
      const piece = line.slice(startIndex, endIndex).trim();
      if (piece !== '' && scope !== 'source') tokens.push({ text: piece, scope });
    }
  }
  return tokens;
}

/** The scope of the first token with exactly this text, or null. */
export function scopeOf(tokens: readonly Token[], text: string): string | null {
  return tokens.find((token) => token.text === text)?.scope ?? null;
}
