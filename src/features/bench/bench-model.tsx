// What every corner of the bench reads from: the open scene, the live check, this sitting, and a few facts about the reader.
import { createContext, useContext } from 'react';
import { useStore, type StoreApi } from 'zustand';
import type { LiveCheck, OpenScene } from '../../document/types';
import type { RollCallKey } from '#shared/review';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import type { WordChoice } from '../../lib/part-words';
import type { Session, SessionStore } from './session';
import type { FrameStore } from './viewport/frame';
import type { MeshSource } from './viewport/mesh-source';
import type { ViewControl } from './viewport/view-control';

export type Readable<T> = Pick<StoreApi<T>, 'getState' | 'getInitialState' | 'subscribe'>;

export interface Bench {
  readonly open: Readable<OpenScene>;
  readonly live: Readable<LiveCheck>;
  readonly session: SessionStore;
  readonly meshes: MeshSource;
  readonly frames: FrameStore;
  readonly view: ViewControl;
}

/** About the person who looks, and the project; change seldom. */
export interface BenchFacts {
  readonly display: LengthDisplay;
  readonly setDisplay: (display: LengthDisplay) => void;
  readonly words: WordChoice;
  readonly teamId: string;
  readonly projectId: string;
  readonly projectName: string;
  /** Roll-call entries that are not on this car. */
  readonly absent: readonly RollCallKey[];
  /** Null for those who may not say so. */
  readonly setAbsent: ((keys: readonly RollCallKey[]) => void) | null;
}

export const BenchContext = createContext<Bench | null>(null);
export const FactsContext = createContext<BenchFacts | null>(null);

export function useBench(): Bench {
  const bench = useContext(BenchContext);
  if (bench === null) throw new Error('This belongs inside a bench.');
  return bench;
}

export function useFacts(): BenchFacts {
  const facts = useContext(FactsContext);
  if (facts === null) throw new Error('This belongs inside a bench.');
  return facts;
}

export const useOpen = <T,>(pick: (open: OpenScene) => T): T => useStore(useBench().open, pick);
export const useLive = <T,>(pick: (live: LiveCheck) => T): T => useStore(useBench().live, pick);
export const useSession = <T,>(pick: (session: Session) => T): T => useStore(useBench().session, pick);

/** The scene as it shows: with the gesture under way, if there is one. */
export const shownScene = (open: OpenScene): Scene => open.preview ?? open.scene;
export const useShown = (): Scene => useOpen(shownScene);
