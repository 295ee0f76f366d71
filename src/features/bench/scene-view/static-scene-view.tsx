// A scene to be looked at, complete: stores, meshes, picture. Loaded by itself, so that a page can show the rest before it.
import { useEffect, useState } from 'react';
import type { Finding } from '#shared/check';
import { hasWebGl2 } from '../viewport/webgl';
import { SceneView, showFinding, type SceneViewProps } from './scene-view';
import { createStaticScene, type StaticSceneParts } from './static-scene';

export interface StaticSceneViewProps extends StaticSceneParts, Pick<SceneViewProps, 'display' | 'words'> {
  /** Called, where the scene can be drawn, with a way to show a finding in it. */
  readonly onReady: (show: (finding: Finding) => void) => void;
}

/** The parts are taken as they are at first; for another scene give it another key. */
export function StaticSceneView({ display, words, onReady, ...parts }: StaticSceneViewProps) {
  const [bench] = useState(() => createStaticScene(parts));
  useEffect(() => {
    if (hasWebGl2()) onReady((finding) => showFinding(bench, finding));
  }, [bench, onReady]);
  return <SceneView bench={bench} display={display} words={words} />;
}
