// Taking a picture: what is unsaved goes up, the view is drawn, the scene is frozen, the caption is put under it, all is
// stored.
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { freezeRevision, storePicture, type Picture } from '#shared/api';
import type { Finding } from '#shared/check';
import type { Scene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { callApi } from '../../lib/api';
import { revisionQuery } from '../../lib/queries/dry-fits';
import { shownInPlace } from '../../lib/query-client';
import { readReport } from '../../lib/stored-report';
import { uploadFile } from '../../lib/upload';
import { captionOf } from './caption';
import { withCaption, type BarePicture } from './paint-caption';

/** The present look, as the bench draws it. */
export interface CapturedView extends BarePicture {
  /** As the caption names it; null where a hand has moved the camera. */
  readonly standpoint: string | null;
}

export interface PictureSource {
  readonly sceneId: string;
  readonly projectId: string;
  readonly projectName: string;
  readonly display: LengthDisplay;
  /** Brings what is unsaved to the server; the save number, or null if it is not all there. */
  readonly saveNow: () => Promise<number | null>;
  readonly capture: () => Promise<CapturedView>;
  /** What the bench shows now. */
  readonly now: () => { readonly scene: Scene; readonly findings: readonly Finding[] };
}

export interface TakenPicture {
  readonly picture: Picture;
  readonly revisionId: string;
  readonly number: number;
}

/** Not a fault of the server: said as it is. */
export class Unsaved extends Error {}

export function useTakePicture(source: PictureSource) {
  const queryClient = useQueryClient();
  const { sceneId, projectId, projectName, display } = source;
  return useMutation({
    mutationFn: async (): Promise<TakenPicture> => {
      const saveNumber = await source.saveNow();
      if (saveNumber === null) throw new Unsaved('The scene could not be saved, so no picture of it is kept.');
      const view = await source.capture();
      const { scene, findings } = source.now();
      const { revisionId, number } = await callApi(freezeRevision, { params: { sceneId }, body: { saveNumber } });
      const revision = await queryClient.fetchQuery({ ...revisionQuery(revisionId), staleTime: 0 });
      const report = readReport(revision.report);
      const caption = captionOf({
        projectName,
        scene,
        number,
        standpoint: view.standpoint,
        findings: report?.findings ?? findings,
        isDryFit: report !== null,
        display,
      });
      const blob = await withCaption(view, caption);
      const query = { kind: 'view', standpoint: view.standpoint ?? 'own view' } as const;
      const picture = await uploadFile(storePicture, { params: { revisionId }, query }, blob, { name: 'view.png' });
      return { picture, revisionId, number };
    },
    onSuccess: ({ revisionId }) => {
      void queryClient.invalidateQueries({ queryKey: ['revision', revisionId] });
      void queryClient.invalidateQueries({ queryKey: ['project', projectId] });
    },
    meta: shownInPlace,
  });
}
