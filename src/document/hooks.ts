// The open scene for React: a sitting starts with the screen and ends with it.
import { useEffect, useState } from 'react';
import type { StoreApi } from 'zustand';
import { startLiveCheck } from './live-check';
import { startSitting, type SittingAt } from './sitting';
import type { LiveCheck, OpenScene } from './types';

export interface OpenBench {
  readonly open: StoreApi<OpenScene>;
  readonly live: StoreApi<LiveCheck>;
  /** Brings what is unsaved to the server now; the save number, or null if it is not all there. */
  readonly saveNow: () => Promise<number | null>;
}

export interface SittingPlace extends SittingAt {
  readonly teamId: string;
  /** When the last save of the sitting is through, or given up. */
  readonly onEnd: () => void;
}

/** Null until the drafts of earlier sittings were looked through. `place` must be the same object as long as it is the same scene. */
export function useOpenBench(place: SittingPlace): OpenBench | null {
  const [bench, setBench] = useState<OpenBench | null>(null);
  useEffect(() => {
    let isOver = false;
    let end = (): void => undefined;
    void startSitting(place).then((sitting) => {
      const check = startLiveCheck(sitting.store, place.teamId);
      end = () => {
        check.stop();
        void sitting.end().finally(place.onEnd);
      };
      if (isOver) end();
      else setBench({ open: sitting.store, live: check.live, saveNow: sitting.saveNow });
    });
    return () => {
      isOver = true;
      end();
      setBench(null);
    };
  }, [place]);
  return bench;
}
