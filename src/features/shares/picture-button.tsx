// "Take picture" for the head of the bench, and the sheet that the picture comes on.
import { useState, type ReactNode } from 'react';
import { Button } from '../../components/button';
import { Dialog } from '../../components/dialog';
import { ErrorState } from '../../components/states';
import { ApiProblem, tell } from '../../lib/api-problem';
import { TakenSheet } from './taken-sheet';
import { useTakePicture, type PictureSource } from './use-take-picture';
import './shares.css';

export interface PictureButtonProps extends PictureSource {
  readonly canTake: boolean;
  /** The button that runs a dry fit: a share link needs one. */
  readonly dryFit: ReactNode;
}

export function PictureButton({ canTake, dryFit, ...source }: PictureButtonProps) {
  const take = useTakePicture(source);
  const [isOpen, setOpen] = useState(false);
  if (!canTake) return null;
  const start = (): void => {
    setOpen(false);
    take.mutate(undefined, { onSettled: () => setOpen(true) });
  };
  return (
    <>
      <Button busy={take.isPending} aria-label="Take picture" onClick={start}>
        {take.isPending ? (
          'Drawing'
        ) : (
          <>
            <span className="max-sm:hidden">Take picture</span>
            <span className="sm:hidden">Picture</span>
          </>
        )}
      </Button>
      <Dialog
        open={isOpen}
        onOpenChange={setOpen}
        wide
        title={take.isSuccess ? `Picture of revision ${take.data.number}` : 'The picture was not taken'}
      >
        {take.isSuccess && (
          <TakenSheet
            taken={take.data}
            projectId={source.projectId}
            projectName={source.projectName}
            display={source.display}
            dryFit={dryFit}
          />
        )}
        {take.isError && <ErrorState {...sayWhy(take.error)} onRetry={start} />}
      </Dialog>
    </>
  );
}

function sayWhy(error: unknown) {
  if (error instanceof ApiProblem || !(error instanceof Error)) return tell(error);
  return { sentence: error.message };
}
