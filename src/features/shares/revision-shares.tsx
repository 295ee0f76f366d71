// The pictures and share links of one revision, as the report lists them.
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { readPicture, type Picture } from '#shared/api';
import { Button } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { Section } from '../../components/page-head';
import { EmptyState, ErrorState, LoadingState } from '../../components/states';
import { When } from '../../components/when';
import { addressOf } from '../../lib/api';
import { sayProblem, tell } from '../../lib/api-problem';
import { sharesQuery } from '../../lib/queries/shares';
import { ShareTicket } from './share-ticket';
import { useMakeShare } from './use-share-deeds';
import './shares.css';

export interface RevisionSharesProps {
  readonly projectId: string;
  readonly projectName: string;
  readonly revisionId: string;
  readonly sentence: string;
  readonly pictures: readonly Picture[];
  readonly mayMake: boolean;
}

export function RevisionShares({
  projectId,
  projectName,
  revisionId,
  sentence,
  pictures,
  mayMake,
}: RevisionSharesProps) {
  const shares = useQuery(sharesQuery(projectId));
  const make = useMakeShare(projectId, revisionId);
  const views = pictures.filter((p) => p.kind === 'view');
  const [chosen, setChosen] = useState<string | null>(null);
  const picture = chosen ?? views[0]?.id ?? null;
  const own = shares.data?.filter((share) => share.revisionId === revisionId) ?? [];
  const open = own.filter((share) => share.revokedAt === null);
  return (
    <Section title="Share links" note="for a build thread, a customer, a supplier" className="no-print">
      {shares.isPending && <LoadingState what="the share links" />}
      {shares.isError && <ErrorState {...tell(shares.error)} onRetry={() => void shares.refetch()} />}
      {shares.isSuccess && (
        <div className="grid gap-5">
          {own.length === 0 && (
            <EmptyState small title="Nobody outside the team sees this revision">
              {mayMake
                ? 'A share link shows this one revision to whoever has it: picture, what was found, and the scene to turn in 3D. No names, no supplier’s files, and it can be revoked.'
                : 'A designer of the team can make a share link for it.'}
            </EmptyState>
          )}
          {mayMake && (
            <div className="grid gap-3">
              {views.length > 0 && <PictureChoice views={views} picture={picture} onChoose={setChosen} />}
              <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
                <Button
                  kind={open.length === 0 ? 'main' : 'plain'}
                  busy={make.isPending}
                  onClick={() => make.mutate(picture)}
                >
                  {open.length === 0 ? 'Make share link' : 'Make another link'}
                </Button>
                {views.length === 0 && (
                  <p className="max-w-prose text-sm text-soft">
                    It will have no picture: take one on the bench first, and a thread shows it in place of a bare
                    address.
                  </p>
                )}
              </div>
              <FormFault text={make.isError ? sayProblem(make.error) : null} />
            </div>
          )}
          <ul className="grid gap-5">
            {own.map((share) => (
              <li key={share.id} className="border-t border-dashed border-line pt-4">
                <ShareTicket
                  share={share}
                  projectId={projectId}
                  projectName={projectName}
                  sentence={sentence}
                  mayRevoke={mayMake}
                />
              </li>
            ))}
          </ul>
        </div>
      )}
    </Section>
  );
}

interface PictureChoiceProps {
  readonly views: readonly Picture[];
  readonly picture: string | null;
  readonly onChoose: (id: string) => void;
}

const PictureChoice = ({ views, picture, onChoose }: PictureChoiceProps) => (
  <fieldset>
    <legend className="mb-1.5 text-sm font-semibold">Picture of the link</legend>
    <div className="flex flex-wrap gap-3">
      {views.slice(0, 8).map((view) => (
        <label key={view.id} className="share-view">
          <input
            type="radio"
            name="share-picture"
            className="sr-only"
            checked={view.id === picture}
            onChange={() => onChoose(view.id)}
          />
          <img src={addressOf(readPicture, { pictureId: view.id })} alt="" loading="lazy" />
          <span>
            {view.standpoint}, <When iso={view.createdAt} />
          </span>
        </label>
      ))}
    </div>
  </fieldset>
);
