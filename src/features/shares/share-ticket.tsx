// One share link with all that is copied from it, and the way to close it.
import { useState } from 'react';
import type { Share } from '#shared/api';
import { Button } from '../../components/button';
import { ConfirmDialog } from '../../components/confirm-dialog';
import { When } from '../../components/when';
import { sayProblem } from '../../lib/api-problem';
import { bbCode } from './bb-code';
import { CopyField } from './copy-field';
import { useRevokeShare } from './use-share-deeds';

export interface ShareTicketProps {
  readonly share: Share;
  readonly projectId: string;
  readonly projectName: string;
  /** The report's opening sentence in plain text. */
  readonly sentence: string;
  readonly mayRevoke: boolean;
}

export function ShareTicket({ share, projectId, projectName, sentence, mayRevoke }: ShareTicketProps) {
  const [asks, setAsks] = useState(false);
  const revoke = useRevokeShare(projectId);
  const { url, pictureUrl, sceneName, revisionNumber: number, madeBy, createdAt, revokedAt } = share;
  if (revokedAt !== null) {
    return (
      <p className="text-sm text-soft">
        Made by {madeBy}, <When iso={createdAt} />; revoked <When iso={revokedAt} />. It opens nothing any more.
      </p>
    );
  }
  return (
    <div className="grid gap-3">
      <p className="text-sm text-soft">
        Made by {madeBy}, <When iso={createdAt} />
        {pictureUrl === null && '; without a picture'}. Whoever has it sees this revision and nothing else.
      </p>
      <CopyField label="Share link" text={url} />
      <CopyField
        label="For a build thread (BBCode)"
        text={bbCode({ projectName, sceneName, number, sentence, url, pictureUrl })}
        tall
      />
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
        <a href={url} target="_blank" rel="noreferrer" className="link text-sm font-semibold">
          Look at it as others do
        </a>
        {mayRevoke && (
          <Button kind="text" size="small" onClick={() => setAsks(true)}>
            Revoke the link
          </Button>
        )}
      </div>
      <ConfirmDialog
        open={asks}
        onOpenChange={setAsks}
        title="Revoke the share link?"
        action="Revoke the link"
        danger
        busy={revoke.isPending}
        error={revoke.isError ? sayProblem(revoke.error) : null}
        onConfirm={() => revoke.mutate(share, { onSuccess: () => setAsks(false) })}
      >
        <p>
          From then on it opens nothing, wherever it was posted, and its picture disappears there too. This cannot be
          taken back; a new link has another address.
        </p>
      </ConfirmDialog>
    </div>
  );
}
