import type { Draft, PutDraftRequest } from '#common/schemas/lattice';
import {
  contentOf,
  isSameContent,
  type EditorContent,
} from '#client/features/cell-editor/model/editor-history.ts';
import { ApiError, hasCode, messageOf } from '#client/lib/api-error.ts';

/** How the edit stands with the server. */
export type KeeperStatus =
  | { readonly kind: 'clean' }
  | { readonly kind: 'waiting' }
  | { readonly kind: 'saving' }
  | { readonly kind: 'saved'; readonly atMs: number }
  | { readonly kind: 'offline' }
  | { readonly kind: 'failed'; readonly message: string }
  | { readonly kind: 'conflict'; readonly theirs: Draft };

/** What the keeper needs from the world; given in, so that tests need no network and no clock. */
export interface KeeperWorld {
  put: (body: PutDraftRequest, etag: string) => Promise<Draft>;
  read: () => Promise<Draft>;
  /** A copy on this device of what is not saved yet: survives a closed tab. */
  remember: (copy: UnsavedCopy | null) => void;
  now: () => number;
  onSaved: (draft: Draft) => void;
}

/** An edit that did not reach the server, and the version it was made on. */
export interface UnsavedCopy {
  readonly etag: string;
  readonly content: EditorContent;
}

const pauseMs = 800;
const retryMs = 4_000;

/** Saves an edit a moment after it is made, again when the connection is back, never over another's. */
export class DraftKeeper {
  private status: KeeperStatus = { kind: 'clean' };
  private etag: string;
  private saved: EditorContent;
  private wanted: EditorContent;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private running: Promise<void> | null = null;
  private readonly listeners = new Set<() => void>();

  constructor(
    draft: Draft,
    private readonly world: KeeperWorld,
  ) {
    this.etag = draft.etag;
    this.saved = contentOf(draft);
    this.wanted = this.saved;
    if (draft.isChanged && draft.updatedAt !== null) {
      this.status = { kind: 'saved', atMs: Date.parse(draft.updatedAt) };
    }
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly getStatus = (): KeeperStatus => this.status;

  get currentEtag(): string {
    return this.etag;
  }

  get hasUnsaved(): boolean {
    return !isSameContent(this.saved, this.wanted);
  }

  /** Takes note of an edit and saves it once the typing pauses. */
  change(content: EditorContent): void {
    this.wanted = content;
    if (!this.hasUnsaved) {
      this.world.remember(null);
      if (this.status.kind === 'waiting') {
        this.setStatus({ kind: 'saved', atMs: this.world.now() });
      }
      return;
    }
    this.world.remember({ etag: this.etag, content });
    if (this.status.kind === 'conflict') {
      return;
    }
    if (this.status.kind !== 'offline') {
      this.setStatus({ kind: 'waiting' });
    }
    this.schedule(pauseMs);
  }

  /** Saves at once what is not saved; settles when nothing is left to do. */
  async flush(): Promise<void> {
    clearTimeout(this.timer);
    while (this.running !== null) {
      await this.running;
    }
    if (this.hasUnsaved && this.status.kind !== 'conflict') {
      await this.save();
    }
  }

  /** A newer version from the server. Returns whether it was taken: only where nothing is unsaved. */
  receive(draft: Draft): boolean {
    if (draft.etag === this.etag || this.hasUnsaved || this.running !== null) {
      return false;
    }
    this.take(draft);
    return true;
  }

  /** Conflict: gives up the own edit. */
  takeTheirs(theirs: Draft): void {
    this.world.remember(null);
    this.take(theirs);
  }

  /** Conflict: the own edit replaces theirs, knowingly. */
  async keepMine(theirs: Draft): Promise<void> {
    this.etag = theirs.etag;
    this.saved = contentOf(theirs);
    this.setStatus({ kind: 'waiting' });
    await this.flush();
  }

  /** Starts from a copy that was left on this device. */
  restore(copy: UnsavedCopy): void {
    this.wanted = copy.content;
    if (copy.etag === this.etag) {
      this.change(copy.content);
    } else {
      void this.meetConflict();
    }
  }

  private take(draft: Draft): void {
    this.etag = draft.etag;
    this.saved = contentOf(draft);
    this.wanted = this.saved;
    this.setStatus({ kind: 'clean' });
  }

  private schedule(inMs: number): void {
    clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.flush(), inMs);
  }

  private async save(): Promise<void> {
    const content = this.wanted;
    const wasOffline = this.status.kind === 'offline';
    if (!wasOffline) {
      this.setStatus({ kind: 'saving' });
    }
    this.running = this.world.put(content, this.etag).then(
      (draft) => this.succeed(draft, content),
      (error: unknown) => this.fail(error),
    );
    await this.running;
    this.running = null;
    if (this.status.kind === 'saved' && this.hasUnsaved) {
      this.change(this.wanted);
    }
  }

  private succeed(draft: Draft, content: EditorContent): void {
    this.etag = draft.etag;
    this.saved = content;
    this.world.remember(this.hasUnsaved ? { etag: this.etag, content: this.wanted } : null);
    this.setStatus({ kind: 'saved', atMs: this.world.now() });
    this.world.onSaved(draft);
  }

  private async fail(error: unknown): Promise<void> {
    if (hasCode(error, 'draft.conflict')) {
      await this.meetConflict();
    } else if (error instanceof ApiError && error.isTransient) {
      this.setStatus({ kind: 'offline' });
      this.schedule(retryMs);
    } else {
      this.setStatus({ kind: 'failed', message: messageOf(error) });
    }
  }

  private async meetConflict(): Promise<void> {
    try {
      const theirs = await this.world.read();
      if (isSameContent(contentOf(theirs), this.wanted)) {
        this.takeTheirs(theirs);
      } else {
        this.setStatus({ kind: 'conflict', theirs });
      }
    } catch (error) {
      this.setStatus({ kind: 'offline' });
      if (error instanceof ApiError && error.isTransient) {
        this.schedule(retryMs);
      } else {
        this.setStatus({ kind: 'failed', message: messageOf(error) });
      }
    }
  }

  private setStatus(status: KeeperStatus): void {
    this.status = status;
    for (const listener of this.listeners) {
      listener();
    }
  }
}
