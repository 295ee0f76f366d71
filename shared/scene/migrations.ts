// Older documents are brought up to date when they are read, one version at a time. Version 1 is the first, so the chain is
// empty; the machinery is here so that version 2 is one entry.

export type RawDocument = Readonly<Record<string, unknown>>;

/** Turns a document of one version into the next; it may trust nothing but the version number. */
export type Migration = (document: RawDocument) => RawDocument;

export const CURRENT_VERSION = 1;

/** migrations[n] turns version n into n + 1. */
export const MIGRATIONS: ReadonlyMap<number, Migration> = new Map();

export type MigrationResult =
  | { readonly ok: true; readonly document: RawDocument; readonly ran: readonly number[] }
  | { readonly ok: false; readonly reason: string };

/** Runs every step from the document's version up to `current`. */
export function migrate(
  document: RawDocument,
  migrations: ReadonlyMap<number, Migration> = MIGRATIONS,
  current: number = CURRENT_VERSION,
): MigrationResult {
  const { version } = document;
  if (version === undefined) return { ok: false, reason: 'is missing' };
  if (typeof version !== 'number' || !Number.isInteger(version) || version < 1) {
    return {
      ok: false,
      reason: current === 1 ? 'must be the number 1' : `must be a whole number from 1 to ${current}`,
    };
  }
  if (version > current) {
    return { ok: false, reason: `${version} is newer than this program reads (${current}): use a newer one` };
  }
  let upgraded = document;
  const ran: number[] = [];
  for (let v = version; v < current; v += 1) {
    const step = migrations.get(v);
    if (step === undefined) return { ok: false, reason: `there is no way from version ${v} to ${v + 1}` };
    try {
      upgraded = { ...step(upgraded), version: v + 1 };
    } catch {
      return { ok: false, reason: `the document is not what version ${v} asks for: it cannot be brought to ${v + 1}` };
    }
    ran.push(v);
  }
  return { ok: true, document: upgraded, ran };
}
