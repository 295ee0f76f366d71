// A short word beside a control while it is pointed at or has the focus.
import { Tooltip } from 'radix-ui';
import type { ReactNode } from 'react';

export const HintProvider = ({ children }: { readonly children: ReactNode }) => (
  <Tooltip.Provider delayDuration={350}>{children}</Tooltip.Provider>
);

export interface HintProps {
  readonly text: string;
  /** One element that takes a ref. */
  readonly children: ReactNode;
  readonly side?: 'top' | 'right' | 'bottom' | 'left';
}

export function Hint({ text, children, side = 'bottom' }: HintProps) {
  return (
    <Tooltip.Root>
      <Tooltip.Trigger asChild>{children}</Tooltip.Trigger>
      <Tooltip.Portal>
        <Tooltip.Content side={side} sideOffset={6} collisionPadding={8} className="on-card hint">
          {text}
        </Tooltip.Content>
      </Tooltip.Portal>
    </Tooltip.Root>
  );
}
