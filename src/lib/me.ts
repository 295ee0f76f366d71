// The signed-in person, for any page behind the sign-in.
import { useSuspenseQuery } from '@tanstack/react-query';
import type { Me } from '#shared/api';
import type { Role } from '#shared/access';
import type { LengthDisplay } from '#shared/units';
import { inWords } from './part-words';
import { meQuery } from './queries/account';

/** Only below the guard that has read it already, so it never waits there. */
export function useMe(): Me {
  return useSuspenseQuery(meQuery()).data;
}

/** The person's role in a team; null for a stranger to it. */
export function useRoleIn(teamId: string | undefined): Role | null {
  return useMe().teams.find((team) => team.id === teamId)?.role ?? null;
}

/** The person's choice over the project's over the document's. */
export function displayFor(
  me: Pick<Me, 'display'> | null,
  project?: LengthDisplay | null,
  document?: LengthDisplay,
): LengthDisplay {
  return me?.display ?? project ?? document ?? 'mm';
}

/** Turns the product's own texts into the person's words for parts. */
export function useWords(): (text: string) => string {
  const { words } = useMe();
  return (text) => inWords(text, words);
}
