import assert from 'node:assert/strict';
import * as vscode from 'vscode';
import type { BandkeepApi } from '../../../src/extension/activation';
import { awake, next, openCopy, positionOf, replace } from './editor';

const panelTabs = (): vscode.Tab[] =>
  vscode.window.tabGroups.all.flatMap(({ tabs }) =>
    tabs.filter(({ input }) => input instanceof vscode.TabInputWebview && input.viewType.includes('bandkeep.panel')),
  );

describe('the panel', () => {
  let api: BandkeepApi;
  let document: vscode.TextDocument;
  before(async () => {
    api = await awake();
    document = await openCopy('gate-bearing', 'panel');
  });

  it('opens beside the editor, draws the channel, and leaves the focus where it was', async () => {
    const drawn = next(api.onDidDraw);
    await vscode.commands.executeCommand('bandkeep.showPanel');
    const { channel, sections, items } = await drawn;
    assert.equal(channel, 'bearing-x');
    assert.ok(sections >= 2, `${sections} sections`);
    assert.ok(items >= 4, `${items} items`);
    assert.equal(vscode.window.activeTextEditor?.document, document);
    assert.equal(panelTabs()[0]?.group.viewColumn, vscode.ViewColumn.Two);
  });

  it('stays one panel when it is asked for again', async () => {
    await vscode.commands.executeCommand('bandkeep.showPanel', document.uri);
    assert.equal(panelTabs().length, 1);
  });

  it('draws again at a save', async () => {
    await replace(document, 'level: -3 dBFS', 'level: -4 dBFS');
    const drawn = next(api.onDidDraw);
    assert.ok(await document.save());
    assert.ok((await drawn).sequence > 1);
    assert.equal(api.staleReason(), null);
  });

  it('keeps the last picture and says why while the channel is broken', async () => {
    await replace(document, 'bits: 16', 'bits: sixteen');
    const stale = next(api.onDidGoStale);
    await document.save();
    assert.match(await stale, /bearing-x/);
    assert.equal(api.staleReason(), await stale);
    await replace(document, 'bits: sixteen', 'bits: 16');
    const drawn = next(api.onDidDraw);
    await document.save();
    await drawn;
    assert.equal(api.staleReason(), null);
  });

  it('draws while typing where the setting asks for it', async () => {
    const settings = vscode.workspace.getConfiguration('bandkeep.panel');
    await settings.update('redraw', 'onType', vscode.ConfigurationTarget.Workspace);
    const drawn = next(api.onDidDraw);
    await replace(document, 'level: -4 dBFS', 'level: -3 dBFS');
    await drawn;
    assert.ok(document.isDirty);
    await settings.update('redraw', undefined, vscode.ConfigurationTarget.Workspace);
    await document.save();
  });

  it('follows the reader to another spec', async () => {
    const drawn = next(api.onDidDraw, ({ channel }) => channel !== 'bearing-x');
    const other = await openCopy('fish-sounder', 'other');
    const { channel } = await drawn;
    assert.ok(channel !== null && other.getText().includes(`${channel}:`), String(channel));
  });

  it('follows the cursor from channel to channel', async () => {
    const two = await openCopy('gate-bearing', 'two');
    const drawn = next(api.onDidDraw, ({ channel }) => channel === 'bearing-y');
    const editor = await vscode.window.showTextDocument(two, { viewColumn: vscode.ViewColumn.One });
    const inside = positionOf(two, 'ref: GB-8');
    editor.selection = new vscode.Selection(inside, inside);
    assert.equal((await drawn).channel, 'bearing-y');
  });

  it('shows the newest picture when it comes out from behind another tab', async () => {
    const covering = await vscode.workspace.openTextDocument({ content: 'in front of the panel' });
    await vscode.window.showTextDocument(covering, { viewColumn: vscode.ViewColumn.Two });
    assert.equal(panelTabs()[0]?.isActive, false);
    const drawn = next(api.onDidDraw);
    await vscode.commands.executeCommand('bandkeep.showPanel', document.uri);
    assert.equal((await drawn).channel, 'bearing-x');
    assert.equal(panelTabs()[0]?.isActive, true);
  });

  it('is gone after it is closed, and draws afresh when it is opened again', async () => {
    await vscode.window.tabGroups.close(panelTabs());
    assert.equal(panelTabs().length, 0);
    const drawn = next(api.onDidDraw);
    await vscode.commands.executeCommand('bandkeep.showPanel');
    await drawn;
    assert.equal(panelTabs().length, 1);
  });
});
