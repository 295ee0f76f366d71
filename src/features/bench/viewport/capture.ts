// A picture to take along: the scene drawn anew at twice the size, with the marks that lie over it painted in.
import type { Camera, Scene, WebGLRenderer } from 'three';
import type { StandpointId } from '../standpoints/standpoints';
import type { Mark } from '../overlay/mark';
import { paintMarks } from '../overlay/paint-marks';
import type { SharedLight } from './light';

export interface Picture {
  readonly blob: Blob;
  /** px of the picture. */
  readonly width: number;
  readonly height: number;
  /** Null where a hand has moved the camera since. */
  readonly standpoint: StandpointId | null;
  /** For a scale bar; null in perspective, where no length can be read off. */
  readonly millimetresPerPixel: number | null;
}

export interface CaptureJob {
  readonly gl: WebGLRenderer;
  readonly scene: Scene;
  readonly camera: Camera;
  readonly light: SharedLight;
  /** CSS px. */
  readonly width: number;
  readonly height: number;
  readonly scale: number;
  readonly marks: readonly Mark[];
}

/** Longest side that every graphics unit can draw, px. */
const LARGEST = 4096;

/**
 * Draws and copies in one go: without a kept drawing buffer the picture is gone at the next tick. What was on the screen has
 * to be drawn again afterwards.
 */
export function drawPicture({ gl, scene, camera, light, width, height, scale, marks }: CaptureJob): HTMLCanvasElement {
  const k = Math.min(scale, LARGEST / Math.max(width, height));
  const ratio = gl.getPixelRatio();
  const size = { width: gl.domElement.width / ratio, height: gl.domElement.height / ratio };
  const sheet = document.createElement('canvas');
  sheet.width = Math.round(width * k);
  sheet.height = Math.round(height * k);
  gl.setPixelRatio(1);
  gl.setSize(sheet.width, sheet.height, false);
  light.screen.value.set(sheet.width, sheet.height);
  light.density.value = k;
  gl.render(scene, camera);
  const pen = sheet.getContext('2d');
  pen?.drawImage(gl.domElement, 0, 0);
  if (pen !== null) paintMarks(pen, marks, k);
  gl.setPixelRatio(ratio);
  gl.setSize(size.width, size.height, false);
  return sheet;
}

export function blobOf(sheet: HTMLCanvasElement): Promise<Blob> {
  return new Promise((resolve, reject) => {
    sheet.toBlob((blob) => {
      if (blob === null) reject(new Error('The browser could not make a picture of this size. Try a smaller window.'));
      else resolve(blob);
    }, 'image/png');
  });
}
