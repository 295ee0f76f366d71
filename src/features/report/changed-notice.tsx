import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Scene } from '#shared/scene';
import { keptSceneQuery } from '../../lib/queries/dry-fits';
import { changedSince } from './changed-since';

export interface ChangedNoticeProps {
  /** The scene as it was checked. */
  readonly scene: Scene;
  readonly sceneId: string;
}

/** So many parts are named; the rest are counted. */
const NAMED = 4;

/** A report holds for its revision. If the scene has gone on, it says so before anything else. */
export function ChangedNotice({ scene, sceneId }: ChangedNoticeProps) {
  const kept = useQuery(keptSceneQuery(sceneId));
  const changed = kept.data === undefined ? null : changedSince(scene, kept.data.document);
  if (changed === null) return null;
  const { parts } = changed;
  const more = parts.length - NAMED;
  return (
    <p className="report-changed" role="status">
      <b>The scene has changed since</b>
      {parts.length > 0 && (
        <>
          {' '}
          for {parts.slice(0, NAMED).join(', ')}
          {more > 0 && ` and ${more} more`}
        </>
      )}
      . This report is of the revision as it was;{' '}
      <Link to={`/scenes/${sceneId}/dry-fits`} className="link font-semibold">
        run a dry fit again
      </Link>{' '}
      to check it as it is.
    </p>
  );
}
