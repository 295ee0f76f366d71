import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { BlankStub } from './blank-stub';
import { Hole } from './hole';

export interface JobCardProps {
  readonly title: string;
  /** Where the card leads; null: it leads nowhere (it is deleted, say). */
  readonly to: string | null;
  /** The address of its picture; null: there is none yet. */
  readonly picture: string | null;
  readonly pictureAlt: string;
  /** The lines under the title. */
  readonly children: ReactNode;
  /** What stands behind the perforation. */
  readonly figures: ReactNode;
  /** A menu at the corner. */
  readonly menu?: ReactNode;
  readonly headingLevel?: 2 | 3;
}

/** One job on one card; a list of them is a rack. */
export function JobCard({ title, to, picture, pictureAlt, children, figures, menu, headingLevel = 3 }: JobCardProps) {
  const Heading = headingLevel === 2 ? 'h2' : 'h3';
  return (
    <article className="job-card cut">
      <div className="job-stub">
        {picture === null ? <BlankStub /> : <img src={picture} alt={pictureAlt} loading="lazy" />}
        <Hole />
      </div>
      <div className="min-w-0 px-4 py-3.5 sm:px-5">
        <Heading className="job-title text-xl leading-snug font-extrabold break-words">
          {to === null ? title : <Link to={to}>{title}</Link>}
        </Heading>
        <div className="mt-0.5 grid gap-0.5">{children}</div>
      </div>
      <div className="job-figures perforated flex items-start justify-between gap-3 py-3.5 pr-3 pl-5">
        <div className="grid gap-1 text-sm">{figures}</div>
        {menu !== undefined && <div className="job-above -mt-1.5">{menu}</div>}
      </div>
    </article>
  );
}

/** Cards under one another. */
export const JobRack = ({ label, children }: { readonly label: string; readonly children: ReactNode }) => (
  <ul aria-label={label} className="grid gap-3">
    {children}
  </ul>
);
