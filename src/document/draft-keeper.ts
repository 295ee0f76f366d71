// Writes drafts at once, as long as the store keeps up; of those that have to wait, only the latest is written. The store
// carries out writes in the order in which it gets them.
import type { Draft, DraftStore } from './drafts';

const AT_ONCE = 4;

export class DraftKeeper {
  /** Whether the latest write did not go through. */
  hasFailed = false;
  private underWay = 0;
  private waiting: { draft: Draft | null; readonly done: Promise<void>; readonly finish: () => void } | null = null;

  constructor(
    private readonly drafts: DraftStore,
    private readonly id: string,
  ) {}

  /** Resolves when this draft, or a later one, is kept, or cannot be: the save goes on without it then. */
  keep(draft: Draft): Promise<void> {
    return this.write(draft);
  }

  drop(): Promise<void> {
    return this.write(null);
  }

  private write(draft: Draft | null): Promise<void> {
    if (this.underWay < AT_ONCE) return this.issue(draft);
    if (this.waiting !== null) {
      this.waiting.draft = draft;
      return this.waiting.done;
    }
    let finish = (): void => undefined;
    const done = new Promise<void>((resolve) => {
      finish = resolve;
    });
    this.waiting = { draft, done, finish };
    return done;
  }

  private async issue(draft: Draft | null): Promise<void> {
    this.underWay += 1;
    try {
      await (draft === null ? this.drafts.remove(this.id) : this.drafts.put(draft));
      this.hasFailed = false;
    } catch {
      // a full disk or a private window: what the server has not got lives in this tab alone
      this.hasFailed = true;
    }
    this.underWay -= 1;
    const next = this.waiting;
    this.waiting = null;
    if (next !== null) void this.issue(next.draft).then(next.finish);
  }
}
