import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { z } from 'zod';
import { Button } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { TextField } from '../../components/text-field';
import { requestReset } from '../../lib/auth-calls';
import { emailField } from './account-fields';
import { MailHint } from './mail-hint';

const schema = z.object({ email: emailField });

export function ForgottenForm() {
  const [fault, setFault] = useState<string | null>(null);
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { register, handleSubmit, formState } = useForm<z.infer<typeof schema>>({
    resolver: zodResolver(schema),
    defaultValues: { email: '' },
  });
  const ask = async ({ email }: z.infer<typeof schema>): Promise<void> => {
    setFault(null);
    const answer = await requestReset(email);
    if (answer.ok) setSentTo(email);
    else setFault(answer.sentence);
  };
  if (sentTo !== null) {
    return (
      <div role="status" className="grid gap-4">
        <p className="text-lg">
          If there is an account with <b className="break-all">{sentTo}</b>, a link is on its way there. It works for an
          hour.
        </p>
        <MailHint to={sentTo} />
        <Link to="/sign-in" className="link">
          To the sign-in
        </Link>
      </div>
    );
  }
  return (
    <form className="grid gap-4" noValidate onSubmit={(event) => void handleSubmit(ask)(event)}>
      <TextField
        label="Mail address of the account"
        type="email"
        autoComplete="username"
        error={formState.errors.email?.message}
        {...register('email')}
      />
      <FormFault text={fault} />
      <div className="flex flex-wrap items-center gap-5">
        <Button kind="main" type="submit" busy={formState.isSubmitting}>
          Send me a link
        </Button>
        <Link to="/sign-in" className="link">
          To the sign-in
        </Link>
      </div>
    </form>
  );
}
