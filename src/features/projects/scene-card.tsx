import { useState } from 'react';
import { Link } from 'react-router-dom';
import { readPicture, type SceneLine } from '#shared/api';
import { Button } from '../../components/button';
import { IconButton } from '../../components/icon-button';
import { JobCard } from '../../components/job-card';
import { Menu, MenuItem, MenuLink, MenuRule } from '../../components/menu';
import { NameDialog } from '../../components/name-dialog';
import { HolesMark } from '../../components/pictograms';
import { When } from '../../components/when';
import { addressOf } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { countOf } from '../../lib/format';
import { LatestCheck } from './latest-check';
import { useSceneDeeds } from './use-scene-deeds';

export interface SceneCardProps {
  readonly scene: SceneLine;
  readonly mayChange: boolean;
}

/** One scene on its card. */
export function SceneCard({ scene, mayChange }: SceneCardProps) {
  const [asks, setAsks] = useState<'rename' | 'duplicate' | null>(null);
  const close = (): void => setAsks(null);
  const { restore, archive, remove, rename, duplicate } = useSceneDeeds(scene, close);
  const isDeleted = scene.deletedAt !== null;
  const { pictureId, latest } = scene;
  return (
    <>
      <JobCard
        title={scene.name}
        to={isDeleted ? null : `/scenes/${scene.id}`}
        picture={pictureId === null ? null : addressOf(readPicture, { pictureId })}
        pictureAlt={`Latest picture of ${scene.name}`}
        figures={
          latest === null ? (
            <LatestCheck latest={null} />
          ) : (
            <>
              <LatestCheck latest={latest} current={latest.current} />
              <Link to={`/revisions/${latest.revisionId}/report`} className="link job-above w-fit font-semibold">
                Report of revision {latest.number}
              </Link>
            </>
          )
        }
        menu={
          !isDeleted && (
            <Menu
              trigger={
                <IconButton label={`More for ${scene.name}`} hint={false}>
                  <HolesMark />
                </IconButton>
              }
            >
              <MenuLink to={`/scenes/${scene.id}`}>To the bench</MenuLink>
              <MenuLink to={`/scenes/${scene.id}/dry-fits`}>Dry fits</MenuLink>
              {mayChange && (
                <>
                  <MenuRule />
                  <MenuItem onSelect={() => setAsks('rename')}>Rename</MenuItem>
                  <MenuItem onSelect={() => setAsks('duplicate')}>Duplicate as a variant</MenuItem>
                  <MenuItem onSelect={() => archive.mutate(!scene.archived)}>
                    {scene.archived ? 'Take out of the archive' : 'Put into the archive'}
                  </MenuItem>
                  <MenuRule />
                  <MenuItem danger onSelect={() => remove.mutate()}>
                    Delete the scene
                  </MenuItem>
                </>
              )}
            </Menu>
          )
        }
      >
        <p className="text-sm text-soft">
          {countOf(scene.parts, 'part')}
          {' · '}
          {scene.deletedAt === null ? (
            <>
              {scene.updatedBy}, <When iso={scene.updatedAt} />
            </>
          ) : (
            <>
              deleted <When iso={scene.deletedAt} />
            </>
          )}
        </p>
        {isDeleted && mayChange && (
          <div className="job-above mt-2">
            <Button size="small" busy={restore.isPending} onClick={() => restore.mutate()}>
              Bring it back
            </Button>
          </div>
        )}
      </JobCard>
      <NameDialog
        open={asks === 'rename'}
        onOpenChange={close}
        title="Rename the scene"
        label="Name of the scene"
        start={scene.name}
        action="Rename"
        busy={rename.isPending}
        fault={rename.isError ? sayProblem(rename.error) : null}
        onSend={rename.mutate}
      />
      <NameDialog
        open={asks === 'duplicate'}
        onOpenChange={close}
        title="Duplicate as a variant"
        lead="Its parts, motions and rules go along; dry fits and pictures stay with the original."
        label="Name of the scene"
        start={`${[...scene.name].slice(0, 108).join('')} (variant)`}
        action="Duplicate"
        busy={duplicate.isPending}
        fault={duplicate.isError ? sayProblem(duplicate.error) : null}
        onSend={duplicate.mutate}
      />
    </>
  );
}
