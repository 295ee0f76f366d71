import { CheckMailNotice } from '../features/account/check-mail-notice';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Look at your mail');
  return (
    <>
      <h1 className="mb-5 text-3xl font-light">Look at your mail</h1>
      <CheckMailNotice />
    </>
  );
}
