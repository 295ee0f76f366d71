// Writes drafts one after another; of several that wait, only the latest is written.
import type { Draft, DraftStore } from './drafts';

export class DraftKeeper {
  private next: Draft | null | undefined = undefined;
  private running: Promise<void> | null = null;

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
    this.next = draft;
    this.running ??= this.run();
    return this.running;
  }

  private async run(): Promise<void> {
    while (this.next !== undefined) {
      const draft = this.next;
      this.next = undefined;
      try {
        await (draft === null ? this.drafts.remove(this.id) : this.drafts.put(draft));
      } catch {
        // a full disk or a private window: what the server has not got lives in this tab alone
      }
    }
    this.running = null;
  }
}
