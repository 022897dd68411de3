import type { Draft } from '#common/schemas/lattice';
import {
  DraftKeeper,
  type KeeperWorld,
  type UnsavedCopy,
} from '#client/features/cell-editor/model/draft-keeper.ts';
import {
  contentOf,
  isSameContent,
  pushEdit,
  redo,
  startHistory,
  undo,
  type EditorContent,
  type EditorHistory,
} from '#client/features/cell-editor/model/editor-history.ts';

/** The cell being edited: its history, and a keeper that saves it. */
export class EditorStore {
  readonly keeper: DraftKeeper;
  private history: EditorHistory;
  private readonly listeners = new Set<() => void>();
  private readonly now: () => number;

  constructor(draft: Draft, world: KeeperWorld, unsaved: UnsavedCopy | null) {
    this.now = world.now;
    this.keeper = new DraftKeeper(draft, world);
    this.history = startHistory(contentOf(draft));
    if (unsaved === null) {
      return;
    }
    if (isSameContent(unsaved.content, this.history.present)) {
      world.remember(null);
    } else {
      this.history = pushEdit(this.history, unsaved.content, null, this.now());
      this.keeper.restore(unsaved);
    }
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly getHistory = (): EditorHistory => this.history;

  /** One edit; `field` merges the letters of a word into one step of undo. */
  edit(change: Partial<EditorContent>, field: string | null): void {
    const content = { ...this.history.present, ...change };
    this.set(pushEdit(this.history, content, field, this.now()));
  }

  undo(): void {
    this.set(undo(this.history));
  }

  redo(): void {
    this.set(redo(this.history));
  }

  /** The server's draft came again; taken where nothing here is unsaved. True when it changed the cell. */
  receive(draft: Draft): boolean {
    return this.keeper.receive(draft) && this.show(draft);
  }

  takeTheirs(theirs: Draft): void {
    this.keeper.takeTheirs(theirs);
    this.show(theirs);
  }

  private show(draft: Draft): boolean {
    const content = contentOf(draft);
    if (isSameContent(content, this.history.present)) {
      return false;
    }
    this.history = pushEdit(this.history, content, null, this.now());
    this.tell();
    return true;
  }

  private set(history: EditorHistory): void {
    if (history !== this.history) {
      this.history = history;
      this.keeper.change(history.present);
      this.tell();
    }
  }

  private tell(): void {
    for (const listener of this.listeners) {
      listener();
    }
  }
}
