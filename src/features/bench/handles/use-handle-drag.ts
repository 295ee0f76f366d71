// A drag of a handle: previews while the hand moves, one edit when it lets go, nothing at all if it is given up.
import { useEffect, useRef, useState, type PointerEvent } from 'react';
import type { Scene } from '#shared/scene';
import { useBench } from '../bench-model';
import { checked } from '../edits';
import type { Frame } from '../viewport/frame';
import { rayAt } from '../viewport/ray';
import type { Ray } from '../viewport/picking';

export type SnapMode = 'step' | 'fine' | 'free';

/** What a handle does with the hand: given where it points, the change so far and its reading; null where that says nothing. */
export type Follow<R> = (
  ray: Ray,
  mode: SnapMode,
) => { readonly change: (scene: Scene) => Scene; readonly reading: R } | null;

interface Held<R> {
  readonly follow: Follow<R>;
  readonly frame: Frame;
  readonly label: string;
  readonly box: DOMRect;
  change: ((scene: Scene) => Scene) | null;
}

export function useHandleDrag<R>() {
  const { open, view } = useBench();
  const held = useRef<Held<R> | null>(null);
  const pending = useRef(0);
  const [reading, setReading] = useState<R | null>(null);

  const end = (keep: boolean): void => {
    const drag = held.current;
    if (drag === null) return;
    held.current = null;
    cancelAnimationFrame(pending.current);
    view.hand()?.hold(false);
    setReading(null);
    const { apply, setPreview } = open.getState();
    if (keep && drag.change !== null) apply(checked(drag.label, drag.change));
    setPreview(null);
  };

  useEffect(() => {
    // given up: everything goes back to where it was
    const stop = (event: KeyboardEvent): void => {
      if (event.key !== 'Escape' || held.current === null) return;
      event.preventDefault();
      event.stopPropagation();
      end(false);
    };
    window.addEventListener('keydown', stop, true);
    return () => window.removeEventListener('keydown', stop, true);
  });

  return {
    reading,
    isDragging: reading !== null,
    begin: (event: PointerEvent<SVGElement>, frame: Frame, label: string, follow: Follow<R>): void => {
      if (event.button !== 0) return;
      event.preventDefault();
      event.stopPropagation();
      const svg = event.currentTarget.ownerSVGElement;
      if (svg === null) return;
      event.currentTarget.setPointerCapture(event.pointerId);
      view.hand()?.hold(true);
      held.current = { follow, frame, label, box: svg.getBoundingClientRect(), change: null };
    },
    move: (event: PointerEvent<SVGElement>): void => {
      const drag = held.current;
      if (drag === null) return;
      const mode: SnapMode = event.shiftKey ? 'free' : event.altKey ? 'fine' : 'step';
      const ray = rayAt(drag.frame, event.clientX - drag.box.left, event.clientY - drag.box.top);
      cancelAnimationFrame(pending.current);
      pending.current = requestAnimationFrame(() => {
        const next = drag.follow(ray, mode);
        if (next === null || held.current !== drag) return;
        drag.change = next.change;
        setReading(next.reading);
        open.getState().setPreview(next.change);
      });
    },
    drop: (): void => end(true),
    cancel: (): void => end(false),
  };
}
