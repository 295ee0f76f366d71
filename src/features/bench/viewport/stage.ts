// The stage: everything of the scene that is drawn in WebGL, brought in step with what is to be shown. Plain three.
import { Group } from 'three';
import type { Finding } from '#shared/check';
import type { Component, Motion, Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { createBackdrop } from './backdrop';
import { motionKey, type Positions } from './bodies';
import { createCurtains } from './curtain';
import { sceneBox } from './extent';
import { createFan, type FanSpans } from './fan';
import { createGround } from './ground';
import { createLight, setCut, throwLasers, type Cut, type SharedLight } from './light';
import { lookOf } from './look';
import type { MeshSource } from './mesh-source';
import { createPartsLayer } from './parts-layer';
import { spansOf } from '../../../lib/spans';
import type { Box } from './vectors';

export interface StageState {
  /** The document as it is kept, and as it is shown while a hand moves something. */
  readonly kept: Scene;
  readonly shown: Scene;
  readonly positions: Positions;
  readonly selected: ReadonlySet<string>;
  readonly hovered: string | null;
  readonly presence: Readonly<Record<string, 'faded' | 'off'>>;
  /** The pair that is looked at: everything else stands back. */
  readonly focus: ReadonlySet<string> | null;
  readonly showsLasers: boolean;
  readonly cut: Cut | null;
  /** The motion whose swept arc is shown, by motionKey. */
  readonly arc: string | null;
  readonly findings: readonly Finding[];
  readonly display: LengthDisplay;
  /** Counts the meshes that have come in. */
  readonly meshVersion: number;
}

export interface Stage {
  readonly root: Group;
  readonly light: SharedLight;
  readonly update: (next: StageState) => void;
  readonly dispose: () => void;
}

const FALLBACK: Box = { low: [-500, -700, 0], high: [700, 700, 900] };
/** The curtains reach a little beyond what they are thrown on, mm. */
const BEYOND = 60;

function widened({ low, high }: Box): Box {
  return {
    low: [low[0] - BEYOND, low[1] - BEYOND, low[2]],
    high: [high[0] + BEYOND, high[1] + BEYOND, high[2] + BEYOND],
  };
}

export function findMotion(scene: Scene, key: string): { component: Component; motion: Motion } | null {
  for (const component of scene.components) {
    for (const motion of component.motions) {
      if (motionKey(component.id, motion.id) === key) return { component, motion };
    }
  }
  return null;
}

export function createStage(meshes: MeshSource): Stage {
  const light = createLight();
  const root = new Group();
  const backdrop = createBackdrop(light);
  const ground = createGround(light);
  const curtains = createCurtains(light);
  const parts = createPartsLayer(light);
  const fan = createFan(light);
  root.add(backdrop, ground.mesh, parts.root, curtains.root, fan.root);
  let last: StageState | null = null;

  const changed = (next: StageState, ...keys: readonly (keyof StageState)[]): boolean =>
    last === null || keys.some((key) => last?.[key] !== next[key]);

  function layGround(next: StageState): void {
    const box = sceneBox(next.kept, meshes) ?? FALLBACK;
    ground.lay(box, next.display);
    throwLasers(light, next.showsLasers ? next.kept.lasers : []);
    // one curtain, for the datum that the rest is set off from
    curtains.hang(next.showsLasers ? next.kept.lasers.slice(0, 1) : [], widened(box));
  }

  function dress(next: StageState): void {
    parts.dress(
      (component) => ({
        look: lookOf(component, next.presence[component.id] === 'faded'),
        isOff: next.presence[component.id] === 'off',
        isSelected: next.selected.has(component.id),
        isHovered: next.hovered === component.id,
        isBehind: next.focus !== null && !next.focus.has(component.id),
      }),
      next.shown,
      next.cut !== null,
    );
  }

  function spreadFan(next: StageState): void {
    const found = next.arc === null ? null : findMotion(next.shown, next.arc);
    if (found === null) {
      fan.fold();
      return;
    }
    const spans: FanSpans = spansOf(next.findings, found.component.id, found.motion.id);
    fan.spread(next.shown, found.component, found.motion, meshes, spans);
  }

  return {
    root,
    light,
    update: (next) => {
      if (changed(next, 'shown', 'meshVersion')) parts.sync(next.shown, meshes);
      if (changed(next, 'shown', 'positions', 'meshVersion')) parts.place(next.shown, next.positions);
      if (changed(next, 'cut')) setCut(light, next.cut);
      if (changed(next, 'shown', 'meshVersion', 'selected', 'hovered', 'presence', 'focus', 'cut')) dress(next);
      if (changed(next, 'kept', 'meshVersion', 'display', 'showsLasers')) layGround(next);
      if (changed(next, 'arc') || (next.arc !== null && changed(next, 'shown', 'findings', 'meshVersion'))) {
        spreadFan(next);
      }
      last = next;
    },
    dispose: () => {
      parts.dispose();
      fan.dispose();
      curtains.dispose();
      ground.dispose();
      backdrop.geometry.dispose();
    },
  };
}
