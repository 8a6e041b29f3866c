import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import { awake, codeOf, diagnosticsOnce, openCopy, positionOf, replace } from './editor';

const errorsOf = (diagnostics: readonly vscode.Diagnostic[]): string[] =>
  diagnostics.filter(({ severity }) => severity === vscode.DiagnosticSeverity.Error).map(codeOf);

/** The first quick fix that changes the design; asks again until its proof has come in. */
async function firstFix({ uri }: vscode.TextDocument, { range }: vscode.Diagnostic): Promise<vscode.CodeAction> {
  for (;;) {
    const kind = vscode.CodeActionKind.QuickFix.value;
    const actions = await vscode.commands.executeCommand<vscode.CodeAction[]>(
      'vscode.executeCodeActionProvider',
      uri,
      range,
      kind,
      20,
    );
    const fix = actions.find(({ title, edit }) => edit !== undefined && !title.startsWith('Accept'));
    if (fix !== undefined) return fix;
  }
}

describe('a spec in the editor', () => {
  let document: vscode.TextDocument;
  before(async () => {
    await awake();
    document = await openCopy('gate-bearing-broken', 'findings');
  });

  it('gets our language from its name', () => {
    assert.equal(document.languageId, 'bandkeep');
  });

  it('has its broken limits marked, each at the value to blame', async () => {
    const found = await diagnosticsOnce(
      document,
      (codes) => codes.includes('alias-over-limit') && codes.includes('flatness-over-limit'),
    );
    assert.deepEqual(errorsOf(found).sort(), ['alias-over-limit', 'flatness-over-limit']);
    const alias = found.find((diagnostic) => codeOf(diagnostic) === 'alias-over-limit');
    assert.ok(alias !== undefined);
    assert.equal(document.getText(alias.range), '40 kHz .. 3 MHz');
    assert.match(alias.message, /`drive hash` .* lands on .* over the alias limit of −96 dBFS/);
    assert.equal(alias.source, 'bandkeep');
  });

  it('links every finding to a page that comes with the extension', async () => {
    const found = await diagnosticsOnce(document, (codes) => codes.includes('alias-over-limit'));
    for (const { code } of found) {
      assert.ok(typeof code === 'object', 'the finding has no link');
      const page = await vscode.workspace.fs.readFile(code.target.with({ fragment: '' }));
      assert.match(new TextDecoder().decode(page), new RegExp(String(code.value)));
    }
  });

  it('answers when a line is hovered', async () => {
    const position = positionOf(document, '40 kHz .. 3 MHz');
    const hovers = await vscode.commands.executeCommand<vscode.Hover[]>('vscode.executeHoverProvider', document.uri, position);
    const parts = hovers.flatMap(({ contents }) =>
      contents.map((part) => (part instanceof vscode.MarkdownString ? part.value : '')),
    );
    const text = parts.join(' ');
    assert.match(text, /lands/);
    assert.match(text, /dBFS/);
  });

  it('has an outline with its channel', async () => {
    const symbols = await vscode.commands.executeCommand<vscode.DocumentSymbol[]>(
      'vscode.executeDocumentSymbolProvider',
      document.uri,
    );
    const names = (list: readonly vscode.DocumentSymbol[]): string[] =>
      list.flatMap(({ name, children }) => [name, ...names(children)]);
    assert.ok(names(symbols).includes('bearing-x'), names(symbols).join(', '));
  });

  it('completes the words of the language', async () => {
    const position = positionOf(document, 'butterworth, order');
    const list = await vscode.commands.executeCommand<vscode.CompletionList>(
      'vscode.executeCompletionItemProvider',
      document.uri,
      position,
    );
    const labels = list.items.map(({ label }) => (typeof label === 'string' ? label : label.label));
    assert.ok(labels.includes('chebyshev'), labels.join(', '));
  });

  it('is cured by the first fix offered for each broken limit in turn', async () => {
    for (const code of ['alias-over-limit', 'flatness-over-limit']) {
      const found = await diagnosticsOnce(document, (codes) => codes.length > 0);
      const broken = found.find((diagnostic) => codeOf(diagnostic) === code);
      if (broken === undefined) continue; // One fix may cure both.
      const fix = await firstFix(document, broken);
      assert.ok(fix.edit !== undefined);
      assert.match(fix.title, /margin/);
      assert.ok(await vscode.workspace.applyEdit(fix.edit));
      await diagnosticsOnce(document, (codes) => !codes.includes(code));
    }
    const left = await diagnosticsOnce(document, (codes) => !codes.includes('flatness-over-limit'));
    assert.deepEqual(errorsOf(left), []);
  });

  it('is judged again at every change', async () => {
    await replace(document, 'flatness: 0.8 dB', 'flatness: 0.001 dB');
    const found = await diagnosticsOnce(document, (codes) => codes.includes('flatness-over-limit'));
    assert.deepEqual(errorsOf(found), ['flatness-over-limit']);
    await replace(document, 'flatness: 0.001 dB', 'flatness: 0.8 dB');
    await diagnosticsOnce(document, (codes) => !codes.includes('flatness-over-limit'));
  });

  it('is judged by a new server after a restart', async () => {
    await vscode.commands.executeCommand('bandkeep.restartServer');
    await replace(document, 'bits: 16', 'bitz: 16');
    await diagnosticsOnce(document, (codes) => codes.includes('unknown-key'));
  });
});
