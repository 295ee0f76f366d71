import { PageHead } from '../components/page-head';
import { NameSetting, UnitSetting, WordSetting } from '../features/account/account-settings';
import { PasswordSetting } from '../features/account/password-setting';
import { SignOutButton } from '../features/account/sign-out-button';
import { usePageTitle } from '../lib/use-page-title';

export function Component() {
  usePageTitle('Account');
  return (
    <>
      <PageHead title="Account" crumbs={[{ label: 'Your teams', to: '/' }]} actions={<SignOutButton />} />
      <div className="grid gap-x-14 gap-y-10 md:grid-cols-2">
        <NameSetting />
        <UnitSetting />
        <PasswordSetting />
        <WordSetting />
      </div>
    </>
  );
}
