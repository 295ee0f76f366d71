// Brings the document to the server, whatever happens on the way. Invariant: `pending` was made on `server`, and until its
// answer is known nothing else is sent, so that a lost answer can always be asked for again under the same saveId.
import { diffScenes, isEmptyDifference, type Scene } from '#shared/scene';
import type { DraftKeeper } from './draft-keeper';
import type { Draft, PendingSave } from './drafts';
import { merge, type Merged } from './merge';
import type { SaveAnswer, SaveDoor, ServerDocument } from './save-door';
import type { SaveState } from './types';

export interface AutosaveHost {
  readonly scene: () => Scene;
  readonly show: (state: SaveState) => void;
  /** Somebody else's changes came in. */
  readonly replace: (scene: Scene) => void;
  readonly onSaved: (saveNumber: number) => void;
}

export interface AutosaveParts {
  readonly host: AutosaveHost;
  readonly door: SaveDoor;
  readonly keeper: DraftKeeper;
  readonly draftId: string;
  readonly newId: () => string;
  readonly server: ServerDocument;
  readonly pending: PendingSave | null;
}

/** An edit waits this long for the next one, ms, but never longer than MOST_WAIT in all. */
const QUIET = 800;
const MOST_WAIT = 4000;
/** Waits before the next try, ms. */
const BACK_OFF = [1000, 2000, 4000, 8000, 15_000, 30_000] as const;

export class Autosave {
  private server: ServerDocument;
  private pending: PendingSave | null;
  private disputed: ServerDocument | null = null;
  private trouble: string | null = null;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private unsavedSince: number | null = null;
  private tries = 0;
  private isClosed = false;
  /** The highest save number that was heard of. */
  private latest: number;
  private isReading = false;
  private underWay: Promise<void> | null = null;
  /** The save id of the save to come, in its draft from the first edit on: a page that goes away has no time to write again. */
  private nextId: string | null = null;
  /** A save of an earlier sitting may have held more than its draft: before anything is built on it, it is read. */
  private isUnsure: boolean;

  constructor(private readonly parts: AutosaveParts) {
    this.server = parts.server;
    this.pending = parts.pending;
    this.latest = parts.server.saveNumber;
    this.isUnsure = parts.pending !== null;
  }

  /** The document changed here. */
  changed(): void {
    void this.keep();
    if (this.disputed !== null) return this.showConflict();
    this.unsavedSince ??= Date.now();
    if (this.pending === null && this.trouble === null) this.parts.host.show(this.state('unsaved'));
    if (this.underWay !== null || this.pending !== null) return;
    const longest = Math.max(0, this.unsavedSince + MOST_WAIT - Date.now());
    this.schedule(Math.min(QUIET, longest));
  }

  /** Sends what there is now. */
  flush(isLast = false): Promise<void> {
    if (this.disputed !== null) return Promise.resolve();
    this.underWay ??= this.send(isLast).finally(() => {
      this.underWay = null;
      this.goOn();
    });
    return this.underWay;
  }

  /** The way to the server may be open again. */
  retry(): void {
    if (this.trouble === null) return;
    this.tries = 0;
    void this.flush();
  }

  /** The server had got this far when the document was read. */
  knows(saveNumber: number): void {
    this.latest = Math.max(this.latest, saveNumber);
  }

  /** Keeps the draft as it is now. */
  keepNow(): Promise<void> {
    return this.keep();
  }

  /** Another tab saved. */
  heard(saveNumber: number): void {
    this.latest = Math.max(this.latest, saveNumber);
    if (this.latest > this.server.saveNumber) void this.refresh();
  }

  /** Looks whether somebody else saved. While a save is under way its own answer tells. */
  async refresh(): Promise<void> {
    if (this.isReading || this.isBusy()) return;
    this.isReading = true;
    try {
      const document = await this.parts.door.read();
      if (!this.isBusy() && document.saveNumber !== this.server.saveNumber) this.takeIn(document);
    } catch {
      // nothing is lost by not knowing yet: the next save finds out
    } finally {
      this.isReading = false;
    }
  }

  /** A newer document of the server: puts mine on top of it, or asks. */
  takeIn(document: ServerDocument): void {
    this.latest = Math.max(this.latest, document.saveNumber);
    this.isUnsure = false;
    const { host } = this.parts;
    const merged = merge(this.server.scene, host.scene(), document.scene);
    if (merged.kind === 'merged') {
      this.server = document;
      host.replace(merged.scene);
      this.unsavedSince = null;
      this.rest();
      return;
    }
    this.disputed = document;
    clearTimeout(this.timer);
    void this.keep();
    this.showConflict();
  }

  /** Ends a conflict; null if there is none. What to show is the host's. */
  settled(): Merged | null {
    const document = this.disputed;
    if (document === null) return null;
    const merged = merge(this.server.scene, this.parts.host.scene(), document.scene);
    this.disputed = null;
    this.server = document;
    return merged;
  }

