import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Button } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { Section } from '../../components/page-head';
import { notify } from '../../components/toast';
import { changePassword, LEAST_PASSWORD } from '../../lib/auth-calls';
import { newPasswordField, passwordField } from './account-fields';
import { PasswordField } from './password-field';

const schema = z.object({ current: passwordField, next: newPasswordField });
type PasswordFields = z.infer<typeof schema>;

export function PasswordSetting() {
  const [fault, setFault] = useState<string | null>(null);
  const { register, handleSubmit, formState, reset } = useForm<PasswordFields>({
    resolver: zodResolver(schema),
    defaultValues: { current: '', next: '' },
  });
  const { errors } = formState;
  const change = async ({ current, next }: PasswordFields): Promise<void> => {
    setFault(null);
    const answer = await changePassword(current, next);
    if (!answer.ok) {
      setFault(answer.sentence);
      return;
    }
    reset();
    notify({ text: 'The new password is set. Your other sessions are ended.' });
  };
  return (
    <Section title="Password">
      <form className="grid max-w-md gap-3" noValidate onSubmit={(event) => void handleSubmit(change)(event)}>
        <PasswordField
          label="Present password"
          autoComplete="current-password"
          error={errors.current?.message}
          {...register('current')}
        />
        <PasswordField
          label="New password"
          hint={`${LEAST_PASSWORD} characters or more. It ends your sessions on other machines.`}
          autoComplete="new-password"
          error={errors.next?.message}
          {...register('next')}
        />
        <FormFault text={fault} />
        <div>
          <Button type="submit" busy={formState.isSubmitting}>
            Change the password
          </Button>
        </div>
      </form>
    </Section>
  );
}
