// The darkroom with a scene of its own; loaded by itself, as a report is read long before its pictures are drawn.
import { useState } from 'react';
import { Darkroom, type DarkroomProps } from './darkroom';
import { createStaticScene, type StaticSceneParts } from './static-scene';

export type StaticDarkroomProps = StaticSceneParts & Omit<DarkroomProps, 'bench'>;

export function StaticDarkroom({ display, words, onReady, onFail, ...parts }: StaticDarkroomProps) {
  const [bench] = useState(() => createStaticScene({ ...parts, showsLasers: false }));
  return <Darkroom bench={bench} display={display} words={words} onReady={onReady} onFail={onFail} />;
}
