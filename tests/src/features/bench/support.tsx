// A bench without a server and without a picture: a small scene, plain stores, and what is needed to set the screens up.
import { render } from '@testing-library/react';
import { useState, type ReactNode } from 'react';
import { MemoryRouter } from 'react-router-dom';
import { createStore } from 'zustand';
import type { Finding, Verdict } from '#shared/check';
import { newScene, type Category, type Component, type Scene, type Solid } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { HintProvider } from '../../../../src/components/hint';
import type { LiveCheck, OpenScene } from '../../../../src/document/types';
import { BenchContext, FactsContext, type Bench, type BenchFacts } from '../../../../src/features/bench/bench-model';
import { createSession } from '../../../../src/features/bench/session';
import { createFrameStore } from '../../../../src/features/bench/viewport/frame';
import type { MeshSource } from '../../../../src/features/bench/viewport/mesh-source';
import { createViewControl } from '../../../../src/features/bench/viewport/view-control';

export function box(
  id: string,
  category: Category,
  size: readonly [number, number, number],
  at: readonly [number, number, number],
  more: Partial<Component> = {},
): Component {
  const solid: Solid = { id: 'body', shape: { kind: 'box', size } };
  return {
    id,
    name: id.charAt(0).toUpperCase() + id.slice(1).replaceAll('-', ' '),
    category,
    pose: { at },
    tolerance: 2,
    solids: [solid],
    motions: [],
    holes: [],
    ...more,
  };
}

const STROKE = {
  id: 'stroke',
  name: 'Brake stroke',
  use: 'operating',
  steps: [{ kind: 'swing', point: [0, 0, 0], axis: [0, 1, 0], from: 0, to: 20 }],
} as const;

/** A firewall and a floor, a column, two pedals and a bracket clamped together as a pedal box; a laser on the column. */
export function smallScene(): Scene {
  return {
    ...newScene('Layout 1', 'in'),
    lasers: [{ id: 'column-line', name: 'Column line', point: [0, 300, 0], normal: [0, 1, 0] }],
    groups: [{ id: 'pedal-box', name: 'Pedal box', pose: { at: [100, 400, 600] } }],
    components: [
      box('firewall', 'firewall', [2, 1300, 600], [0, 0, 500]),
      box('floor', 'floor', [800, 1300, 2], [500, 0, 49]),
      box('column', 'column', [700, 40, 40], [400, 300, 600]),
      box('brake-pedal', 'pedal', [20, 12, 240], [0, 40, -120], { group: 'pedal-box', motions: [STROKE] }),
      box('clutch-pedal', 'pedal', [20, 12, 240], [0, -60, -120], { group: 'pedal-box' }),
      box('wiper', 'wiper', [100, 100, 100], [-200, 0, 700], { source: 'measured' }),
    ],
  };
}

export function finding(a: string, b: string, verdict: Verdict, more: Partial<Finding> = {}): Finding {
  const gap = more.gap ?? (verdict === 'hits' ? 0 : 10);
  return {
    between: a < b ? [a, b] : [b, a],
    motions: [],
    verdict,
    required: 10,
    rule: 'gap',
    gap,
    gapAtLeast: gap,
    margin: gap - 10,
    at: {
      positions: [],
      points: [
        [0, 0, 0],
        [0, gap, 0],
      ],
      solids: ['body', 'body'],
    },
    hitSpans: [],
    tightSpans: [],
    overlap: null,
    ...more,
  };
}

// the page's fonts are there
if (typeof document !== 'undefined' && !('fonts' in document)) {
  Object.defineProperty(document, 'fonts', {
    value: Object.assign(new EventTarget(), { check: () => true }),
  });
}

export const NO_MESHES: MeshSource = {
  get: () => undefined,
  want: () => undefined,
  retry: () => undefined,
  version: () => 0,
  subscribe: () => () => undefined,
};

type OpenStore = ReturnType<typeof openStore>;

function openStore(scene: Scene, canEdit: boolean) {
  const past: { label: string; scene: Scene }[] = [];
  return createStore<OpenScene>()((set, get) => ({
    sceneId: 'scene',
    scene,
    preview: null,
    save: { kind: 'saved', saveNumber: 1 },
    canEdit,
    undoLabel: null,
    redoLabel: null,
    apply: ({ label, edit }) => {
      const next = edit(get().scene);
      if (next === get().scene) return;
      past.push({ label, scene: get().scene });
      set({ scene: next, undoLabel: label });
    },
    setPreview: (edit) => set({ preview: edit === null ? null : edit(get().scene) }),
    undo: () => {
      const last = past.pop();
      if (last !== undefined) set({ scene: last.scene, undoLabel: past.at(-1)?.label ?? null, redoLabel: last.label });
    },
    redo: () => undefined,
    settle: () => undefined,
  }));
}

export interface TestBench extends Bench {
  readonly open: OpenStore;
}

export interface BenchOptions {
  readonly scene?: Scene;
  readonly findings?: readonly Finding[];
  readonly canEdit?: boolean;
}

export function testBench({ scene = smallScene(), findings = [], canEdit = true }: BenchOptions = {}): TestBench {
  return {
    open: openStore(scene, canEdit),
    live: createStore<LiveCheck>(() => ({
      phase: 'done',
      done: 0,
      total: 0,
      findings,
      unchecked: [],
      meshes: [],
      problem: null,
    })),
    session: createSession(),
    meshes: NO_MESHES,
    frames: createFrameStore(),
    view: createViewControl(),
  };
}

interface Around {
  readonly bench: Bench;
  readonly start: LengthDisplay;
  readonly facts: Partial<BenchFacts>;
  readonly children: ReactNode;
}

function AroundBench({ bench, start, facts, children }: Around) {
  const [display, setDisplay] = useState<LengthDisplay>(start);
  const whole: BenchFacts = {
    display,
    setDisplay,
    words: 'us',
    teamId: 'team',
    projectId: 'project',
    projectName: 'Pickup',
    absent: [],
    setAbsent: null,
    ...facts,
  };
  return (
    <MemoryRouter>
      <HintProvider>
        <BenchContext value={bench}>
          <FactsContext value={whole}>{children}</FactsContext>
        </BenchContext>
      </HintProvider>
    </MemoryRouter>
  );
}

export function mount(
  bench: Bench,
  children: ReactNode,
  { display = 'in', ...facts }: Partial<BenchFacts> = {},
): ReturnType<typeof render> {
  return render(
    <AroundBench bench={bench} start={display} facts={facts}>
      {children}
    </AroundBench>,
  );
}
