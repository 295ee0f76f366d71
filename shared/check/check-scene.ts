// All findings of a scene, in the order of the report.
import { GapMeter } from '#shared/geometry';
import { computeFinding } from './finding';
import { byId, planCheck, type Plan } from './plan';
import type { Prepared } from './prepare';
import { ENGINE_VERSION, VERDICTS, type Finding, type Report, type Verdict } from './report';

/** Worst verdict first, then least margin, then ids, then motions. */
export function compareFindings(x: Finding, y: Finding): number {
  return (
    VERDICTS.indexOf(x.verdict) - VERDICTS.indexOf(y.verdict) ||
    x.margin - y.margin ||
    byId(x.between[0], y.between[0]) ||
    byId(x.between[1], y.between[1]) ||
    byId(motionKey(x), motionKey(y))
  );
}

/** Names a finding within a scene, whatever its figures: the pair and the motions it was checked in. */
export function findingKey(f: Pick<Finding, 'between' | 'motions'>): string {
  return `${f.between[0]}|${f.between[1]}|${motionKey(f)}`;
}

function motionKey(f: Pick<Finding, 'motions'>): string {
  return f.motions.map((m) => `${m.component}.${m.motion}`).join('+');
}

/** Puts a report together from findings that were worked out anywhere, in any order. */
export function assembleReport(prepared: Prepared, plan: Plan, findings: readonly Finding[], sha256: string): Report {
  const totals: Record<Verdict, number> = { hits: 0, tight: 0, loose: 0, seated: 0, clears: 0 };
  for (const f of findings) totals[f.verdict] += 1;
  return {
    format: 'gapwright-report',
    version: 1,
    engine: ENGINE_VERSION,
    scene: { name: prepared.scene.name, sha256 },
    accuracy: prepared.scene.accuracy,
    meshes: prepared.meshes,
    totals,
    unchecked: plan.unchecked,
    findings: [...findings].sort(compareFindings),
  };
}

/**
 * Checks a whole scene.
 * @param sha256 of the document's bytes, for the report
 * @param onProgress told how many findings of how many are done
 */
export function checkScene(
  prepared: Prepared,
  sha256: string,
  onProgress?: (done: number, total: number) => void,
): Report {
  const plan = planCheck(prepared);
  const meter = new GapMeter();
  const findings: Finding[] = [];
  for (const task of plan.tasks) {
    findings.push(computeFinding(prepared, task, meter));
    onProgress?.(findings.length, plan.tasks.length);
  }
  return assembleReport(prepared, plan, findings, sha256);
}
