// Asks for one name.
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Button } from './button';
import { Dialog, DialogActions } from './dialog';
import { FormFault } from './form-fault';
import { TextField } from './text-field';

const schema = z.object({
  name: z.string().trim().min(1, 'Type a name.').max(120, 'A name has at most 120 characters.'),
});

export interface NameDialogProps {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly title: string;
  readonly lead?: string;
  /** Of the field: "Name of the scene". */
  readonly label: string;
  readonly start: string;
  readonly action: string;
  readonly busy: boolean;
  /** What the deed met. */
  readonly fault: string | null;
  readonly onSend: (name: string) => void;
}

export function NameDialog({ open, onOpenChange, title, lead, ...form }: NameDialogProps) {
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title={title} lead={lead}>
      <NameForm onLeave={() => onOpenChange(false)} {...form} />
    </Dialog>
  );
}

type NameFormProps = Omit<NameDialogProps, 'open' | 'onOpenChange' | 'title' | 'lead'> & {
  readonly onLeave: () => void;
};

function NameForm({ label, start, action, busy, fault, onSend, onLeave }: NameFormProps) {
  const { register, handleSubmit, formState } = useForm<z.infer<typeof schema>>({
    resolver: zodResolver(schema),
    defaultValues: { name: start },
  });
  return (
    <form className="grid gap-3" noValidate onSubmit={(event) => void handleSubmit(({ name }) => onSend(name))(event)}>
      <TextField label={label} error={formState.errors.name?.message} {...register('name')} />
      <FormFault text={fault} />
      <DialogActions>
        <Button kind="main" type="submit" busy={busy}>
          {action}
        </Button>
        <Button onClick={onLeave}>Leave it</Button>
      </DialogActions>
    </form>
  );
}
