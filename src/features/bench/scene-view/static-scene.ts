// A scene that is only looked at: the bench's stores, filled once. Nothing here saves, edits or checks.
import { createStore } from 'zustand';
import type { DisplayMesh } from '#shared/api';
import type { Finding } from '#shared/check';
import type { Scene } from '#shared/scene';
import type { LiveCheck, OpenScene } from '../../../document/types';
import type { Bench } from '../bench-model';
import { createSession } from '../session';
import type { StandpointId } from '../standpoints/standpoints';
import { createFrameStore } from '../viewport/frame';
import { createMeshSource } from '../viewport/mesh-source';
import { createViewControl } from '../viewport/view-control';

export interface StaticSceneParts {
  readonly scene: Scene;
  readonly findings: readonly Finding[];
  /** Reads a mesh of the scene by the name that the document gives it. */
  readonly loadMesh: (mesh: string) => Promise<DisplayMesh>;
  /** How to tell a person that a mesh could not be read. */
  readonly say: (error: unknown) => string;
  readonly standpoint?: StandpointId;
  readonly showsLasers?: boolean;
}

const nothing = (): void => undefined;

export function createStaticScene(parts: StaticSceneParts): Bench {
  const { scene, findings, loadMesh, say, standpoint = 'bay', showsLasers = true } = parts;
  const open = createStore<OpenScene>()(() => ({
    sceneId: '',
    scene,
    preview: null,
    save: { kind: 'read-only', saveNumber: 0 },
    canEdit: false,
    undoLabel: null,
    redoLabel: null,
    apply: nothing,
    setPreview: nothing,
    undo: nothing,
    redo: nothing,
    settle: nothing,
  }));
  const live = createStore<LiveCheck>()(() => ({
    phase: 'done',
    done: findings.length,
    total: findings.length,
    findings,
    unchecked: [],
    meshes: [],
    problem: null,
  }));
  const meshes = createMeshSource({ load: loadMesh, extent: () => Promise.resolve(null), say });
  return {
    open,
    live,
    session: createSession({ standpoint, showsLasers }),
    meshes,
    frames: createFrameStore(),
    view: createViewControl(),
  };
}

/** Meshes that the scene draws. */
export function meshNamesOf(scene: Pick<Scene, 'components'>): readonly string[] {
  const names = scene.components.flatMap((c) =>
    c.solids.flatMap((s) => (s.shape.kind === 'mesh' ? [s.shape.mesh] : [])),
  );
  return [...new Set(names)];
}
