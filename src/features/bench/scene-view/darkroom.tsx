// Where findings are drawn for their pictures: a small canvas out of sight, which hands out one function that draws.
import { useEffect, useMemo } from 'react';
import type { Finding } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import type { WordChoice } from '../../../lib/part-words';
import type { Bench } from '../bench-model';
import type { Picture } from '../viewport/capture';
import { Viewport, ViewportBoundary } from '../viewport/viewport';
import { hasWebGl2 } from '../viewport/webgl';
import { SceneFrame } from './scene-frame';
import { meshNamesOf } from './static-scene';
import '../styles/bench.css';

/** CSS px; the picture is twice as large. Small, so that its words can be read beside a line of text. */
const SIZE = { width: 320, height: 210 };

export type TakeFinding = (finding: Finding) => Promise<Picture>;

export interface DarkroomProps {
  readonly bench: Bench;
  readonly display: LengthDisplay;
  readonly words: WordChoice;
  /** Called once all is there to be drawn. */
  readonly onReady: (take: TakeFinding) => void;
  /** This browser cannot draw. */
  readonly onFail: () => void;
}

export function Darkroom({ bench, display, words, onReady, onFail }: DarkroomProps) {
  const canDraw = useMemo(() => hasWebGl2(), []);
  useEffect(() => {
    if (!canDraw) {
      onFail();
      return undefined;
    }
    let isOver = false;
    bench.meshes.want(meshNamesOf(bench.open.getState().scene));
    void whenDrawable(bench, () => isOver).then((take) => {
      if (!isOver) onReady(take);
    });
    return () => {
      isOver = true;
    };
  }, [bench, canDraw, onReady, onFail]);
  if (!canDraw) return null;
  return (
    <div
      className="no-print pointer-events-none fixed top-0 -z-10 overflow-hidden"
      style={{ ...SIZE, left: -2 * SIZE.width }}
      inert
      aria-hidden="true"
    >
      <ViewportBoundary fallback={<Failed onFail={onFail} />}>
        <SceneFrame bench={bench} display={display} words={words}>
          <Viewport />
        </SceneFrame>
      </ViewportBoundary>
    </div>
  );
}

function Failed({ onFail }: Pick<DarkroomProps, 'onFail'>) {
  useEffect(onFail, [onFail]);
  return null;
}

const tick = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** Waits for the camera, and for every mesh to be there or to have failed. */
async function whenDrawable({ view, meshes, open }: Bench, isOver: () => boolean): Promise<TakeFinding> {
  const names = meshNamesOf(open.getState().scene);
  const isOpen = (): boolean => names.some((name) => ['reading', undefined].includes(meshes.get(name)?.state));
  while (!isOver() && (view.hand() === null || isOpen())) await tick(80);
  await document.fonts.ready;
  return (finding) => {
    const hand = view.hand();
    if (hand === null) return Promise.reject(new Error('The scene is not drawn any more.'));
    return hand.captureFinding(finding, SIZE);
  };
}
