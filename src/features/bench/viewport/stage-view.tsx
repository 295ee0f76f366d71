// Inside the canvas: draws the stage when something has changed, and only then.
import { useFrame, useThree } from '@react-three/fiber';
import { useEffect, useLayoutEffect, useMemo, useRef } from 'react';
import { useBench, useFacts } from '../bench-model';
import { viewFrom, zoneOf } from '../standpoints/standpoints';
import { cameraHand } from './camera-hand';
import { useInsets } from './insets';
import { usePointer } from './use-pointer';
import { createStageReader } from './read-stage';
import { createRig } from './rig';
import { drawStage, type Running } from './running';
import { createStage } from './stage';
import type { FreeArea } from './view';
import { isCalm } from './webgl';

export function StageView() {
  const bench = useBench();
  const { display } = useFacts();
  const insets = useInsets();
  const gl = useThree((s) => s.gl);
  const scene = useThree((s) => s.scene);
  const size = useThree((s) => s.size);
  const invalidate = useThree((s) => s.invalidate);
  const running = useRef<Running | null>(null);
  const area = useMemo<FreeArea>(
    () => ({ width: size.width, height: size.height, ...insets }),
    [size.width, size.height, insets],
  );
  const now = useRef({ display, area });

  useLayoutEffect(() => {
    now.current = { display, area };
    running.current?.rig.resize(area);
    running.current?.standAnew();
    running.current?.refresh();
  }, [display, area]);

  useEffect(() => {
    const { open, live, session, meshes, view } = bench;
    const read = createStageReader(bench);
    const stage = createStage(meshes);
    const zone = () => zoneOf(open.getState().scene, meshes);
    let isTaken = false;
    const rig = createRig(
      {
        element: gl.domElement,
        calm: isCalm,
        onMove: invalidate,
        onTaken: (isSquare) => {
          isTaken = true;
          if (!isSquare && session.getState().standpoint !== null) session.getState().set({ standpoint: null });
        },
      },
      viewFrom(session.getState().standpoint ?? 'bay', zone(), now.current.area),
      now.current.area,
    );
    if (session.getState().standpoint === null) session.getState().set({ standpoint: 'bay' });
    scene.add(stage.root);
    const refresh = (): void => {
      stage.update(read(now.current.display));
      invalidate();
    };
    const standAnew = (): void => {
      const { standpoint } = session.getState();
      if (!isTaken && standpoint !== null) rig.go(viewFrom(standpoint, zone(), now.current.area), true);
    };
    const onMeshes = (): void => {
      refresh();
      standAnew();
    };
    running.current = { stage, rig, refresh, standAnew };
    const detach = view.attach(
      cameraHand({
        rig,
        stage,
        gl,
        scene,
        bench,
        read,
        area: () => now.current.area,
        facts: () => now.current,
        refresh,
      }),
    );
    const stops = [
      open.subscribe(refresh),
      session.subscribe((s, before) => {
        if (s.standpoint !== before.standpoint && s.standpoint !== null) isTaken = false;
        refresh();
      }),
      live.subscribe(refresh),
      meshes.subscribe(onMeshes),
    ];
    refresh();
    return () => {
      for (const stop of stops) stop();
      detach();
      running.current = null;
      stage.root.removeFromParent();
      stage.dispose();
      rig.dispose();
    };
  }, [bench, gl, scene, invalidate]);

  usePointer(gl.domElement, running);

  useFrame(() => {
    const run = running.current;
    if (run === null) return;
    if (run.rig.step(performance.now())) invalidate();
    drawStage(run, gl, scene);
    bench.frames.set(run.rig.frame());
  }, 1);
  return null;
}
