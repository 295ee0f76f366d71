import { useEffect } from 'react';

/** The page's title in the browser's tab, the most particular first. */
export function usePageTitle(title: string): void {
  useEffect(() => {
    document.title = title === '' ? 'Gapwright' : `${title} · Gapwright`;
  }, [title]);
}
