// A sheet laid over the page. It is card stock on both grounds.
import { Dialog as Radix } from 'radix-ui';
import type { ReactNode } from 'react';
import { classes } from './classes';
import { Hole } from './hole';
import { CrossMark } from './pictograms';
import { leaveToField, useOpener } from './use-opener';

export interface DialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly title: string;
  /** What it is for, in a sentence. */
  readonly lead?: ReactNode;
  readonly wide?: boolean;
  readonly children: ReactNode;
}

export function Dialog({ open, onOpenChange, title, lead, wide = false, children }: DialogProps) {
  const giveBack = useOpener(open);
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="scrim">
          <Radix.Content
            onCloseAutoFocus={giveBack}
            onEscapeKeyDown={leaveToField}
            className={classes('on-card cut sheet', wide && 'sheet-wide')}
            {...(lead === undefined ? { 'aria-describedby': undefined } : {})}
          >
            <header className="mb-4 flex items-start gap-3 pr-12">
              <Hole ring through="var(--dye)" className="mt-2 ml-1" />
              <div className="grow pl-1">
                <Radix.Title className="text-xl font-extrabold">{title}</Radix.Title>
                {lead !== undefined && (
                  <Radix.Description asChild>
                    <div className="mt-1 text-soft">{lead}</div>
                  </Radix.Description>
                )}
              </div>
            </header>
            {children}
            {/* last, so that the first field gets the focus */}
            <Radix.Close className="icon-button !absolute top-5 right-7 max-sm:top-3 max-sm:right-6" aria-label="Close">
              <CrossMark />
            </Radix.Close>
          </Radix.Content>
        </Radix.Overlay>
      </Radix.Portal>
    </Radix.Root>
  );
}

/** The row of buttons that ends a sheet; the main one first. */
export const DialogActions = ({ children }: { readonly children: ReactNode }) => (
  <div className="mt-5 flex flex-wrap items-center gap-3 border-t border-dashed border-line pt-4">{children}</div>
);
