import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { ErrorState, LoadingState } from '../../components/states';
import { tell } from '../../lib/api-problem';
import { projectMeshesQuery } from '../../lib/queries/meshes';

export interface ProjectMeshesProps {
  readonly projectId: string;
  readonly teamId: string;
  /** Whether the person may look at all meshes of the team. */
  readonly linked: boolean;
}

/** The meshes that stand in the scenes of a project. */
export function ProjectMeshes({ projectId, teamId, linked }: ProjectMeshesProps) {
  const meshes = useQuery(projectMeshesQuery(projectId));
  if (meshes.isPending) return <LoadingState what="the meshes" />;
  if (meshes.isError) return <ErrorState {...tell(meshes.error)} onRetry={() => void meshes.refetch()} />;
  return (
    <>
      {meshes.data.length === 0 && <p className="text-soft">No scene uses a mesh so far.</p>}
      <ul>
        {meshes.data.map((mesh) => (
          <li key={mesh.sha256} className="border-t border-dashed border-line py-1.5 first:border-0">
            <span className="font-semibold break-words">{mesh.name}</span>
            <span className="block text-sm text-soft">
              {mesh.kind === 'body' ? 'closed shape' : 'open surface'}, in {mesh.scenes.join('; ')}
            </span>
          </li>
        ))}
      </ul>
      {linked && (
        <Link to={`/teams/${teamId}/meshes`} className="link text-sm">
          Meshes of the team
        </Link>
      )}
    </>
  );
}
