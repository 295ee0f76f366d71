import { ForgottenForm } from '../features/account/forgotten-form';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Forgotten password');
  return (
    <>
      <h1 className="mb-5 text-3xl font-light">Forgotten the password?</h1>
      <ForgottenForm />
    </>
  );
}
