// Notices that come up at the foot of the page, with the way back where a thing can be undone.
import { toast, Toaster } from 'sonner';
import { Button } from './button';
import { Hole } from './hole';
import { IconButton } from './icon-button';
import { CrossMark } from './pictograms';

export interface Notice {
  readonly text: string;
  /** Takes back what was done. */
  readonly undo?: () => void;
  /** Something went wrong: marked, and it stays until it is put away. */
  readonly problem?: boolean;
}

/** How long a notice stays; one that can be undone stays longer. */
const STAYS = { plain: 5_000, undo: 12_000 } as const;

export function notify({ text, undo, problem = false }: Notice): void {
  const duration = problem ? Infinity : undo === undefined ? STAYS.plain : STAYS.undo;
  toast.custom(
    (id) => (
      <div className="on-card cut-tag notice" role={problem ? 'alert' : undefined}>
        <Hole through="transparent" />
        <span className="grow">
          {problem && <strong className="block text-hits">That did not work.</strong>}
          {text}
        </span>
        {undo !== undefined && (
          <Button
            size="small"
            onClick={() => {
              toast.dismiss(id);
              undo();
            }}
          >
            Undo
          </Button>
        )}
        <IconButton label="Put away" hint={false} onClick={() => toast.dismiss(id)}>
          <CrossMark />
        </IconButton>
      </div>
    ),
    { duration, unstyled: true },
  );
}

/** Where notices come up; once, at the root. */
export const Notices = () => (
  <Toaster position="bottom-left" visibleToasts={4} containerAriaLabel="Notices" toastOptions={{ unstyled: true }} />
);
