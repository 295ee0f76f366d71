import { Fragment, type ReactNode } from 'react';
import { Link } from 'react-router-dom';

export interface Crumb {
  readonly label: string;
  readonly to: string;
}

/** Where this page hangs: stroke-divided, as a job number is. */
export function Breadcrumbs({ crumbs, here }: { readonly crumbs: readonly Crumb[]; readonly here?: string }) {
  return (
    <nav aria-label="Where you are" className="flex flex-wrap items-center gap-x-2 text-sm">
      {crumbs.map((crumb, i) => (
        <Fragment key={crumb.to}>
          {i > 0 && <Stroke />}
          <Link to={crumb.to} className="link py-0.5 text-soft">
            {crumb.label}
          </Link>
        </Fragment>
      ))}
      {here !== undefined && (
        <>
          {crumbs.length > 0 && <Stroke />}
          <span aria-current="page" className="font-semibold">
            {here}
          </span>
        </>
      )}
    </nav>
  );
}

const Stroke = () => (
  <span aria-hidden="true" className="text-accent">
    /
  </span>
);

export interface PageHeadProps {
  readonly title: ReactNode;
  readonly crumbs?: readonly Crumb[];
  /** A line under the title. */
  readonly lead?: ReactNode;
  /** What can be done with the whole page. */
  readonly actions?: ReactNode;
}

export function PageHead({ title, crumbs, lead, actions }: PageHeadProps) {
  return (
    <header className="mb-6">
      {crumbs !== undefined && crumbs.length > 0 && <Breadcrumbs crumbs={crumbs} />}
      <div className="mt-1 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="min-w-0 grow basis-48">
          <h1 className="text-3xl leading-tight font-light break-words sm:text-4xl">{title}</h1>
          {lead !== undefined && <div className="mt-1 text-soft">{lead}</div>}
        </div>
        {actions !== undefined && <div className="flex flex-wrap items-center gap-3">{actions}</div>}
      </div>
    </header>
  );
}

export interface SectionProps {
  readonly title: string;
  /** Beside the title. */
  readonly note?: ReactNode;
  readonly actions?: ReactNode;
  readonly children: ReactNode;
  readonly className?: string;
}

/** A part of a page, under a dashed rule. */
export function Section({ title, note, actions, children, className }: SectionProps) {
  return (
    <section className={className} aria-label={title}>
      <div className="mb-3 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-2 border-b border-dashed border-line pb-1.5">
        <h2 className="text-lg font-extrabold">
          {title}
          {note !== undefined && <span className="ml-3 text-sm font-normal text-soft">{note}</span>}
        </h2>
        {actions !== undefined && <div className="flex flex-wrap items-center gap-3">{actions}</div>}
      </div>
      {children}
    </section>
  );
}
