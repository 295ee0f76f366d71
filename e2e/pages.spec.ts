import { api, boxStl, expect, expectAccessible, expectNoSideways, test } from './support';

interface Named {
  readonly id: string;
}

const OPEN = ['/sign-in', '/sign-up', '/forgotten', '/reset?token=x', '/reset', '/mail', '/help/cautions', '/nowhere'];

test('A visitor reads every open page, on a desk or on a phone', async ({ page }) => {
  for (const width of [1440, 320]) {
    await page.setViewportSize({ width, height: 800 });
    for (const path of OPEN) {
      await page.goto(path);
      await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
      expect(await page.title(), path).toMatch(/ · Gapwright$/);
      await expectAccessible(page);
      await expectNoSideways(page);
    }
  }
});

test('A designer reads every page of a team, on a desk or on a phone', async ({ enter }) => {
  const { page } = await enter('Runa Vick');
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'A team with a name that is rather long' });
  const { id: project } = await api<Named>(page, 'POST', `/teams/${team}/projects`, {
    name: 'A project whose name was typed by somebody who likes to say everything at once',
  });
  await api(page, 'POST', `/projects/${project}/scenes`, { name: 'Layout 1' });
  await page.request.post(`/api/teams/${team}/meshes`, {
    multipart: { file: { name: 'box.stl', mimeType: 'model/stl', buffer: boxStl(40, 60, 90) } },
  });
  const paths = [
    '/',
    '/account',
    `/teams/${team}`,
    `/teams/${team}/people`,
    `/teams/${team}/meshes`,
    `/projects/${project}`,
  ];
  for (const width of [1440, 320]) {
    await page.setViewportSize({ width, height: 800 });
    for (const path of paths) {
      await page.goto(path);
      await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
      await page.waitForLoadState('networkidle');
      await expectAccessible(page);
      await expectNoSideways(page);
    }
  }
});

test('A person without a mouse opens a project and comes back', async ({ enter }) => {
  const { page } = await enter('Esme Ward');
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'Ward shop' });
  await api(page, 'POST', `/teams/${team}/projects`, { name: 'Blue pickup' });
  await page.goto(`/teams/${team}`);
  await expect(page.getByRole('heading', { name: 'Blue pickup' })).toBeVisible();

  await page.keyboard.press('Tab');
  await expect(page.getByRole('link', { name: 'To the page' })).toBeFocused();
  await page.keyboard.press('Enter');
  const reach = async (name: string | RegExp, role: 'link' | 'button'): Promise<void> => {
    const target = page.getByRole(role, { name });
    for (let i = 0; i < 40; i += 1) {
      await page.keyboard.press('Tab');
      if (await target.evaluate((element) => element === document.activeElement)) return;
    }
    throw new Error(`the ${role} ${String(name)} cannot be reached by Tab`);
  };
  await reach('Blue pickup', 'link');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { level: 1, name: 'Blue pickup' })).toBeVisible();

  await reach('More for this project', 'button');
  await page.keyboard.press('Enter');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Escape');
  await expect(page.getByRole('button', { name: 'More for this project' })).toBeFocused();

  await reach('New scene', 'button');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('dialog')).toBeVisible();
  await expect(page.getByLabel('Name of the scene')).toBeFocused();
  await page.keyboard.press('Escape');
  await expect(page.getByRole('button', { name: 'New scene' })).toBeFocused();

  await page.getByRole('button', { name: 'More for this project' }).focus();
  await page.keyboard.press('Enter');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('dialog', { name: 'Facts of the project' })).toBeVisible();
  await page.keyboard.press('Escape');
  await expect(page.getByRole('button', { name: 'More for this project' })).toBeFocused();
});

test('A page says when the connection is gone', async ({ enter }) => {
  const { page } = await enter('Ivar Dunn');
  await page.goto('/account');
  await expect(page.getByRole('heading', { name: 'Account' })).toBeVisible();
  await page.context().setOffline(true);
  await expect(page.getByText('No connection.')).toBeVisible();
  await page.getByLabel('Millimetres').click();
  await expect(page.getByText('The server could not be reached.')).toBeVisible();
  await expect(page.getByLabel('As each project has it')).toBeChecked();
  await page.context().setOffline(false);
  await expect(page.getByText('No connection.')).toHaveCount(0);
  await page.getByLabel('Millimetres').check();
  await expect(page.getByText('Saved.')).toBeVisible();
});
