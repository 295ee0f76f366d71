import { ResetForm } from '../features/account/reset-form';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('New password');
  return (
    <>
      <h1 className="mb-5 text-3xl font-light">Choose a new password</h1>
      <ResetForm />
    </>
  );
}
