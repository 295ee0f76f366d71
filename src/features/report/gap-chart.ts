// The gap chart: parts against parts, as a road atlas sets towns against towns. Every pair shows its worst finding.
import type { Finding, Report } from '#shared/check';
import type { Component, Scene } from '#shared/scene';

export interface GapChart {
  /** In the document's order. */
  readonly parts: readonly Component[];
  /** Parts that the chart leaves out. */
  readonly left: number;
  /** The worst finding of two parts; null where they were not compared. */
  readonly worst: (a: string, b: string) => Finding | null;
}

const keyOf = (a: string, b: string): string => (a < b ? `${a}|${b}` : `${b}|${a}`);

/** @param most parts in the chart: those with the closest calls */
export function gapChart(scene: Scene, report: Report, most: number): GapChart {
  const worst = new Map<string, Finding>();
  const ranked = new Set<string>();
  for (const finding of report.findings) {
    const key = keyOf(...finding.between);
    if (!worst.has(key)) worst.set(key, finding);
    // joints say nothing about room
    if (finding.verdict !== 'seated') for (const id of finding.between) ranked.add(id);
  }
  const chosen = new Set([...ranked].slice(0, most));
  const parts = scene.components.filter((c) => chosen.has(c.id));
  return { parts, left: ranked.size - parts.length, worst: (a, b) => worst.get(keyOf(a, b)) ?? null };
}
