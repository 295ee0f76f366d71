import { AlertDialog } from 'radix-ui';
import { useState, type ReactNode } from 'react';
import { Button } from './button';
import { TextField } from './text-field';
import { useOpener } from './use-opener';

export interface ConfirmDialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly title: string;
  /** What will happen, and whether it can be taken back. */
  readonly children: ReactNode;
  /** The deed, as on the button: "Remove from team". */
  readonly action: string;
  readonly danger?: boolean;
  readonly busy?: boolean;
  /** A problem that the deed met. */
  readonly error?: string | null;
  /** For what cannot be taken back: this has to be typed first. */
  readonly typed?: { readonly label: string; readonly text: string };
  readonly onConfirm: () => void;
}

export function ConfirmDialog({ open, onOpenChange, title, children, ...rest }: ConfirmDialogProps) {
  const giveBack = useOpener(open);
  return (
    <AlertDialog.Root open={open} onOpenChange={onOpenChange}>
      <AlertDialog.Portal>
        <AlertDialog.Overlay className="scrim">
          <AlertDialog.Content className="on-card cut sheet" onCloseAutoFocus={giveBack}>
            <AlertDialog.Title className="mb-2 pr-6 text-xl font-extrabold">{title}</AlertDialog.Title>
            <AlertDialog.Description asChild>
              <div className="grid gap-2">{children}</div>
            </AlertDialog.Description>
            {/* inside, so that what was typed is gone when it opens again */}
            <ConfirmForm onOpenChange={onOpenChange} {...rest} />
          </AlertDialog.Content>
        </AlertDialog.Overlay>
      </AlertDialog.Portal>
    </AlertDialog.Root>
  );
}

function ConfirmForm({
  action,
  danger = false,
  busy = false,
  error,
  typed,
  onConfirm,
  onOpenChange,
}: Omit<ConfirmDialogProps, 'open' | 'title' | 'children'>) {
  const [text, setText] = useState('');
  const isReady = typed === undefined || text.trim() === typed.text.trim();
  return (
    <form
      className="mt-4"
      onSubmit={(event) => {
        event.preventDefault();
        if (isReady && !busy) onConfirm();
      }}
    >
      {typed !== undefined && (
        <TextField label={typed.label} value={text} onChange={(event) => setText(event.target.value)} />
      )}
      {error !== undefined && error !== null && (
        <p role="alert" className="mt-3 font-semibold text-hits">
          {error}
        </p>
      )}
      <div className="mt-5 flex flex-wrap items-center gap-3 border-t border-dashed border-line pt-4">
        <Button type="submit" kind={danger ? 'danger' : 'main'} busy={busy} disabled={!isReady}>
          {action}
        </Button>
        <Button onClick={() => onOpenChange(false)}>Keep it as it is</Button>
      </div>
    </form>
  );
}
