// What shows instead of a page that failed.
import { useRouteError } from 'react-router-dom';
import { Button, ButtonLink } from '../components/button';
import { ErrorState } from '../components/states';
import { tell } from '../lib/api-problem';
import { usePageTitle } from '../lib/use-page-title';

/** A module that is not there any more: a new version was put up while this page was open, or the connection broke. */
const isMissingModule = (error: unknown): boolean =>
  error instanceof Error && /dynamically imported module|module script|Loading chunk/i.test(error.message);

export function PageFault({ bare = false }: { readonly bare?: boolean }) {
  const error = useRouteError();
  usePageTitle('This page failed');
  const told = isMissingModule(error)
    ? {
        sentence: 'This page could not be fetched. A new version may be out, or the connection broke: load it again.',
        detail: null,
        requestNumber: null,
      }
    : tell(error);
  return (
    <div className={bare ? 'mx-auto max-w-2xl p-6' : undefined}>
      <h1 className="mb-4 text-3xl font-light">This page failed</h1>
      <ErrorState
        {...told}
        action={
          <>
            <Button size="small" onClick={() => window.location.reload()}>
              Load it again
            </Button>
            <ButtonLink size="small" to="/">
              To your teams
            </ButtonLink>
          </>
        }
      />
    </div>
  );
}
