// The guard in front of pages that need a person: it reads who is there, and sends everybody else to the door and back.
import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { ErrorState, LoadingState } from '../components/states';
import { Wordmark } from '../components/wordmark';
import { isProblem, tell } from '../lib/api-problem';
import { meQuery } from '../lib/queries/account';
import { signInPath } from '../lib/return-path';

export function SignedIn() {
  const me = useQuery(meQuery());
  const location = useLocation();
  if (me.isError && isProblem(me.error, 'session/missing')) {
    return <Navigate to={signInPath(`${location.pathname}${location.search}${location.hash}`)} replace />;
  }
  if (me.data !== undefined) return <Outlet />;
  return (
    <main id="main" tabIndex={-1} className="mx-auto max-w-2xl px-4 py-16">
      <Wordmark className="mb-4 text-3xl" />
      {me.isError ? (
        <ErrorState {...tell(me.error)} onRetry={() => void me.refetch()} />
      ) : (
        <LoadingState what="your account" />
      )}
    </main>
  );
}
