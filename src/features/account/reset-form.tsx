import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { z } from 'zod';
import { Button, ButtonLink } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { notify } from '../../components/toast';
import { LEAST_PASSWORD, resetPassword } from '../../lib/auth-calls';
import { newPasswordField } from './account-fields';
import { PasswordField } from './password-field';

const schema = z.object({ password: newPasswordField });

export function ResetForm() {
  const [search] = useSearchParams();
  const token = search.get('token');
  const navigate = useNavigate();
  const [fault, setFault] = useState<string | null>(null);
  const { register, handleSubmit, formState } = useForm<z.infer<typeof schema>>({
    resolver: zodResolver(schema),
    defaultValues: { password: '' },
  });
  if (token === null || token === '') {
    return (
      <div className="grid gap-4">
        <p className="text-lg">This link was used or is too old. Ask for a new one.</p>
        <div>
          <ButtonLink to="/forgotten" kind="main">
            Ask for a new link
          </ButtonLink>
        </div>
      </div>
    );
  }
  const change = async ({ password }: z.infer<typeof schema>): Promise<void> => {
    setFault(null);
    const answer = await resetPassword(token, password);
    if (!answer.ok) {
      setFault(answer.sentence);
      return;
    }
    notify({ text: 'The new password is set, and all other sessions are ended. Sign in with it.' });
    await navigate('/sign-in', { replace: true });
  };
  return (
    <form className="grid gap-4" noValidate onSubmit={(event) => void handleSubmit(change)(event)}>
      <PasswordField
        label="New password"
        hint={`${LEAST_PASSWORD} characters or more. It ends all sessions you have open.`}
        autoComplete="new-password"
        error={formState.errors.password?.message}
        {...register('password')}
      />
      <FormFault text={fault} />
      <div>
        <Button kind="main" type="submit" busy={formState.isSubmitting}>
          Set the password
        </Button>
      </div>
    </form>
  );
}
