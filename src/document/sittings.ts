// Which sittings at a scene are still going on, in this browser: their drafts are their own business, the others' are to be
// taken up.
const nameOf = (draftId: string): string => `gapwright-draft ${draftId}`;

/** ms, and how often */
const TURN = 100;
const MOST_TURNS = 4;

/** Marks a sitting as going on until it is released, or its tab ends. */
export function holdSitting(locks: LockManager | undefined, draftId: string): () => void {
  if (locks === undefined) return () => undefined;
  let release = (): void => undefined;
  const held = new Promise<void>((resolve) => {
    release = resolve;
  });
  // refused only where the page is not active any more
  locks.request(nameOf(draftId), () => held).catch(() => undefined);
  return release;
}

/**
 * Tells which sittings have ended. Without locks (a page over plain HTTP) all count as ended: a draft of a tab that is still
 * open is then saved here too, which does no harm, as the same changes a second time change nothing.
 */
export async function endedSittings(
  locks: LockManager | undefined,
  draftIds: readonly string[],
): Promise<ReadonlySet<string>> {
  if (locks === undefined) return new Set(draftIds);
  // a page that is just being reloaded lets go a moment after the new one has begun
  for (let turn = 0; ; turn += 1) {
    const { held = [], pending = [] } = await locks.query();
    const alive = new Set([...held, ...pending].map((lock) => lock.name));
    const ended = draftIds.filter((id) => !alive.has(nameOf(id)));
    if (ended.length === draftIds.length || turn === MOST_TURNS) return new Set(ended);
    await new Promise((resolve) => setTimeout(resolve, TURN));
  }
}
