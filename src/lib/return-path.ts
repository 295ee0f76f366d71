// Where a person was going when the door came in between.

/** A path on this site, and nothing that a browser could read as another site's address. */
export function safePath(path: string | null): string {
  if (path === null || !path.startsWith('/') || path.startsWith('//') || /[\\\p{Cc}]/u.test(path)) return '/';
  return path;
}

export const signInPath = (back: string): string =>
  back === '/' ? '/sign-in' : `/sign-in?back=${encodeURIComponent(back)}`;

/** The same query on another page of the door. */
export const withBack = (path: string, back: string): string =>
  back === '/' ? path : `${path}?back=${encodeURIComponent(back)}`;
