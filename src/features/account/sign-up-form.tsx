import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { z } from 'zod';
import { Button } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { TextField } from '../../components/text-field';
import { LEAST_PASSWORD, signUp } from '../../lib/auth-calls';
import { safePath, withBack } from '../../lib/return-path';
import { emailField, nameField, newPasswordField } from './account-fields';
import { PasswordField } from './password-field';

const schema = z.object({ name: nameField, email: emailField, password: newPasswordField });
type SignUpFields = z.infer<typeof schema>;

export function SignUpForm() {
  const back = safePath(useSearchParams()[0].get('back'));
  const navigate = useNavigate();
  const [fault, setFault] = useState<string | null>(null);
  const { register, handleSubmit, formState } = useForm<SignUpFields>({
    resolver: zodResolver(schema),
    defaultValues: { name: '', email: '', password: '' },
  });
  const { errors, isSubmitting } = formState;

  const open = async ({ name, email, password }: SignUpFields): Promise<void> => {
    setFault(null);
    const answer = await signUp(name, email, password, back);
    if (answer.ok) await navigate(withBack('/check-mail', back), { state: { to: email } });
    else setFault(answer.sentence);
  };
  return (
    <>
      <form className="grid gap-4" noValidate onSubmit={(event) => void handleSubmit(open)(event)}>
        <TextField
          label="Your name"
          hint="As your team will read it beside what you did."
          autoComplete="name"
          error={errors.name?.message}
          {...register('name')}
        />
        <TextField
          label="Mail address"
          type="email"
          hint="A link goes there to confirm it."
          autoComplete="username"
          error={errors.email?.message}
          {...register('email')}
        />
        <PasswordField
          label="Password"
          hint={`${LEAST_PASSWORD} characters or more.`}
          autoComplete="new-password"
          error={errors.password?.message}
          {...register('password')}
        />
        <FormFault text={fault} />
        <div>
          <Button kind="main" type="submit" busy={isSubmitting}>
            Open the account
          </Button>
        </div>
      </form>
      <p className="mt-6">
        Been here before?{' '}
        <Link to={withBack('/sign-in', back)} className="link font-semibold">
          Sign in
        </Link>
      </p>
    </>
  );
}
