import { SignUpForm } from '../features/account/sign-up-form';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Open an account');
  return (
    <>
      <h1 className="mb-5 text-3xl font-light">Open an account</h1>
      <SignUpForm />
    </>
  );
}
