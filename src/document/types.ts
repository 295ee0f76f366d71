// What the open scene offers to the screens. One store per open scene; the screens read slices of it and call its actions.
import type { Scene } from '#shared/scene';

/** Where the document stands against the server. */
export type SaveState =
  | { readonly kind: 'saved'; readonly saveNumber: number }
  /** Changed here; goes up in a moment. */
  | { readonly kind: 'unsaved'; readonly saveNumber: number }
  | { readonly kind: 'saving'; readonly saveNumber: number }
  /** Could not be reached; the draft is kept on this machine and goes up by itself. */
  | { readonly kind: 'offline'; readonly saveNumber: number; readonly reason: string }
  /** Somebody else changed the same records; nothing is lost until the person chooses. */
  | {
      readonly kind: 'conflict';
      readonly saveNumber: number;
      readonly mine: Scene;
      readonly theirs: Scene;
      readonly records: readonly string[];
    }
  | { readonly kind: 'read-only'; readonly saveNumber: number };

/** A pure change of the document under the label that undo shows ("Move brake pedal"). */
export interface SceneEdit {
  readonly label: string;
  readonly edit: (scene: Scene) => Scene;
}

export interface OpenScene {
  readonly sceneId: string;
  readonly scene: Scene;
  /**
   * The scene as it would be if the gesture under way ended now; null at rest. Gaps follow it, history and autosave do not.
   */
  readonly preview: Scene | null;
  readonly save: SaveState;
  readonly canEdit: boolean;
  readonly undoLabel: string | null;
  readonly redoLabel: string | null;
  readonly apply: (edit: SceneEdit) => void;
  readonly setPreview: (edit: ((scene: Scene) => Scene) | null) => void;
  readonly undo: () => void;
  readonly redo: () => void;
  /** Ends a conflict. */
  readonly settle: (choice: 'mine' | 'theirs') => void;
}

export type { LiveCheck } from '../workers/live-check';