  /** Ends the sitting: one last try, and what does not go up stays as a draft. */
  async close(): Promise<void> {
    this.isClosed = true;
    clearTimeout(this.timer);
    await (this.underWay ?? Promise.resolve());
    // an edit may have come while the one before was sent
    for (let turn = 0; turn < 2 && this.canSend(); turn += 1) await this.flush();
  }

  /** Shows where things stand once nothing is under way, and sees to what is left. */
  rest(): void {
    if (this.disputed !== null) return this.showConflict();
    if (this.isUnsure && this.pending === null) {
      this.parts.host.show(this.state(this.trouble === null ? 'saving' : 'offline'));
      if (this.underWay === null && this.trouble === null) this.schedule(0);
      return;
    }
    if (this.hasUnsaved()) {
      void this.keep();
      this.parts.host.show(this.state(this.trouble === null ? 'unsaved' : 'offline'));
      if (this.underWay === null && this.trouble === null) this.schedule(QUIET);
      return;
    }
    this.trouble = null;
    this.unsavedSince = null;
    clearTimeout(this.timer);
    void this.parts.keeper.drop();
    this.parts.host.show(this.state('saved'));
    if (this.latest > this.server.saveNumber) void this.refresh();
  }

  private async send(isLast: boolean): Promise<void> {
    clearTimeout(this.timer);
    const { host, door } = this.parts;
    if (this.isUnsure && this.pending === null && !(await this.makeSure())) return;
    if (!this.hasUnsaved()) return;
    this.pending ??= this.saveToCome();
    this.nextId = null;
    this.unsavedSince = null;
    const { pending, server } = this;
    if (this.trouble === null) host.show(this.state('saving'));
    // the draft first: whatever happens to the request, the same saveId can be sent again after a restart
    const kept = this.keep();
    if (!isLast) await kept;
    const difference = diffScenes(server.scene, pending.scene);
    this.answered(await door.send({ saveId: pending.saveId, base: pending.base, difference, isLast }), pending);
  }

  private async makeSure(): Promise<boolean> {
    try {
      this.takeIn(await this.parts.door.read());
      this.trouble = null;
      return this.disputed === null;
    } catch (error) {
      this.trouble = this.parts.door.say(error);
      return false;
    }
  }

  private saveToCome(): PendingSave {
    this.nextId ??= this.parts.newId();
    return { saveId: this.nextId, base: this.server.saveNumber, scene: this.parts.host.scene() };
  }

  private answered(answer: SaveAnswer, sent: PendingSave): void {
    switch (answer.kind) {
      case 'saved':
        this.server = { saveNumber: answer.saveNumber, scene: sent.scene };
        this.pending = null;
        this.trouble = null;
        this.tries = 0;
        this.parts.host.onSaved(answer.saveNumber);
        break;
      case 'newer':
        this.pending = null;
        this.trouble = null;
        this.tries = 0;
        this.takeIn(answer);
        break;
      case 'lost':
        this.trouble = answer.reason;
        break;
      case 'refused':
        // nothing was carried out, so the next save may be another one
        this.pending = null;
        this.trouble = answer.reason;
        break;
    }
  }

  /** After a save came to an end, one way or the other. */
  private goOn(): void {
    this.rest();
    if (this.trouble === null || this.isClosed) return;
    const wait = BACK_OFF[Math.min(this.tries, BACK_OFF.length - 1)]!;
    this.tries += 1;
    this.schedule(wait);
  }

  private hasUnsaved(): boolean {
    if (this.pending !== null) return true;
    const now = this.parts.host.scene();
    return now !== this.server.scene && !isEmptyDifference(diffScenes(this.server.scene, now));
  }

  private canSend(): boolean {
    return this.disputed === null && this.trouble === null && this.hasUnsaved();
  }

  private isBusy(): boolean {
    return this.underWay !== null || this.pending !== null || this.disputed !== null;
  }

  private schedule(wait: number): void {
    clearTimeout(this.timer);
    if (!this.isClosed) this.timer = setTimeout(() => void this.flush(), wait);
  }

  private keep(): Promise<void> {
    const { keeper, draftId, host } = this.parts;
    const { saveNumber: base, scene: baseScene } = this.server;
    const pending = this.pending ?? this.saveToCome();
    const draft: Draft = { id: draftId, base, baseScene, pending, scene: host.scene() };
    return keeper.keep(draft);
  }

  private state(kind: 'saved' | 'unsaved' | 'saving' | 'offline'): SaveState {
    const { saveNumber } = this.server;
    return kind === 'offline' ? { kind, saveNumber, reason: this.trouble ?? '' } : { kind, saveNumber };
  }

  private showConflict(): void {
    const document = this.disputed;
    if (document === null) return;
    const merged = merge(this.server.scene, this.parts.host.scene(), document.scene);
    if (merged.kind === 'merged') {
      // an edit since has taken back what was disputed
      this.disputed = null;
      this.takeIn(document);
      return;
    }
    const { mine, theirs, records } = merged;
    this.parts.host.show({ kind: 'conflict', saveNumber: this.server.saveNumber, mine, theirs, records });
  }
}
