// A ruled ledger. On a narrow screen each row becomes an entry of its own, its cells under one another with their heads.
import type { ComponentPropsWithRef, ReactNode } from 'react';
import { classes } from './classes';
import { PunchMark, PunchRestMark } from './pictograms';

export interface TableProps {
  /** What it lists, for readers. */
  readonly label: string;
  readonly head: ReactNode;
  readonly children: ReactNode;
}

export function Table({ label, head, children }: TableProps) {
  return (
    <table className="ledger w-full border-collapse text-left" aria-label={label}>
      <thead className="ledger-head border-b-2 border-strong text-sm">
        <tr>{head}</tr>
      </thead>
      <tbody>{children}</tbody>
    </table>
  );
}

export interface SortHeadProps<T extends string> {
  readonly label: string;
  readonly by: T;
  readonly sort: T;
  /** The way in which this sort runs. */
  readonly direction?: 'ascending' | 'descending';
  readonly onSort: (by: T) => void;
  readonly figures?: boolean;
}

/** A head that sorts by its column. */
export function SortHead<T extends string>({
  label,
  by,
  sort,
  direction = 'ascending',
  onSort,
  figures = false,
}: SortHeadProps<T>) {
  const isSorted = by === sort;
  return (
    <th scope="col" aria-sort={isSorted ? direction : undefined} className={classes('p-0', figures && 'text-right')}>
      <button
        type="button"
        className="inline-flex min-h-9 items-center gap-1 px-2 font-semibold hover:text-accent"
        onClick={() => onSort(by)}
      >
        {label}
        {isSorted ? <PunchMark up={direction === 'ascending'} /> : <PunchRestMark className="text-soft" />}
      </button>
    </th>
  );
}

export const Head = ({ children, figures = false }: { readonly children: ReactNode; readonly figures?: boolean }) => (
  <th scope="col" className={classes('px-2 py-2 font-semibold', figures && 'text-right')}>
    {children}
  </th>
);

export interface CellProps extends ComponentPropsWithRef<'td'> {
  /** The head, repeated beside the cell on a narrow screen. */
  readonly head?: string;
  readonly figures?: boolean;
}

export const Cell = ({ head, figures = false, className, ...rest }: CellProps) => (
  <td
    data-head={head}
    className={classes('sm:px-2 sm:py-2.5', figures && 'figures sm:text-right', className)}
    {...rest}
  />
);

export const Row = ({ className, ...rest }: ComponentPropsWithRef<'tr'>) => (
  <tr className={classes('border-b border-dashed border-line', className)} {...rest} />
);
