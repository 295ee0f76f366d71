// A scene to turn in the hand and not to change: standpoints, the picture, a scrubber for each motion. For pages outside the
// bench.
import { useEffect, useMemo } from 'react';
import type { Finding } from '#shared/check';
import type { LengthDisplay } from '#shared/units';
import type { WordChoice } from '../../../lib/part-words';
import type { Bench } from '../bench-model';
import { openFinding } from '../open-finding';
import { StandpointBar } from '../standpoints/standpoint-bar';
import { Viewport, ViewportBoundary } from '../viewport/viewport';
import { hasWebGl2 } from '../viewport/webgl';
import { MeshNotes } from './mesh-notes';
import { MotionScrubbers } from './motion-scrubbers';
import { SceneFrame } from './scene-frame';
import { meshNamesOf } from './static-scene';
import '../styles/bench.css';
import '../styles/ladder.css';
import './scene-view.css';

export interface SceneViewProps {
  readonly bench: Bench;
  readonly display: LengthDisplay;
  readonly words: WordChoice;
}

export function SceneView({ bench, display, words }: SceneViewProps) {
  const canDraw = useMemo(() => hasWebGl2(), []);
  useEffect(() => {
    if (canDraw) bench.meshes.want(meshNamesOf(bench.open.getState().scene));
  }, [bench, canDraw]);
  return (
    <SceneFrame bench={bench} display={display} words={words} insets={INSETS}>
      <div className="scene-view on-dye" data-drawn={canDraw || undefined}>
        {canDraw ? (
          <>
            <StandpointBar />
            <div className="scene-stage">
              <ViewportBoundary fallback={<NoScene why="failed" />}>
                <Viewport />
              </ViewportBoundary>
              <MeshNotes />
            </div>
            <p className="scene-hint">
              <span className="scene-hint-touch">
                One finger turns, two fingers zoom and shift. Scroll beside the picture.
              </span>
              <span className="scene-hint-mouse">Drag turns, the wheel zooms, the right button shifts.</span>
            </p>
            <MotionScrubbers />
          </>
        ) : (
          <NoScene why="missing" />
        )}
      </div>
    </SceneFrame>
  );
}

const INSETS = { left: 8, right: 8, top: 8, bottom: 8 };

const NoScene = ({ why }: { readonly why: 'missing' | 'failed' }) => (
  <div className="scene-none" role="status">
    <p className="font-bold">{why === 'missing' ? 'The scene cannot be drawn here.' : 'Drawing the scene failed.'}</p>
    <p>
      {why === 'missing'
        ? 'This browser has no WebGL 2, or it is switched off. Picture, findings and figures are all on this page; a current browser with hardware acceleration on also turns the scene.'
        : 'Picture, findings and figures are still on this page. Load it again to have the scene back.'}
    </p>
  </div>
);

/** The motions go to where the finding is, the camera to its witness mark. */
export function showFinding(bench: Bench, finding: Finding): void {
  openFinding(bench, finding);
}
