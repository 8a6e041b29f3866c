/** The settings, read afresh each time they matter, so that a change applies at once. */
import * as vscode from 'vscode';

/** When the panel draws again. */
export type Redraw = 'onSave' | 'onType';

/** The panel's settings. */
export interface PanelSettings {
  readonly redraw: Redraw;
  readonly openAutomatically: boolean;
}

/** What the settings say now. */
export function panelSettings(): PanelSettings {
  const settings = vscode.workspace.getConfiguration('bandkeep.panel');
  return {
    redraw: settings.get('redraw') === 'onType' ? 'onType' : 'onSave',
    openAutomatically: settings.get('openAutomatically') === true,
  };
}
