// A revision with its report, read and put into the order in which the page tells it.
import type { Revision } from './revision';
import type { Report } from '#shared/check';
import { looseBoxes, missingFrom, rollCall, type LooseBox, type RollCallEntry } from '#shared/review';
import { loadScene, type Scene } from '#shared/scene';
import { readReport } from '../../lib/stored-report';

export interface ReportModel {
  readonly revision: Revision;
  readonly scene: Scene;
  readonly report: Report;
  readonly roll: readonly RollCallEntry[];
  readonly missing: readonly RollCallEntry[];
  readonly boxes: readonly LooseBox[];
}

export type ReadRevision =
  | { readonly ok: true; readonly model: ReportModel }
  /** `none`: no dry fit has come through yet. */
  | { readonly ok: false; readonly why: 'none' | 'unreadable' };

export function readRevisionReport(revision: Revision): ReadRevision {
  if (revision.report === null) return { ok: false, why: 'none' };
  const loaded = loadScene(revision.document);
  const report = readReport(revision.report);
  if (!loaded.ok || report === null) return { ok: false, why: 'unreadable' };
  const { scene } = loaded;
  const roll = rollCall(scene, revision.notOnThisCar);
  return { ok: true, model: { revision, scene, report, roll, missing: missingFrom(roll), boxes: looseBoxes(scene) } };
}
