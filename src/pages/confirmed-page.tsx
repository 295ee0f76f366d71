import { ConfirmedNotice } from '../features/account/confirmed-notice';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Mail address');
  return (
    <>
      <h1 className="mb-5 text-3xl font-light">Mail address</h1>
      <ConfirmedNotice />
    </>
  );
}
