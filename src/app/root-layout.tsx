// Around every page: the way past the head, the laser line of a page under way, notices, the word about a lost connection.
import { Suspense, useEffect, useRef, useState } from 'react';
import { Outlet, ScrollRestoration, useLocation, useNavigation } from 'react-router-dom';
import { LoadingState } from '../components/states';
import { Notices } from '../components/toast';
import { OfflineStrip } from './offline-strip';

export function RootLayout() {
  const isUnderWay = useNavigation().state !== 'idle';
  return (
    <>
      <a href="#main" className="skip-link">
        To the page
      </a>
      {isUnderWay && <div className="laser-run !fixed inset-x-0 top-0 z-50 !bg-transparent" aria-hidden="true" />}
      <OfflineStrip />
      <Suspense fallback={<LoadingState what="the page" />}>
        <Outlet />
      </Suspense>
      <Arrival />
      <Notices />
      <ScrollRestoration />
    </>
  );
}

/** On a new page the focus goes to its beginning, and its title is read out. */
function Arrival() {
  const { pathname } = useLocation();
  const last = useRef(pathname);
  const [said, setSaid] = useState('');
  useEffect(() => {
    if (last.current === pathname) return;
    last.current = pathname;
    // the new page sets its title and its focus in its own effects, so it goes first
    const timer = setTimeout(() => {
      setSaid(document.title);
      const main = document.getElementById('main');
      if (main !== null && !main.contains(document.activeElement)) main.focus({ preventScroll: true });
    }, 60);
    return () => clearTimeout(timer);
  }, [pathname]);
  return (
    <div aria-live="polite" className="sr-only">
      {said}
    </div>
  );
}
