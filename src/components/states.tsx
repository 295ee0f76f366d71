// The three states of a list besides its lines: nothing yet, still reading, could not be read.
import type { ReactNode } from 'react';
import { Button } from './button';
import { TemplateDrawing } from './template-drawing';

export interface EmptyStateProps {
  readonly title: string;
  /** What to do first. */
  readonly children?: ReactNode;
  /** The one thing to press. */
  readonly action?: ReactNode;
  /** Leave the drawing away where there is little room. */
  readonly small?: boolean;
}

/** Nothing yet: the outline of a template that has still to be cut. */
export function EmptyState({ title, children, action, small = false }: EmptyStateProps) {
  return (
    <div className="grid items-center gap-x-8 gap-y-4 border-2 border-dashed border-line p-5 sm:grid-cols-[auto_1fr] sm:p-7">
      {!small && <TemplateDrawing className="hidden w-44 text-soft sm:block" />}
      <div className={small ? 'sm:col-span-2' : undefined}>
        <p className="text-lg font-bold">{title}</p>
        {children !== undefined && <div className="mt-1 max-w-prose text-soft">{children}</div>}
        {action !== undefined && <div className="mt-4 flex flex-wrap gap-3">{action}</div>}
      </div>
    </div>
  );
}

/** `what` reads on from "Reading": "Reading the projects". */
export function LoadingState({ what }: { readonly what: string }) {
  return (
    <div role="status" className="py-6">
      <div className="laser-run" />
      <p className="mt-2 text-sm text-soft">Reading {what} …</p>
    </div>
  );
}

export interface ErrorStateProps {
  /** What happened and what to do. */
  readonly sentence: string;
  readonly detail?: string | null;
  readonly requestNumber?: string | null;
  readonly onRetry?: () => void;
  /** Another way out. */
  readonly action?: ReactNode;
}

export function ErrorState({ sentence, detail, requestNumber, onRetry, action }: ErrorStateProps) {
  return (
    <div role="alert" className="flex border border-hits bg-lift">
      <div className="hatched w-4 flex-none border-r border-hits" aria-hidden="true" />
      <div className="grid gap-1 p-4">
        <p className="font-bold">{sentence}</p>
        {detail !== undefined && detail !== null && <p className="text-soft">{detail}</p>}
        {requestNumber !== undefined && requestNumber !== null && (
          <p className="text-sm break-all text-soft">Request number {requestNumber}</p>
        )}
        {(onRetry !== undefined || action !== undefined) && (
          <div className="mt-2 flex flex-wrap gap-3">
            {onRetry !== undefined && (
              <Button size="small" onClick={onRetry}>
                Try again
              </Button>
            )}
            {action}
          </div>
        )}
      </div>
    </div>
  );
}
