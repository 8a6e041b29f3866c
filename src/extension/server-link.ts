/** The language server as the rest of the extension sees it: started, restarted, and asked our own questions with checked answers. */
import * as vscode from 'vscode';
import { State, type BaseLanguageClient } from 'vscode-languageclient';
import { isPlaceName, isRecord, isText } from '../protocol/guards';
import { isPicture } from '../protocol/picture-guard';
import type { PlaceName, Range } from '../protocol/position';
import {
  leaningNotification,
  locateRequest,
  pictureRequest,
  placeAtRequest,
  readFileRequest,
  type LocateParams,
  type PictureParams,
  type PictureResult,
  type PlaceAtParams,
} from '../protocol/requests';
import { readFile } from './read-file';

/** Whether the server can be asked. */
export type ServerState = 'starting' | 'ready' | 'stopped';

/** Wraps a language client; every question waits until the server runs. */
export class ServerLink implements vscode.Disposable {
  private readonly changed = new vscode.EventEmitter<ServerState>();
  /** Fires when the server starts, is ready, or has ended. */
  readonly onDidChangeState = this.changed.event;

  private readonly leaned = new vscode.EventEmitter<readonly string[]>();
  /** Fires with the URIs of open specs that lean on a file which has changed. */
  readonly onDidChangeFiles = this.leaned.event;

  constructor(private readonly client: BaseLanguageClient) {
    client.onDidChangeState(({ newState }) => {
      this.changed.fire(stateOf(newState));
    });
    client.onRequest(readFileRequest, readFile);
    client.onNotification(leaningNotification, (params: unknown) => {
      if (isRecord(params) && isTexts(params['uris'])) this.leaned.fire(params['uris']);
    });
  }

  get state(): ServerState {
    return stateOf(this.client.state);
  }

  start(): Promise<void> {
    return this.client.start();
  }

  /** Ends the server, if it still runs, and starts a new one. */
  async restart(): Promise<void> {
    if (this.client.needsStop()) await this.client.stop();
    await this.client.start();
  }

  /** The picture of a channel, or why there is none. */
  async picture(params: PictureParams): Promise<PictureResult> {
    const answer = await this.ask(pictureRequest, params);
    if (!isPictureResult(answer)) throw new Error('The server sent a picture that cannot be drawn.');
    return answer;
  }

  /** Where a place stands in the newest text; null where it no longer does. */
  async locate(params: LocateParams): Promise<Range | null> {
    const answer = await this.ask(locateRequest, params);
    return isRange(answer) ? answer : null;
  }

  /** The innermost place at a position; null where there is none. */
  async placeAt(params: PlaceAtParams): Promise<PlaceName | null> {
    const answer = await this.ask(placeAtRequest, params);
    return isPlaceName(answer) ? answer : null;
  }

  async dispose(): Promise<void> {
    this.changed.dispose();
    this.leaned.dispose();
    await this.client.dispose();
  }

  private async ask(method: string, params: unknown): Promise<unknown> {
    const answer: unknown = await this.client.sendRequest(method, params);
    return answer;
  }
}

function stateOf(state: State): ServerState {
  switch (state) {
    case State.Running:
      return 'ready';
    case State.Starting:
      return 'starting';
    case State.Stopped:
    case State.StartFailed:
    default:
      return 'stopped';
  }
}

function isPictureResult(value: unknown): value is PictureResult {
  if (!isRecord(value) || typeof value['version'] !== 'number') return false;
  if (value['kind'] === 'picture') return isPicture(value['picture']);
  return value['kind'] === 'none' && isText(value['reason']) && (value['channel'] === null || isText(value['channel']));
}

function isRange(value: unknown): value is Range {
  return isRecord(value) && isPosition(value['start']) && isPosition(value['end']);
}

function isPosition(value: unknown): boolean {
  return isRecord(value) && typeof value['line'] === 'number' && typeof value['character'] === 'number';
}

function isTexts(value: unknown): value is readonly string[] {
  return Array.isArray(value) && value.every(isText);
}
