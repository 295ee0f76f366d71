import { useMemo, useState } from 'react';
import { useFacts, useOpen } from '../bench-model';
import { ladderOf, spanOf, type Ladder, type Rung, type Span } from './rungs';

const isSameSpan = (a: Span, b: Span): boolean => a.top === b.top && a.bottom === b.bottom;

/**
 * The ladder of the live findings. While something is dragged the rule keeps its length, so that only the rungs move.
 * @param fits kept between calls, or the rule is worked out anew each time
 */
export function useLadder(
  rungs: readonly Rung[],
  fits: (shown: readonly Rung[]) => boolean,
): { readonly ladder: Ladder; readonly span: Span } {
  const { display } = useFacts();
  const isDragging = useOpen((open) => open.preview !== null);
  const fitting = useMemo(() => spanOf(rungs, display, fits), [rungs, display, fits]);
  const [held, setHeld] = useState(fitting);
  const span = isDragging ? held : fitting;
  if (!isSameSpan(held, span)) setHeld(span);
  const ladder = useMemo(() => ladderOf(rungs, span), [rungs, span]);
  return { ladder, span };
}
