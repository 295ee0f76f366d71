// The strokes that a finding was checked over, with where on them it hits and is tight.
import type { Finding, Span } from '#shared/check';
import type { Component, Motion, Scene } from '#shared/scene';
import { spansOf } from './spans';

export interface Stroke {
  readonly component: Component;
  readonly motion: Motion;
  readonly hits: readonly Span[];
  readonly tight: readonly Span[];
  /** 0 to 1. */
  readonly witness: number;
}

export function strokesOf(scene: Scene, finding: Finding): Stroke[] {
  return finding.motions.flatMap((ref, i) => {
    const component = scene.components.find((c) => c.id === ref.component);
    const motion = component?.motions.find((m) => m.id === ref.motion);
    if (component === undefined || motion === undefined) return [];
    return [
      { component, motion, ...spansOf([finding], ref.component, ref.motion), witness: finding.at.positions[i] ?? 0 },
    ];
  });
}
