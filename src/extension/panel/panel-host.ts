/** The side panel from the extension's side: one page, the spec and channel it follows, and when it is told what. */
import * as vscode from 'vscode';
import type { PageMessage } from '../../protocol/panel-messages';
import type { PanelPicture } from '../../protocol/picture';
import type { PlaceName } from '../../protocol/position';
import type { PictureParams } from '../../protocol/requests';
import { coalesced } from '../coalesced';
import type { ServerLink } from '../server-link';
import { followItem } from './follow-item';
import { Newest } from './newest';
import { Page, type PageEvents } from './page';
import { saveExport } from './save-export';
import { cursorIn, subjectOf, type Subject } from './subject';

/** What the page says after it has painted a picture. */
export type Drawn = Extract<PageMessage, { kind: 'drawn' }> & { readonly channel: string | null };

/** Owns the page while there is one. */
export class PanelHost implements vscode.Disposable {
  private page: Page | null = null;
  private subject: Subject | null = null;
  private newest = new Newest();
  private lit: PlaceName | null = null;
  private readonly painted = new vscode.EventEmitter<Drawn>();
  /** Fires when the page has painted a picture. */
  readonly onDidDraw = this.painted.event;
  private readonly wentStale = new vscode.EventEmitter<string>();
  /** Fires with the reason when there is no picture of the newest text. */
  readonly onDidGoStale = this.wentStale.event;
  /** Draws the newest text; asks that come while it is busy become one more. */
  readonly redraw = coalesced(() => this.draw());
  /** Lights the item of the cursor's line, and draws the channel that the cursor has entered. */
  readonly followCursor = coalesced(() => this.light());

  constructor(
    private readonly extensionUri: vscode.Uri,
    private readonly link: ServerLink,
    private readonly log: vscode.LogOutputChannel,
  ) {}

  /** The spec that the panel shows; null where there is no panel. */
  get spec(): vscode.Uri | null {
    return this.page === null ? null : (this.subject?.spec ?? null);
  }

  /** Why the panel's picture is not of the newest text; null where it is. */
  get staleReason(): string | null {
    return this.newest.staleReason;
  }

  /** Opens the panel on a spec, or brings it to the front; the focus stays where it is. */
  async show(spec: vscode.Uri): Promise<void> {
    if (this.page === null) this.page = Page.open(this.extensionUri, this.events());
    else this.page.reveal();
    await this.follow(spec);
  }

  /** Takes over a page that the editor has brought back. */
  async revive(view: vscode.WebviewPanel, subject: Subject | null): Promise<void> {
    this.page?.close();
    this.subject = subject;
    this.page = Page.adopt(view, this.extensionUri, this.events());
    if (subject !== null) await this.redraw();
  }

  /** Turns the panel to another spec, if it is open. */
  async follow(spec: vscode.Uri): Promise<void> {
    if (this.page === null) return;
    if (this.subject?.spec.toString() !== spec.toString()) this.subject = subjectOf(spec);
    await this.redraw();
  }

  dispose(): void {
    this.page?.close();
    this.painted.dispose();
    this.wentStale.dispose();
  }

  private events(): PageEvents {
    return {
      message: (message) => {
        this.heard(message).catch((error: unknown) => {
          this.log.error(`The panel's "${message.kind}" failed: ${String(error)}`);
        });
      },
      closed: () => {
        this.page = null;
        this.subject = null;
        this.newest = new Newest();
        this.lit = null;
      },
      refused: () => {
        this.log.warn('The panel sent a message that is none of its own; it was dropped.');
      },
    };
  }

  private async heard(message: PageMessage): Promise<void> {
    const subject = this.subject;
    switch (message.kind) {
      case 'ready':
        this.repeat();
        return;
      case 'drawn':
        this.painted.fire({ ...message, channel: subject?.shown ?? null });
        return;
      case 'failed':
        this.log.error(`The panel could not draw: ${message.message}`);
        return;
      case 'request-refresh':
        await this.redraw();
        return;
      case 'pin':
        if (subject !== null) subject.pinned = message.channel;
        await this.redraw();
        return;
      case 'reveal':
        if (subject !== null) await followItem(this.link, subject.spec, message.place);
        return;
      case 'save':
        if (subject !== null) await saveExport(message, subject.spec);
        return;
    }
  }

  /** Says everything again to a page that was hidden or reloaded. */
  private repeat(): void {
    for (const message of this.newest.messages) this.page?.say(message);
    this.page?.say({ kind: 'lit', place: this.lit });
  }

  private async draw(): Promise<void> {
    const subject = this.subject;
    if (subject === null || this.page === null) return;
    const result = await this.pictureOf(subject);
    // Another spec may have come, or the page gone, while the server was busy.
    if (subject !== this.subject) return;
    if (typeof result === 'string') {
      this.page.say(this.newest.none(subject, result));
      this.wentStale.fire(result);
      return;
    }
    subject.shown = result.channel;
    this.page.title = `Bandkeep: ${result.channel}`;
    this.page.say(this.newest.picture(subject, result));
  }

  /** The picture, or the reason why there is none. */
  private async pictureOf(subject: Subject): Promise<PanelPicture | string> {
    try {
      // Opens the spec for the server where no editor has it, as after a reload.
      await vscode.workspace.openTextDocument(subject.spec);
      const result = await this.link.picture(await this.wanted(subject));
      return result.kind === 'picture' ? result.picture : result.reason;
    } catch (error) {
      this.log.error(`No picture of ${subject.spec.toString()}: ${String(error)}`);
      return `The spec could not be drawn: ${error instanceof Error ? error.message : String(error)}`;
    }
  }

  /** The channel that is held, else the cursor's, else (the cursor being among filters or clocks) the one shown already. */
  private async wanted({ spec, pinned, shown }: Subject): Promise<PictureParams> {
    const uri = spec.toString();
    const position = pinned === null ? cursorIn(spec) : null;
    const place = position === null ? null : await this.link.placeAt({ uri, position });
    return { uri, channel: pinned ?? place?.channel ?? shown, position: null };
  }

  private async light(): Promise<void> {
    const subject = this.subject;
    if (subject === null || this.page === null || !this.page.visible || this.link.state !== 'ready') return;
    const position = cursorIn(subject.spec);
    const place = position === null ? null : await this.link.placeAt({ uri: subject.spec.toString(), position });
    if (subject !== this.subject) return;
    this.lit = place;
    this.page.say({ kind: 'lit', place });
    const entered = place?.channel ?? null;
    if (entered !== null && subject.pinned === null && entered !== subject.shown) await this.redraw();
  }
}
