import { zodResolver } from '@hookform/resolvers/zod';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Link, Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { z } from 'zod';
import { Button } from '../../components/button';
import { FormFault } from '../../components/form-fault';
import { TextField } from '../../components/text-field';
import { signIn } from '../../lib/auth-calls';
import { serverFactsQuery, sessionQuery } from '../../lib/queries/account';
import { safePath, withBack } from '../../lib/return-path';
import { emailField, passwordField } from './account-fields';
import { DemoPeople } from './demo-people';
import { PasswordField } from './password-field';

const schema = z.object({ email: emailField, password: passwordField });
type SignInFields = z.infer<typeof schema>;

export function SignInForm() {
  const back = safePath(useSearchParams()[0].get('back'));
  const facts = useQuery(serverFactsQuery());
  const session = useQuery(sessionQuery());
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const [fault, setFault] = useState<string | null>(null);
  const [isEntering, setEntering] = useState(false);
  const { register, handleSubmit, formState } = useForm<SignInFields>({
    resolver: zodResolver(schema),
    defaultValues: { email: '', password: '' },
  });

  const enter = async ({ email, password }: SignInFields): Promise<void> => {
    setFault(null);
    setEntering(true);
    const answer = await signIn(email, password, back);
    if (answer.ok) {
      queryClient.clear();
      await navigate(back, { replace: true });
      return;
    }
    setEntering(false);
    if (answer.code === 'EMAIL_NOT_VERIFIED') await navigate(withBack('/check-mail', back), { state: { to: email } });
    else setFault(answer.sentence);
  };
  // who is signed in already has no business at the door
  if (session.data === true && !isEntering) return <Navigate to={back} replace />;
  const { errors } = formState;
  const demo = facts.data?.demoAccounts ?? [];
  return (
    <>
      <form className="grid gap-4" noValidate onSubmit={(event) => void handleSubmit(enter)(event)}>
        <TextField
          label="Mail address"
          type="email"
          autoComplete="username"
          error={errors.email?.message}
          {...register('email')}
        />
        <PasswordField
          label="Password"
          autoComplete="current-password"
          error={errors.password?.message}
          {...register('password')}
        />
        <FormFault text={fault} />
        <div className="flex flex-wrap items-center gap-x-5 gap-y-3">
          <Button kind="main" type="submit" busy={isEntering}>
            Sign in
          </Button>
          <Link to={withBack('/forgotten', back)} className="link">
            Forgotten the password?
          </Link>
        </div>
      </form>
      <p className="mt-6">
        New here?{' '}
        <Link to={withBack('/sign-up', back)} className="link font-semibold">
          Open an account
        </Link>
      </p>
      {demo.length > 0 && <DemoPeople people={demo} busy={isEntering} onChoose={(person) => void enter(person)} />}
    </>
  );
}
