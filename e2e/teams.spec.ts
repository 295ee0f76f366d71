import { api, expect, expectAccessible, linkInMail, test, type Member } from './support';

interface Named {
  readonly id: string;
}

async function foundTeam({ page }: Member, name: string): Promise<string> {
  return (await api<Named>(page, 'POST', '/teams', { name })).id;
}

test('An owner invites a reviewer by mail, who joins and may read but not make', async ({ enter }) => {
  const owner = await enter('Odile Ferris');
  const team = await foundTeam(owner, 'Quay Metalworks');
  await api(owner.page, 'POST', `/teams/${team}/projects`, { name: 'Grey saloon' });
  const reviewer = await enter('Renske Holt');

  await owner.page.goto(`/teams/${team}/people`);
  await expectAccessible(owner.page);
  await owner.page.getByLabel('Mail address').fill('nobody');
  await owner.page.getByRole('button', { name: 'Invite', exact: true }).click();
  await expect(owner.page.getByText('Type a mail address')).toBeVisible();
  await owner.page.getByLabel('Mail address').fill(reviewer.email);
  await owner.page.locator('select[name=role]').selectOption('reviewer');
  await owner.page.getByRole('button', { name: 'Invite', exact: true }).click();
  await expect(owner.page.getByText(`${reviewer.email} as reviewer`)).toBeVisible();

  const { page } = reviewer;
  await page.goto(await linkInMail(page.request, reviewer.email, /invites you/));
  await expect(page.getByText('Odile Ferris invites you to Quay Metalworks as reviewer.')).toBeVisible();
  await page.getByRole('button', { name: 'Join the team' }).click();
  await expect(page.getByRole('heading', { name: 'Grey saloon' })).toBeVisible();
  await expect(page.getByRole('button', { name: 'New project' })).toHaveCount(0);
  await expect(page.getByRole('button', { name: 'More for Grey saloon' })).toHaveCount(0);
  await page.getByRole('link', { name: 'People' }).click();
  await expect(page.getByRole('table')).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Invite by mail' })).toHaveCount(0);
});

test('An owner changes a role and takes it back, removes a person, and cannot leave a team without an owner', async ({
  enter,
}) => {
  const owner = await enter('Ada Brook');
  const team = await foundTeam(owner, 'Brook and friends');
  const friend = await enter('Bo Lindgren');
  await api(owner.page, 'POST', `/teams/${team}/invitations`, { email: friend.email, role: 'designer', projects: [] });
  await friend.page.goto('/');
  await friend.page.getByRole('button', { name: 'Join' }).click();
  await expect(friend.page.getByRole('heading', { name: 'Brook and friends' })).toBeVisible();

  const { page } = owner;
  await page.goto(`/teams/${team}/people`);
  await page.getByLabel('Role of Ada Brook').selectOption('guest');
  await expect(page.getByText('A team keeps at least one owner.')).toBeVisible();
  await expect(page.getByLabel('Role of Ada Brook')).toHaveValue('owner');

  await page.getByLabel('Role of Bo Lindgren').selectOption('reviewer');
  await page.getByRole('listitem').filter({ hasText: 'Bo Lindgren is reviewer now.' }).getByText('Undo').click();
  await expect(page.getByText('Bo Lindgren is designer now.')).toBeVisible();
  await expect(page.getByLabel('Role of Bo Lindgren')).toHaveValue('designer');

  await page.getByRole('button', { name: 'More for Brook and friends' }).click();
  await page.getByRole('menuitem', { name: 'Leave the team' }).click();
  await page.getByRole('button', { name: 'Leave the team' }).click();
  await expect(page.getByText('You are its last owner.')).toBeVisible();
  await page.getByRole('button', { name: 'Keep it as it is' }).click();

  await page.getByRole('button', { name: 'Hand over to Bo Lindgren' }).click();
  await page.getByRole('button', { name: 'Hand over', exact: true }).click();
  await expect(page.getByText('You are a designer in it now.')).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Invite by mail' })).toHaveCount(0);

  await friend.page.goto(`/teams/${team}/people`);
  await friend.page.getByRole('button', { name: 'Remove Ada Brook' }).click();
  await friend.page.getByRole('button', { name: 'Remove from the team' }).click();
  await expect(friend.page.getByRole('row', { name: /Ada Brook/ })).toHaveCount(0);
  await page.reload();
  await expect(page.getByText('There is nothing here, or it is not yours to see.')).toBeVisible();
});

test('A guest reads the projects he was added to, and no others', async ({ enter }) => {
  const owner = await enter('Mirela Stone');
  const team = await foundTeam(owner, 'Stone Street');
  const [shown, hidden] = await Promise.all(
    ['Shown pickup', 'Hidden van'].map((name) => api<Named>(owner.page, 'POST', `/teams/${team}/projects`, { name })),
  );
  const guest = await enter('Gus Tamblyn');

  await owner.page.goto(`/teams/${team}/people`);
  await owner.page.getByLabel('Mail address').fill(guest.email);
  await owner.page.locator('select[name=role]').selectOption('guest');
  await owner.page.getByLabel('Shown pickup').check();
  await owner.page.getByRole('button', { name: 'Invite', exact: true }).click();
  await expect(owner.page.getByText('An invitation is on its way')).toBeVisible();

  const { page } = guest;
  await page.goto('/');
  await page.getByRole('button', { name: 'Join' }).click();
  await expect(page.getByRole('heading', { name: 'Shown pickup' })).toBeVisible();
  await expect(page.getByText('Hidden van')).toHaveCount(0);
  await expect(page.getByRole('link', { name: 'People' })).toHaveCount(0);
  await page.goto(`/projects/${shown!.id}`);
  await expect(page.getByRole('heading', { name: 'Shown pickup' })).toBeVisible();
  await page.goto(`/projects/${hidden!.id}`);
  await expect(page.getByText('There is nothing here, or it is not yours to see.')).toBeVisible();

  await owner.page.goto(`/projects/${hidden!.id}`);
  await owner.page.getByLabel('Gus Tamblyn').check();
  await expect(owner.page.getByLabel('Gus Tamblyn')).toBeChecked();
  await page.getByRole('button', { name: 'Try again' }).click();
  await expect(page.getByRole('heading', { name: 'Hidden van' })).toBeVisible();
});

test('A team is deleted only when its name was typed', async ({ enter }) => {
  const owner = await enter('Ulla Finch');
  const team = await foundTeam(owner, 'Short-lived shop');
  const { page } = owner;
  await page.goto(`/teams/${team}`);
  await page.getByRole('button', { name: 'More for Short-lived shop' }).click();
  await page.getByRole('menuitem', { name: 'Delete the team' }).click();
  const dialog = page.getByRole('alertdialog');
  await expectAccessible(page);
  await dialog.getByLabel(/Type the name/).fill('Short-lived');
  await expect(dialog.getByRole('button', { name: 'Delete the team' })).toBeDisabled();
  await dialog.getByLabel(/Type the name/).fill('Short-lived shop');
  await dialog.getByRole('button', { name: 'Delete the team' }).click();
  await expect(page.getByRole('heading', { name: 'Your first job card' })).toBeVisible();
});
