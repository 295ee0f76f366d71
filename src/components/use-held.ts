import { useState } from 'react';

/**
 * Shows a choice at once, while it is still on its way to where it is kept. It is let go as soon as the kept value has moved,
 * or when told that it could not be kept.
 */
export function useHeld<T>(kept: T): readonly [shown: T, hold: (value: T) => void, letGo: () => void] {
  const [held, setHeld] = useState<{ readonly over: T; readonly value: T } | null>(null);
  const isHeld = held !== null && Object.is(held.over, kept);
  // for good: the kept value may come back to what was held over
  if (held !== null && !isHeld) setHeld(null);
  return [isHeld ? held.value : kept, (value) => setHeld({ over: kept, value }), () => setHeld(null)];
}
