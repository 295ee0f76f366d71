// The way for buttons and keys to the camera, which is there only while a viewport is.
import type { Finding } from '#shared/check';
import type { StandpointId } from '../standpoints/standpoints';
import type { Picture } from './capture';
import type { Box } from './vectors';
import type { View } from './view';

export interface CameraHand {
  readonly standAt: (id: StandpointId) => void;
  /** Keeps the side it looks from. */
  readonly fit: (box: Box) => void;
  /** Goes to a finding's witness mark. */
  readonly lookAt: (finding: Finding) => void;
  /** Degrees. */
  readonly turn: (around: number, above: number) => void;
  /** CSS px. */
  readonly pan: (right: number, up: number) => void;
  /** As pan, in a short flight. */
  readonly glide: (right: number, up: number) => void;
  readonly zoom: (factor: number) => void;
  /** While a handle is dragged, the camera stays. */
  readonly hold: (held: boolean) => void;
  readonly view: () => View;
  /** The present look at twice the size of the screen. */
  readonly captureView: () => Promise<Picture>;
  /** A finding's own picture: its pair whole, all else as glass. Sizes in CSS px; the picture is twice that. */
  readonly captureFinding: (
    finding: Finding,
    size: { readonly width: number; readonly height: number },
  ) => Promise<Picture>;
}

export interface ViewControl {
  /** Null while there is no viewport. */
  readonly hand: () => CameraHand | null;
  readonly attach: (hand: CameraHand) => () => void;
}

export function createViewControl(): ViewControl {
  let current: CameraHand | null = null;
  return {
    hand: () => current,
    attach: (hand) => {
      current = hand;
      return () => {
        if (current === hand) current = null;
      };
    },
  };
}
