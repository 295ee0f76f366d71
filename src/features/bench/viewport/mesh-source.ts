// The meshes of a scene as they are drawn: asked for once each, their box while they are read, there when they are there.
import type { DisplayMesh } from '#shared/api';
import type { Box } from './vectors';

export type MeshDrawing =
  /** `box`: the mesh's extent in units of its file, as far as it is known. */
  | { readonly state: 'reading'; readonly box: Box | null }
  | { readonly state: 'ready'; readonly mesh: DisplayMesh }
  | { readonly state: 'failed'; readonly box: Box | null; readonly sentence: string };

export interface MeshSource {
  /** What is known of a mesh; undefined before it was asked for. */
  readonly get: (sha256: string) => MeshDrawing | undefined;
  /** Asks for meshes that have not been asked for. */
  readonly want: (sha256s: readonly string[]) => void;
  readonly retry: (sha256: string) => void;
  /** Counts changes, so that a screen knows when to draw again. */
  readonly version: () => number;
  readonly subscribe: (listener: () => void) => () => void;
}

export interface MeshLoading {
  readonly load: (sha256: string) => Promise<DisplayMesh>;
  readonly extent: (sha256: string) => Promise<Box | null>;
  /** How to tell a person that a mesh could not be read. */
  readonly say: (error: unknown) => string;
}

export function createMeshSource({ load, extent, say }: MeshLoading): MeshSource {
  const found = new Map<string, MeshDrawing>();
  const listeners = new Set<() => void>();
  let version = 0;
  const put = (sha256: string, drawing: MeshDrawing): void => {
    found.set(sha256, drawing);
    version += 1;
    for (const listener of listeners) listener();
  };
  const read = async (sha256: string): Promise<void> => {
    put(sha256, { state: 'reading', box: null });
    const box = extent(sha256).catch(() => null);
    void box.then((known) => {
      if (known !== null && found.get(sha256)?.state === 'reading') put(sha256, { state: 'reading', box: known });
    });
    try {
      put(sha256, { state: 'ready', mesh: await load(sha256) });
    } catch (error) {
      put(sha256, { state: 'failed', box: await box, sentence: say(error) });
    }
  };
  return {
    get: (sha256) => found.get(sha256),
    want: (sha256s) => {
      for (const sha256 of sha256s) if (!found.has(sha256)) void read(sha256);
    },
    retry: (sha256) => void read(sha256),
    version: () => version,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
