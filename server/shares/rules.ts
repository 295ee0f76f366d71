// What a share link opens: one revision, thinned out to what the public may see.
import { randomBytes } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { meshNames, type Finding, type Report } from '#shared/check';
import { missingFrom, reportSentence, rollCall, type RollCallKey } from '#shared/review';
import { loadScene, type Scene } from '#shared/scene';
import { tables, type Queryable } from '../db/client';
import { findRevision } from '../dry-fits/rules';
import { ApiError } from '../http/api-error';

const { picture, share } = tables;

/** 192 bits: not to be guessed. */
export const newToken = (): string => randomBytes(24).toString('base64url');

export const isToken = (text: string): boolean => /^[A-Za-z0-9_-]{20,64}$/.test(text);

/** Clear pairs fill the list of closest calls up to so many. */
const LEAST_SHOWN = 12;
/** Trouble goes out whole, so that a stroke never looks clearer than it is; up to what a phone can take. */
const MOST_SHOWN = 400;

export interface OpenShare {
  readonly row: typeof share.$inferSelect;
  readonly revision: Awaited<ReturnType<typeof findRevision>>;
  readonly scene: Scene;
  readonly report: Report | null;
  /** Meshes in the order in which the shared document numbers them. */
  readonly meshes: readonly string[];
}

/** The share behind a token. A wrong token is nothing; a revoked one says so. */
export async function openShare(db: Queryable, token: string): Promise<OpenShare> {
  // an address of a page may hold anything
  if (!isToken(token)) throw new ApiError('thing/missing');
  const [row] = await db.select().from(share).where(eq(share.token, token));
  if (row === undefined) throw new ApiError('thing/missing');
  const revision = await findRevision(db, row.revisionId);
  const isDeleted = revision.sceneDeletedAt !== null || revision.project.deletedAt !== null;
  if (row.revokedAt !== null || isDeleted) throw new ApiError('share/revoked');
  const loaded = loadScene(JSON.parse(revision.revision.documentText));
  if (!loaded.ok) throw new ApiError('server/failed');
  return {
    row,
    revision,
    scene: loaded.scene,
    report: revision.report as Report | null,
    meshes: meshNames(loaded.scene),
  };
}

/** The document for drawing: shapes, poses and motions. Notes, recipes, tolerances and rules stay in the team. */
function drawable(scene: Scene, meshes: readonly string[]): unknown {
  return {
    name: scene.name,
    display: scene.display,
    lasers: scene.lasers,
    groups: scene.groups,
    components: scene.components.map((c) => ({
      id: c.id,
      name: c.name,
      category: c.category,
      group: c.group,
      pose: c.pose,
      source: c.source,
      motions: c.motions,
      solids: c.solids.map((s) => ({
        ...s,
        shape: s.shape.kind === 'mesh' ? { ...s.shape, mesh: String(meshes.indexOf(s.shape.mesh)) } : s.shape,
      })),
    })),
  };
}

function shownFindings(findings: readonly Finding[]): Finding[] {
  const trouble = findings.filter((f) => f.verdict !== 'seated' && f.verdict !== 'clears');
  const clears = findings.filter((f) => f.verdict === 'clears');
  return [...trouble.slice(0, MOST_SHOWN), ...clears.slice(0, Math.max(0, LEAST_SHOWN - trouble.length))];
}

/** What the page of a share gets. */
export async function describeShare(db: Queryable, token: string) {
  const { row, revision, scene, report, meshes } = await openShare(db, token);
  const absent = revision.revision.notOnThisCar as RollCallKey[];
  const sentence = report === null ? null : reportSentence(scene, report);
  const hasPicture =
    row.pictureId !== null && (await db.select().from(picture).where(eq(picture.id, row.pictureId))).length > 0;
  return {
    projectName: revision.project.name,
    sceneName: scene.name,
    number: revision.revision.number,
    createdAt: revision.revision.createdAt.toISOString(),
    display: revision.project.display,
    sentence: sentence?.parts ?? null,
    verdict: sentence?.verdict ?? null,
    totals: report?.totals ?? {},
    missing: missingFrom(rollCall(scene, absent)).map((m) => (m.lacks === null ? m.label : `${m.label}: ${m.lacks}`)),
    document: drawable(scene, meshes),
    findings: shownFindings(report?.findings ?? []),
    // a file's hash would tell whoever has the file that this is it
    meshes: meshes.map((_, index) => String(index)),
    hasPicture,
  };
}
