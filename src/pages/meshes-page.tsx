import { useParams } from 'react-router-dom';
import { mayShow } from '#shared/access';
import { MeshList } from '../features/meshes/mesh-list';
import { UploadTray } from '../features/meshes/upload-tray';
import { TeamFrame } from '../features/teams/team-frame';

export function Component() {
  const { teamId = '' } = useParams();
  return (
    <TeamFrame teamId={teamId} page="Meshes">
      {(team) => (
        <>
          {mayShow(team.role, 'mesh.upload') && <UploadTray teamId={team.id} />}
          <MeshList teamId={team.id} mayChange={mayShow(team.role, 'mesh.change')} />
        </>
      )}
    </TeamFrame>
  );
}
