// The live check of an open scene: it sees what the screen shows, gestures under way included.
import type { StoreApi } from 'zustand';
import { CheckClient, type CheckWorker } from '../workers/check-client';
import type { LiveCheck, OpenScene } from './types';

export interface RunningCheck {
  readonly live: StoreApi<LiveCheck>;
  readonly stop: () => void;
}

export function startLiveCheck(open: StoreApi<OpenScene>, teamId: string, spawn?: () => CheckWorker): RunningCheck {
  const client = new CheckClient(teamId, spawn);
  const show = ({ scene, preview }: OpenScene): void => client.show(preview ?? scene, preview !== null);
  show(open.getState());
  const unsubscribe = open.subscribe(show);
  return {
    live: client.live,
    stop: () => {
      unsubscribe();
      client.stop();
    },
  };
}
