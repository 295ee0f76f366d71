// The pointer over the scene: what it hovers, what a click selects, where a menu opens.
import { useEffect, type RefObject } from 'react';
import { Raycaster, Vector2 } from 'three';
import { useBench, type Bench } from '../bench-model';
import { clickPart } from '../click-part';
import { cutOf } from '../cutaway/cut-of';
import { pickAll, type Hit } from './picking';
import type { Running } from './running';

/** A pointer that moved no farther was a click, px. */
const CLICK = 5;

const caster = new Raycaster();

function hitsAt(bench: Bench, { rig }: Running, element: HTMLElement, x: number, y: number): Hit[] {
  const { left, top, width, height } = element.getBoundingClientRect();
  caster.setFromCamera(new Vector2(((x - left) / width) * 2 - 1, 1 - ((y - top) / height) * 2), rig.camera());
  const { open, session, meshes } = bench;
  const { presence, positions, cutOn } = session.getState();
  const { scene, preview } = open.getState();
  return pickAll(
    {
      scene: preview ?? scene,
      positions,
      meshes,
      isOff: (id) => presence[id] === 'off',
      isFaded: (id) => presence[id] === 'faded',
      cut: cutOf(scene, cutOn),
    },
    { from: caster.ray.origin.toArray(), along: caster.ray.direction.toArray() },
  );
}

export function usePointer(element: HTMLElement, running: RefObject<Running | null>): void {
  const bench = useBench();
  useEffect(() => {
    const { session } = bench;
    let down: { x: number; y: number; button: number } | null = null;
    let asked: { x: number; y: number } | null = null;
    let frame = 0;
    const hits = (x: number, y: number): Hit[] =>
      running.current === null ? [] : hitsAt(bench, running.current, element, x, y);
    const hover = (): void => {
      frame = 0;
      if (asked === null) return;
      const hovered = hits(asked.x, asked.y)[0]?.component ?? null;
      if (hovered !== session.getState().hovered) session.getState().set({ hovered });
      element.style.cursor = hovered === null ? 'grab' : 'pointer';
    };
    const stop = new AbortController();
    const on = <K extends keyof HTMLElementEventMap>(name: K, hear: (event: HTMLElementEventMap[K]) => void): void =>
      element.addEventListener(name, hear, { signal: stop.signal });
    on('pointermove', (event) => {
      if (event.buttons !== 0 || event.pointerType === 'touch') return;
      asked = { x: event.clientX, y: event.clientY };
      if (frame === 0) frame = requestAnimationFrame(hover);
    });
    on('pointerleave', () => {
      asked = null;
      if (session.getState().hovered !== null) session.getState().set({ hovered: null });
    });
    on('pointerdown', (event) => {
      down = event.isPrimary ? { x: event.clientX, y: event.clientY, button: event.button } : null;
    });
    on('pointerup', (event) => {
      const from = down;
      down = null;
      if (from === null || Math.hypot(event.clientX - from.x, event.clientY - from.y) > CLICK) return;
      const found = hits(event.clientX, event.clientY);
      if (from.button === 0) {
        clickPart(bench, behind(found, event.altKey, session.getState().selected), event.shiftKey);
      } else if (from.button === 2) {
        const first = found[0]?.component;
        if (first !== undefined && !session.getState().selected.includes(first)) clickPart(bench, first, false);
        session.getState().set({ menuAt: { x: event.clientX, y: event.clientY } });
      }
    });
    // the menu is ours and opens when the button comes up, as dragging with it pans
    on('contextmenu', (event) => event.preventDefault());
    return () => {
      stop.abort();
      cancelAnimationFrame(frame);
    };
  }, [bench, element, running]);
}

/** The first thing; with Alt the one behind the one that is selected. */
function behind(found: readonly Hit[], wantsNext: boolean, selected: readonly string[]): string | null {
  if (!wantsNext) return found[0]?.component ?? null;
  const at = found.findIndex((hit) => hit.component === selected.at(-1));
  return found[(at + 1) % Math.max(found.length, 1)]?.component ?? null;
}
