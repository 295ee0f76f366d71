// How findings are said, on the bench, in reports and on share pages.
import { findingKey, type Finding } from '#shared/check';
import { depthOf } from '#shared/review';
import type { Component, Scene } from '#shared/scene';
import { formatPercent, gapParts, lengthParts, type LengthDisplay, type LengthParts } from '#shared/units';

export { findingKey };

export function nameOf(scene: Scene, id: string): string {
  return scene.components.find((c) => c.id === id)?.name ?? id;
}

export const pairName = (scene: Scene, finding: Pick<Finding, 'between'>): string =>
  `${nameOf(scene, finding.between[0])}, ${nameOf(scene, finding.between[1])}`;

export function motionName(scene: Scene, component: string, motion: string): string {
  const found: Component | undefined = scene.components.find((c) => c.id === component);
  return found?.motions.find((m) => m.id === motion)?.name ?? motion;
}

/** "at rest", "62 % of Brake stroke, 30 % of Clutch stroke". */
export function whereWords(scene: Scene, finding: Finding): string {
  if (finding.motions.length === 0) return 'at rest';
  return finding.motions
    .map((m, i) => `${formatPercent(finding.at.positions[i] ?? 0)} of ${motionName(scene, m.component, m.motion)}`)
    .join(', ');
}

export interface Reading {
  /** In front of the length: "overlaps". */
  readonly word: string;
  /** Null where the two touch and no depth is known. */
  readonly parts: LengthParts | null;
}

/**
 * The reading of a finding: its gap, rounded down; for an overlap its depth, rounded up. A gap that is proven over a whole
 * motion is the lower bound.
 */
export function readingOf(finding: Finding, display: LengthDisplay): Reading {
  const depth = depthOf(finding);
  if (finding.verdict === 'hits' || (finding.verdict === 'seated' && depth > 0)) {
    const word = finding.verdict === 'hits' ? (depth > 0 ? 'overlaps' : 'touches') : 'in by';
    if (depth <= 0) return { word, parts: null };
    return { word, parts: lengthParts(depth, display, { denominator: 32, rounding: 'up' }) };
  }
  return { word: '', parts: gapParts(finding.gapAtLeast, display) };
}

/** How high a finding stands on the ladder, mm: its margin, or minus its push-out where it hits. */
export function heightOf(finding: Finding): number {
  if (finding.verdict !== 'hits') return finding.margin;
  const depth = depthOf(finding);
  return depth > 0 ? -depth : Math.min(finding.margin, 0);
}
