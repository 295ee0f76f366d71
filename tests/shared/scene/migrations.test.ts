import { describe, expect, it } from 'vitest';
import { CURRENT_VERSION, migrate, MIGRATIONS, type Migration } from '#shared/scene';

/** A chain of our own: each step leaves its mark. */
const chain = new Map<number, Migration>([
  [1, ({ gap, ...rest }) => ({ ...rest, rules: { gap } })],
  [2, (document) => ({ ...document, steps: [...((document['steps'] as number[] | undefined) ?? []), 2] })],
  [3, (document) => ({ ...document, steps: [...((document['steps'] as number[] | undefined) ?? []), 3] })],
]);

describe('older documents', () => {
  it('has a step from every older version to the current one', () => {
    for (let version = 1; version < CURRENT_VERSION; version += 1) expect(MIGRATIONS.has(version)).toBe(true);
    expect(MIGRATIONS.size).toBe(CURRENT_VERSION - 1);
    expect(migrate({ version: CURRENT_VERSION })).toEqual({
      ok: true,
      document: { version: CURRENT_VERSION },
      ran: [],
    });
  });

  it('runs every step from the version of the document on, in order', () => {
    expect(migrate({ version: 1, gap: 6 }, chain, 4)).toEqual({
      ok: true,
      ran: [1, 2, 3],
      document: { version: 4, rules: { gap: 6 }, steps: [2, 3] },
    });
    expect(migrate({ version: 3 }, chain, 4)).toEqual({ ok: true, ran: [3], document: { version: 4, steps: [3] } });
    expect(migrate({ version: 4 }, chain, 4)).toEqual({ ok: true, ran: [], document: { version: 4 } });
  });

  it('leaves the older document as it was', () => {
    const old = Object.freeze({ version: 1, gap: 6 });
    migrate(old, chain, 4);
    expect(old).toEqual({ version: 1, gap: 6 });
  });

  it.each([
    [{}, 'is missing'],
    [{ version: 5 }, '5 is newer than this program reads (4): use a newer one'],
    [{ version: 0 }, 'must be a whole number from 1 to 4'],
    [{ version: '1' }, 'must be a whole number from 1 to 4'],
    [{ version: NaN }, 'must be a whole number from 1 to 4'],
  ])('refuses %j', (document, reason) => {
    expect(migrate(document, chain, 4)).toEqual({ ok: false, reason });
  });

  it('refuses where a step is missing or finds something else than it needs', () => {
    const holed = new Map([...chain].filter(([version]) => version !== 2));
    expect(migrate({ version: 1 }, holed, 4)).toEqual({ ok: false, reason: 'there is no way from version 2 to 3' });
    expect(migrate({ version: 2, steps: 7 }, chain, 4)).toEqual({
      ok: false,
      reason: 'the document is not what version 2 asks for: it cannot be brought to 3',
    });
  });
});
