// How the scene is looked at, apart from any camera: where to, from which side, how much of it.
import { add, centreOf, cornersOf, cross, dot, scale, sub, unit, type Box, type Triple } from './vectors';

export interface View {
  /** What is in the middle of the free area. */
  readonly target: Triple;
  /** Where the eye is, seen from the target: degrees around from the rear (+X) towards the right (+Y). */
  readonly around: number;
  /** Degrees above the level. */
  readonly above: number;
  /** mm that the height of the whole picture shows at the target. */
  readonly span: number;
  /** Square-on: without perspective, so that lengths can be read off. */
  readonly isSquare: boolean;
}

/** The picture, and the part of it that nothing is laid over, CSS px. */
export interface FreeArea {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

export const FIELD_OF_VIEW = 32;

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

/** Straight down would leave it open what is up in the picture. */
const STEEPEST = 89.999;

/** From the target to the eye. */
export function eyeDirection({ around, above }: Pick<View, 'around' | 'above'>): Triple {
  const steep = radians(Math.max(-STEEPEST, Math.min(STEEPEST, above)));
  const level = Math.cos(steep);
  return [level * Math.cos(radians(around)), level * Math.sin(radians(around)), Math.sin(steep)];
}

/** Right and up of the picture, in the car. */
export function pictureAxes(view: Pick<View, 'around' | 'above'>): { readonly right: Triple; readonly up: Triple } {
  const right: Triple = [-Math.sin(radians(view.around)), Math.cos(radians(view.around)), 0];
  return { right, up: unit(cross(eyeDirection(view), right)) };
}

export const eyeDistance = (span: number, fieldOfView = FIELD_OF_VIEW): number =>
  span / 2 / Math.tan(radians(fieldOfView / 2));

export function eyeOf(view: View, fieldOfView = FIELD_OF_VIEW): Triple {
  return add(view.target, scale(eyeDirection(view), eyeDistance(view.span, fieldOfView)));
}

/** The look from a side that shows a whole box in the free area. @param room 1: just so; more: with room around it */
export function fitView(
  from: Pick<View, 'around' | 'above' | 'isSquare'>,
  box: Box,
  area: FreeArea,
  room: number,
): View {
  const { right, up } = pictureAxes(from);
  const middle = centreOf(box);
  const corners = cornersOf(box).map((p) => sub(p, middle));
  const reach = (axis: Triple): number => Math.max(...corners.map((p) => Math.abs(dot(p, axis))), 1);
  const freeWidth = Math.max(area.width - area.left - area.right, 80);
  const freeHeight = Math.max(area.height - area.top - area.bottom, 80);
  const perPixel = Math.max((2 * reach(right)) / freeWidth, (2 * reach(up)) / freeHeight);
  // what stands nearer than the middle looks larger in perspective
  const depth = from.isSquare ? 0 : reach(eyeDirection(from));
  const span = perPixel * area.height * room;
  const nearer = from.isSquare ? 1 : 1 + (0.55 * depth) / eyeDistance(span);
  return { ...from, target: middle, span: span * nearer };
}

/** The look with the sheet shifted by CSS px of a picture that is `height` px high; the scene goes the other way. */
export function pannedView(view: View, right: number, up: number, height: number): View {
  const axes = pictureAxes(view);
  const mm = view.span / height;
  return { ...view, target: add(view.target, add(scale(axes.right, right * mm), scale(axes.up, up * mm))) };
}

/** The short way round from one angle to another. */
const turnBetween = (a: number, b: number, t: number): number => a + (((b - a + 540) % 360) - 180) * t;

export function mixViews(a: View, b: View, t: number): Omit<View, 'isSquare'> {
  return {
    target: add(a.target, scale(sub(b.target, a.target), t)),
    around: turnBetween(a.around, b.around, t),
    above: a.above + (b.above - a.above) * t,
    // zooming looks even if every step changes the size by the same share
    span: a.span * (b.span / a.span) ** t,
  };
}
