import { useInfiniteQuery } from '@tanstack/react-query';
import { Button } from '../../components/button';
import { ErrorState, LoadingState } from '../../components/states';
import { When } from '../../components/when';
import { tell } from '../../lib/api-problem';
import { activityQuery } from '../../lib/queries/projects';

/** Who did what in the project, newest first, as a time card. */
export function ActivityList({ projectId }: { readonly projectId: string }) {
  const activity = useInfiniteQuery(activityQuery(projectId));
  if (activity.isPending) return <LoadingState what="what was done" />;
  if (activity.isError) return <ErrorState {...tell(activity.error)} onRetry={() => void activity.refetch()} />;
  const entries = activity.data.pages.flatMap((page) => page.entries);
  if (entries.length === 0) return <p className="text-soft">Nothing was done here so far.</p>;
  return (
    <>
      <ol className="grid">
        {entries.map((entry) => (
          <li key={entry.id} className="border-t border-dashed border-line py-1.5 first:border-0">
            <span className="font-semibold">{entry.who}</span> {entry.what}
            <span className="block text-sm text-soft">
              <When iso={entry.at} />
            </span>
          </li>
        ))}
      </ol>
      {activity.hasNextPage && (
        <Button
          kind="text"
          className="mt-2"
          busy={activity.isFetchingNextPage}
          onClick={() => void activity.fetchNextPage()}
        >
          Earlier
        </Button>
      )}
    </>
  );
}
