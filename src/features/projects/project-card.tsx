import { mayShow } from '#shared/access';
import { readPicture, type ProjectLine } from '#shared/api';
import { Button } from '../../components/button';
import { IconButton } from '../../components/icon-button';
import { JobCard } from '../../components/job-card';
import { Menu, MenuItem, MenuRule } from '../../components/menu';
import { HolesMark } from '../../components/pictograms';
import { When } from '../../components/when';
import { addressOf } from '../../lib/api';
import { countOf } from '../../lib/format';
import { LatestCheck } from './latest-check';
import { useProjectDeeds } from './use-project-deeds';

export interface ProjectCardProps {
  readonly project: ProjectLine;
  /** The rank of its title on the page. */
  readonly headingLevel: 2 | 3;
}

/** One project on its card. */
export function ProjectCard({ project, headingLevel }: ProjectCardProps) {
  const deeds = useProjectDeeds(project);
  const isDeleted = project.deletedAt !== null;
  const mayChange = mayShow(project.role, 'project.change');
  const { pictureId } = project;
  return (
    <JobCard
      headingLevel={headingLevel}
      title={project.name}
      to={isDeleted ? null : `/projects/${project.id}`}
      picture={pictureId === null ? null : addressOf(readPicture, { pictureId })}
      pictureAlt={`Latest picture of ${project.name}`}
      figures={<LatestCheck latest={project.latest} />}
      menu={
        mayChange &&
        !isDeleted && (
          <Menu
            trigger={
              <IconButton label={`More for ${project.name}`} hint={false}>
                <HolesMark />
              </IconButton>
            }
          >
            <MenuItem onSelect={() => deeds.archive(!project.archived)}>
              {project.archived ? 'Take out of the archive' : 'Put into the archive'}
            </MenuItem>
            <MenuRule />
            <MenuItem danger onSelect={deeds.remove}>
              Delete the project
            </MenuItem>
          </Menu>
        )
      }
    >
      {project.car !== '' && <p>{project.car}</p>}
      <p className="text-sm text-soft">
        {countOf(project.scenes, 'scene')}
        {' · '}
        {project.deletedAt === null ? (
          <>
            changed <When iso={project.updatedAt} />
          </>
        ) : (
          <>
            deleted <When iso={project.deletedAt} />
          </>
        )}
      </p>
      {isDeleted && mayChange && (
        <div className="job-above mt-2">
          <Button size="small" onClick={deeds.bringBack}>
            Bring it back
          </Button>
        </div>
      )}
    </JobCard>
  );
}
