import type { ReactNode } from 'react';
import type { Project } from '#shared/api';
import { When } from '../../components/when';
import { DISPLAY_LABEL } from './display-labels';

const Line = ({ term, children }: { readonly term: string; readonly children: ReactNode }) => (
  <div className="grid grid-cols-[6.5rem_1fr] gap-2 border-t border-dashed border-line py-1.5 first:border-0">
    <dt className="text-sm text-soft">{term}</dt>
    <dd className="min-w-0 break-words">{children}</dd>
  </div>
);

/** The head of the job card: what the car is, how lengths are shown, what somebody noted. */
export const ProjectFacts = ({ project }: { readonly project: Project }) => (
  <dl>
    <Line term="Car">{project.car === '' ? <span className="text-soft">not said yet</span> : project.car}</Line>
    <Line term="Lengths">{DISPLAY_LABEL[project.display]}</Line>
    <Line term="Opened">
      <When iso={project.createdAt} />
    </Line>
    {project.notes !== '' && (
      <Line term="Notes">
        <span className="whitespace-pre-line">{project.notes}</span>
      </Line>
    )}
  </dl>
);
