import { useMemo } from 'react';
import type { Moved } from '../edits';
import { useSelection } from '../use-selection';

/** What a move on the tape or by a handle takes along. */
export function useMoved(): Moved {
  const { ids, group } = useSelection();
  return useMemo(() => ({ parts: ids, group }), [ids, group]);
}
