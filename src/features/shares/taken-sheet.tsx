// A picture that was just taken: to look at, to download, to share.
import { useQuery } from '@tanstack/react-query';
import { useMemo, type ReactNode } from 'react';
import { readPicture } from '#shared/api';
import { reportSentence, sentenceText } from '#shared/review';
import { loadScene } from '#shared/scene';
import type { LengthDisplay } from '#shared/units';
import { Button } from '../../components/button';
import { CautionLine } from '../../components/cautions';
import { FormFault } from '../../components/form-fault';
import { addressOf } from '../../lib/api';
import { sayProblem } from '../../lib/api-problem';
import { revisionQuery } from '../../lib/queries/dry-fits';
import { readReport } from '../../lib/stored-report';
import { ShareTicket } from './share-ticket';
import { useMakeShare } from './use-share-deeds';
import type { TakenPicture } from './use-take-picture';

export interface TakenSheetProps {
  readonly taken: TakenPicture;
  readonly projectId: string;
  readonly projectName: string;
  readonly display: LengthDisplay;
  readonly dryFit: ReactNode;
}

/** A name that every system takes for a file. */
export const fileName = (projectName: string, sceneName: string, number: number): string =>
  `${projectName} ${sceneName} revision ${number}`.replace(/[^\p{L}\p{N} ._-]+/gu, '').replace(/\s+/g, '-') + '.png';

export function TakenSheet({ taken, projectId, projectName, display, dryFit }: TakenSheetProps) {
  const { picture, revisionId, number } = taken;
  const revision = useQuery(revisionQuery(revisionId));
  const make = useMakeShare(projectId, revisionId);
  const { data } = revision;
  const { sceneName, sentence } = useMemo(() => {
    const loaded = data === undefined ? null : loadScene(data.document);
    const report = readReport(data?.report);
    if (loaded?.ok !== true) return { sceneName: '', sentence: null };
    const { scene } = loaded;
    return {
      sceneName: scene.name,
      sentence: report === null ? null : sentenceText(reportSentence(scene, report).parts, display),
    };
  }, [data, display]);
  const url = addressOf(readPicture, { pictureId: picture.id });
  return (
    <div className="grid gap-4">
      <img
        src={url}
        width={picture.width}
        height={picture.height}
        alt={`Revision ${number}, ${picture.standpoint}`}
        className="taken-picture"
      />
      <div className="flex flex-wrap items-center gap-3">
        <a href={url} download={fileName(projectName, sceneName, number)} className="button cut button-main">
          Download
        </a>
        {sentence !== null && !make.isSuccess && (
          <Button busy={make.isPending} onClick={() => make.mutate(picture.id)}>
            Make share link
          </Button>
        )}
        <span className="figures text-sm text-soft">
          {picture.width} × {picture.height} px, kept with revision {number}
        </span>
      </div>
      {revision.isSuccess && sentence === null && (
        <div className="grid gap-2 border-l-4 border-tight pl-3">
          <p>
            This revision has no dry fit yet, so there is no result to share. Run one; the share link can be made here
            as soon as it is done.
          </p>
          <div className="flex flex-wrap items-center gap-3">{dryFit}</div>
        </div>
      )}
      <FormFault text={make.isError ? sayProblem(make.error) : null} />
      {make.isSuccess && (
        <ShareTicket
          share={make.data}
          projectId={projectId}
          projectName={projectName}
          sentence={sentence ?? ''}
          mayRevoke
        />
      )}
      <div className="border-t border-dashed border-line pt-3">
        <CautionLine />
      </div>
    </div>
  );
}
