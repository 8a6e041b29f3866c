/** The panel's page: one webview, its HTML set once, spoken to only in checked messages. */
import * as vscode from 'vscode';
import { panelHtml } from '../../protocol/panel-html';
import { isPageMessage, type HostMessage, type PageMessage } from '../../protocol/panel-messages';

/** The view type, which also names the activation event. */
export const viewType = 'bandkeep.panel';

/** What a page tells its owner. */
export interface PageEvents {
  message(message: PageMessage): void;
  closed(): void;
  /** Something arrived that no page of ours would say. */
  refused(): void;
}

/** One page from its opening to its end. */
export class Page {
  private constructor(private readonly view: vscode.WebviewPanel) {}

  /** A new page beside the editor, which keeps the focus. */
  static open(extensionUri: vscode.Uri, events: PageEvents): Page {
    const place = { viewColumn: vscode.ViewColumn.Beside, preserveFocus: true };
    return Page.adopt(
      vscode.window.createWebviewPanel(viewType, 'Bandkeep', place, { enableFindWidget: true }),
      extensionUri,
      events,
    );
  }

  /** A page that the editor has brought back after a reload. */
  static adopt(view: vscode.WebviewPanel, extensionUri: vscode.Uri, events: PageEvents): Page {
    const files = vscode.Uri.joinPath(extensionUri, 'dist');
    view.iconPath = {
      light: vscode.Uri.joinPath(extensionUri, 'media', 'file-light.svg'),
      dark: vscode.Uri.joinPath(extensionUri, 'media', 'file-dark.svg'),
    };
    view.webview.options = { enableScripts: true, enableForms: false, enableCommandUris: false, localResourceRoots: [files] };
    view.webview.onDidReceiveMessage((message: unknown) => {
      if (isPageMessage(message)) events.message(message);
      else events.refused();
    });
    view.onDidDispose(() => {
      events.closed();
    });
    const uri = (name: string): string => view.webview.asWebviewUri(vscode.Uri.joinPath(files, name)).toString();
    const { cspSource } = view.webview;
    view.webview.html = panelHtml({ cspSource, nonce: nonce(), scriptUri: uri('panel.js'), styleUri: uri('panel.css') });
    return new Page(view);
  }

  get visible(): boolean {
    return this.view.visible;
  }

  set title(title: string) {
    if (this.view.title !== title) this.view.title = title;
  }

  /** Brings it to the front without taking the focus. */
  reveal(): void {
    this.view.reveal(undefined, true);
  }

  /** Nothing can be said to a hidden page; the workbench makes it anew when it is shown, and it then says `ready`. */
  say(message: HostMessage): void {
    if (this.view.visible) void this.view.webview.postMessage(message);
  }

  close(): void {
    this.view.dispose();
  }
}

function nonce(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
