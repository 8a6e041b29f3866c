/** Quick fixes: what is offered where, in which order, and what it does to the text. */
import assert from 'node:assert/strict';
import type { CodeAction, Range, TextEdit } from 'vscode-languageserver-types';
import { codeActions, diagnostics } from '../../src/language';
import { ableEditor, offsetIn, opened, openedAndProved, plainAbilities, type Opened } from '../support/language-document';
import { passingSpec } from '../support/spec-texts';

const options = { abilities: ableEditor, docsBase: null };
const aliasing = passingSpec.replace('divide: 384', 'divide: 480').replace('40 kHz ..', '¦40 kHz ..');
const whole: Range = { start: { line: 0, character: 0 }, end: { line: 1000, character: 0 } };

const atCursor = ({ document, cursor }: Opened, abilities = ableEditor): CodeAction[] =>
  codeActions(document, { range: { start: cursor, end: cursor }, only: null, invoked: true }, { ...options, abilities });

/** The text with an action's edits made, a snippet's placeholder left as it stands. */
function after({ text }: Opened, action: CodeAction): string {
  const change = action.edit?.documentChanges?.[0];
  const edits = change !== undefined && 'edits' in change ? change.edits : Object.values(action.edit?.changes ?? {}).flat();
  return edits
    .map((edit): TextEdit =>
      'snippet' in edit ? { range: edit.range, newText: edit.snippet.value.replace(/\$\{1:([^}]*)\}/, '$1') } : edit,
    )
    .sort((a, b) => offsetIn(text, b.range.start) - offsetIn(text, a.range.start))
    .reduce(
      (result, { range, newText }) =>
        result.slice(0, offsetIn(text, range.start)) + newText + result.slice(offsetIn(text, range.end)),
      text,
    );
}

const codesOf = (text: string): unknown[] => diagnostics(opened(text).document, options).map(({ code }) => code);

describe('quick fixes', () => {
  it('clear the finding they are offered for, every one of them', () => {
    const all = openedAndProved(aliasing);
    const fixes = atCursor(all).filter(({ title }) => !title.startsWith('Accept'));
    assert.ok(fixes.length >= 1 && fixes.length <= 5, `${fixes.length} fixes`);
    for (const fix of fixes) assert.ok(!codesOf(after(all, fix)).includes('alias-over-limit'), fix.title);
  });

  it('say what they change and the margin they leave', () => {
    const [first] = atCursor(openedAndProved(aliasing));
    assert.match(first?.title ?? '', /alias margin \d/);
  });

  it('prefer the first proved one, and no other', () => {
    const actions = atCursor(openedAndProved(aliasing));
    assert.deepEqual(
      actions.map(({ isPreferred }) => isPreferred === true),
      actions.map((_, index) => index === 0),
    );
  });

  it('are tied to the diagnostic they cure', () => {
    const all = openedAndProved(aliasing);
    const shown = diagnostics(all.document, options);
    for (const { diagnostics: tied } of atCursor(all))
      assert.deepEqual(
        tied,
        shown.filter(({ code }) => code === 'alias-over-limit'),
      );
  });

  it('offer only what is proved by then', () => {
    const actions = atCursor(opened(aliasing));
    assert.deepEqual(
      actions.map(({ title }) => title),
      ['Accept this finding (`alias-over-limit`)'],
    );
  });

  it('are kept to the kinds that are asked for', () => {
    const { document } = openedAndProved(aliasing);
    const of = (only: string[]): CodeAction[] => codeActions(document, { range: whole, only, invoked: true }, options);
    assert.deepEqual(of(['source']), []);
    assert.deepEqual(of(['quickfix.something']), []);
    assert.ok(of(['quickfix']).length > 0);
    assert.equal(of(['']).length, of(['quickfix']).length);
  });

  it('are kept to the range that is asked for', () => {
    const { document } = openedAndProved(aliasing);
    const elsewhere = { start: { line: 0, character: 0 }, end: { line: 1, character: 0 } };
    assert.deepEqual(codeActions(document, { range: elsewhere, only: null, invoked: true }, options), []);
  });

  it('name the version they are meant for where the editor can tell', () => {
    const [versioned] = atCursor(openedAndProved(aliasing));
    const [change] = versioned?.edit?.documentChanges ?? [];
    assert.deepEqual(change && 'textDocument' in change ? change.textDocument : null, {
      uri: 'file:///lagoon/gate.bandkeep.yaml',
      version: 1,
    });
    const [plain] = atCursor(openedAndProved(aliasing), plainAbilities);
    assert.deepEqual(Object.keys(plain?.edit?.changes ?? {}), ['file:///lagoon/gate.bandkeep.yaml']);
  });

  it('cure a fault of the text', () => {
    const all = opened(passingSpec.replace('level: -3 dBFS', 'level: ¦-3 dBfs'));
    const [cure] = atCursor(all);
    assert.ok(cure);
    assert.equal(after(all, cure), passingSpec);
  });

  it('remove an acceptance that accepts nothing, with its line', () => {
    const all = opened(passingSpec.replace('    bits: 16', '    # ¦bandkeep: accept snr-short, agreed\n    bits: 16'));
    const [cure] = atCursor(all);
    assert.equal(cure?.title, 'Remove this acceptance');
    assert.equal(after(all, cure), passingSpec);
  });

  it('say why there is none, to who opens the menu', () => {
    const impossible = passingSpec.replace('flatness: 0.8 dB', 'flatness: ¦0.0001 dB').replace('divide: 384 }', 'divide: 480 }');
    const all = openedAndProved(impossible);
    const disabled = atCursor(all).filter((action) => action.disabled !== undefined);
    const fixes = atCursor(all).filter((action) => action.isPreferred === true);
    assert.equal(disabled.length + fixes.length, 1);
    assert.ok(disabled.every(({ disabled: why }) => (why?.reason ?? '').length > 20));
  });
});

describe('accepting a finding', () => {
  it('clears it, with a bound just below the margin it has now', () => {
    const all = openedAndProved(aliasing);
    const accept = atCursor(all).find(({ title }) => title.startsWith('Accept'));
    assert.ok(accept);
    const text = after(all, accept);
    assert.match(text, /^ {6}# bandkeep: accept alias-over-limit down to -\d+(\.\d+)? dB, say why\n {6}- \{ name: drive hash/m);
    assert.deepEqual(codesOf(text), []);
  });

  it('leaves the reason selected where the editor can do that, and plain where it cannot', () => {
    const accept = (abilities = ableEditor): string =>
      JSON.stringify(atCursor(opened(aliasing), abilities).find(({ title }) => title.startsWith('Accept'))?.edit);
    assert.match(accept(), /\$\{1:say why\}/);
    assert.match(accept(plainAbilities), /, say why/);
    assert.doesNotMatch(accept(plainAbilities), /\$/);
  });

  it('is not offered for faults of the text', () => {
    const actions = atCursor(opened(passingSpec.replace('bits: 16', 'bits: ¦sixteen')));
    assert.ok(!actions.some(({ title }) => title.startsWith('Accept')));
  });
});
