/** The page's one door to the extension: typed messages out, guarded messages in, and the state that survives a reload. */
import { isHostMessage } from '../protocol/panel-messages';
import type { HostMessage, PageMessage } from '../protocol/panel-messages';
import { readPanelState } from './view-state';
import type { PanelState } from './view-state';

/** What the workbench gives a panel's page. */
interface WorkbenchApi {
  postMessage(message: unknown): void;
  getState(): unknown;
  setState(state: unknown): void;
}

declare const acquireVsCodeApi: () => WorkbenchApi;

/** The extension as the page sees it. */
export interface Host {
  post: (message: PageMessage) => void;
  readState: () => PanelState;
  keepState: (state: PanelState) => void;
  listen: (take: (message: HostMessage) => void) => void;
}

/** Opens the door; may be called once in a page's life. */
export function openHost(): Host {
  const api = acquireVsCodeApi();
  return {
    post: (message) => {
      api.postMessage(message);
    },
    readState: () => readPanelState(api.getState()),
    keepState: (state) => {
      api.setState(state);
    },
    listen: (take) => {
      window.addEventListener('message', (event: MessageEvent<unknown>) => {
        if (isHostMessage(event.data)) take(event.data);
      });
    },
  };
}
