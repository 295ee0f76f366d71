// The roll-call of the open scene, with what the project says is not on this car.
import { useMemo } from 'react';
import { rollCall, type RollCallEntry, type RollCallKey } from '#shared/review';
import { useFacts, useOpen } from '../bench-model';

export interface RollCall {
  readonly entries: readonly RollCallEntry[];
  /** Says whether a thing is not on this car; null for those who may not. */
  readonly answer: ((key: RollCallKey, isAbsent: boolean) => void) | null;
}

export function useRollCall(): RollCall {
  const { absent, setAbsent } = useFacts();
  const scene = useOpen((o) => o.scene);
  const entries = useMemo(() => rollCall(scene, absent), [scene, absent]);
  if (setAbsent === null) return { entries, answer: null };
  return {
    entries,
    answer: (key, isAbsent) =>
      setAbsent(isAbsent ? [...absent.filter((k) => k !== key), key] : absent.filter((k) => k !== key)),
  };
}
