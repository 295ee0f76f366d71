import { SignInForm } from '../features/account/sign-in-form';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Sign in');
  return (
    <>
      <h1 className="mb-5 text-3xl font-light">Sign in</h1>
      <SignInForm />
    </>
  );
}
