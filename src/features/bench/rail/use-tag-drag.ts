// Dragging a tag along the rail to another place in the fitting order.
import { useRef, useState, type PointerEvent, type RefObject } from 'react';

export interface TagDrag {
  readonly id: string;
  /** The place among the other tags where it would be put. */
  readonly place: number;
  readonly x: number;
}

const START = 6;

/** The place in the row of tags that a pointer is nearest to. */
function placeAt(rail: HTMLElement, x: number, id: string): number {
  const others = [...rail.querySelectorAll<HTMLElement>('[data-part]')].filter((tag) => tag.dataset['part'] !== id);
  return others.filter((tag) => {
    const { left, width } = tag.getBoundingClientRect();
    return left + width / 2 < x;
  }).length;
}

export function useTagDrag(
  rail: RefObject<HTMLElement | null>,
  enabled: boolean,
  onDrop: (id: string, place: number) => void,
) {
  const [drag, setDrag] = useState<TagDrag | null>(null);
  const from = useRef<{ id: string; x: number; pointer: number } | null>(null);
  const suppress = useRef(false);
  const handlers = (id: string) => ({
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      suppress.current = false;
      // a finger scrolls the rail; there the menu moves a tag
      if (enabled && event.button === 0 && event.pointerType !== 'touch') {
        from.current = { id, x: event.clientX, pointer: event.pointerId };
      }
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      const start = from.current;
      if (start === null || rail.current === null) return;
      if (drag === null && Math.abs(event.clientX - start.x) < START) return;
      event.currentTarget.setPointerCapture(start.pointer);
      setDrag({ id, place: placeAt(rail.current, event.clientX, id), x: event.clientX - start.x });
    },
    onPointerUp: () => {
      from.current = null;
      if (drag === null) return;
      suppress.current = true;
      onDrop(drag.id, drag.place);
      setDrag(null);
    },
    onPointerCancel: () => {
      from.current = null;
      setDrag(null);
    },
    // letting go after a drag is not a choice
    onClickCapture: (event: { preventDefault: () => void; stopPropagation: () => void }) => {
      if (!suppress.current) return;
      suppress.current = false;
      event.preventDefault();
      event.stopPropagation();
    },
  });
  return { drag, handlers };
}
