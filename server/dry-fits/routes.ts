import { and, eq, inArray } from 'drizzle-orm';
import type { Router } from 'express';
import { cancelDryFit, freezeRevision, listDryFits, readDryFit, readRevision, runDryFit } from '#shared/api';
import type { RollCallKey } from '#shared/review';
import { tables } from '../db/client';
import { ApiError } from '../http/api-error';
import { mount } from '../http/mount';
import type { Services } from '../http/services';
import { freeze } from '../scenes/rules';
import { askForDryFit, findDryFit, findRevision, listDryFitsOf, listPictures } from './rules';

const { dryFit } = tables;

export function dryFitRoutes(router: Router, services: Services): void {
  const { db, jobs } = services;

  mount(router, services, runDryFit, async ({ params, body, person }) => {
    const seen = { sceneId: params.sceneId, saveNumber: body.saveNumber };
    const id = await db.transaction((tx) => askForDryFit(tx, jobs, seen, person.id));
    return findDryFit(db, id);
  });

  mount(router, services, listDryFits, ({ params }) => listDryFitsOf(db, params.sceneId));
  mount(router, services, readDryFit, ({ params }) => findDryFit(db, params.dryFitId));

  mount(router, services, cancelDryFit, async ({ params }) => {
    const [cancelled] = await db
      .update(dryFit)
      .set({ state: 'cancelled', endedAt: new Date() })
      .where(and(eq(dryFit.id, params.dryFitId), inArray(dryFit.state, ['queued', 'running'])))
      .returning({ id: dryFit.id });
    if (cancelled === undefined) throw new ApiError('dry-fit/ended');
    return findDryFit(db, params.dryFitId);
  });

  mount(router, services, freezeRevision, async ({ params, body, person }) => {
    const { revisionId, number } = await db.transaction((tx) => freeze(tx, params.sceneId, body.saveNumber, person.id));
    return { revisionId, number };
  });

  mount(router, services, readRevision, async ({ params }) => {
    const found = await findRevision(db, params.revisionId);
    const { revision, project } = found;
    return {
      id: revision.id,
      sceneId: revision.sceneId,
      projectId: project.id,
      teamId: project.teamId,
      projectName: project.name,
      projectDisplay: project.display,
      number: revision.number,
      saveNumber: revision.saveNumber,
      sha256: revision.sha256,
      madeBy: found.madeBy,
      createdAt: revision.createdAt.toISOString(),
      notOnThisCar: revision.notOnThisCar as RollCallKey[],
      document: JSON.parse(revision.documentText) as unknown,
      report: found.report,
      dryFit: found.dryFit,
      pictures: await listPictures(db, revision.id),
    };
  });
}
