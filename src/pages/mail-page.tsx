import { MailShelf } from '../features/account/mail-shelf';
import { PageHead } from '../components/page-head';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Mail shelf');
  return (
    <>
      <PageHead title="Mail shelf" lead="Mails that this server would send. They are kept here instead, for 30 days." />
      <MailShelf />
    </>
  );
}
