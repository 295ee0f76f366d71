import { api, expect, expectAccessible, test } from './support';

interface Named {
  readonly id: string;
}

test('A designer opens, searches, archives and deletes projects, and takes each back', async ({ enter }) => {
  const { page } = await enter('Dag Holm');
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'Holm shop' });
  await page.goto(`/teams/${team}`);
  await expect(page.getByRole('heading', { name: 'Your first job card' })).toBeVisible();

  await page.getByRole('button', { name: 'New project' }).click();
  await page.getByRole('button', { name: 'Open the project' }).click();
  await expect(page.getByText('Give the project a name.')).toBeVisible();
  await page.getByLabel('Name of the project').fill('Harbour Lane pickup');
  await page.getByRole('dialog').getByLabel('The car, in your own words').fill('Right-hand drive, straight six');
  await page.getByRole('button', { name: 'Open the project' }).click();
  await expect(page.getByRole('heading', { name: 'Harbour Lane pickup' })).toBeVisible();
  await expect(page.getByText('No scene yet')).toBeVisible();
  await api(page, 'POST', `/teams/${team}/projects`, { name: 'Grey saloon' });

  await page.goto(`/teams/${team}`);
  await expectAccessible(page);
  await page.getByLabel('Search the projects').fill('straight');
  await expect(page.getByRole('article')).toHaveCount(1);
  await expect(page).toHaveURL(/search=straight/);
  await page.getByLabel('Search the projects').fill('100%_');
  await expect(page.getByText('No project fits “100%_”')).toBeVisible();
  await page.getByRole('button', { name: 'Show the open projects' }).click();
  await expect(page.getByRole('article')).toHaveCount(2);
  await page.getByLabel('Order').selectOption('name');
  await expect(page.getByRole('article').first()).toContainText('Grey saloon');

  await page.getByRole('button', { name: 'More for Grey saloon' }).click();
  await page.getByRole('menuitem', { name: 'Put into the archive' }).click();
  await expect(page.getByRole('article')).toHaveCount(1);
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByRole('article')).toHaveCount(2);

  await page.getByRole('button', { name: 'More for Grey saloon' }).click();
  await page.getByRole('menuitem', { name: 'Delete the project' }).click();
  await expect(page.getByRole('article')).toHaveCount(1);
  await page.getByLabel('Which').selectOption('deleted');
  await page.getByRole('button', { name: 'Bring it back' }).click();
  await expect(page.getByText('Nothing was deleted in the last 30 days')).toBeVisible();
  await page.getByRole('button', { name: 'Show the open projects' }).click();
  await expect(page.getByRole('article')).toHaveCount(2);
});

test('A designer makes, renames, duplicates, archives and deletes scenes', async ({ enter }) => {
  const { page } = await enter('Sunniva Kerr');
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'Kerr shop' });
  const { id: project } = await api<Named>(page, 'POST', `/teams/${team}/projects`, { name: 'Blue pickup' });
  await page.goto(`/projects/${project}`);
  await page.getByRole('button', { name: 'Lay out the first scene' }).click();
  await expect(page).toHaveURL(/\/scenes\/[0-9a-f-]{36}$/);
  await page.goto(`/projects/${project}`);
  await expectAccessible(page);

  const more = async (scene: string, item: string): Promise<void> => {
    await page.getByRole('button', { name: `More for ${scene}`, exact: true }).click();
    await page.getByRole('menuitem', { name: item }).click();
  };
  await more('Layout 1', 'Rename');
  await page.getByLabel('Name of the scene').fill('As found');
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { name: 'As found' })).toBeVisible();

  await more('As found', 'Duplicate as a variant');
  await page.getByRole('button', { name: 'Duplicate', exact: true }).click();
  await expect(page.getByRole('article')).toHaveCount(2);

  await more('As found (variant)', 'Put into the archive');
  await expect(page.getByRole('article')).toHaveCount(1);
  await page.getByLabel('Which').selectOption('archived');
  await expect(page.getByRole('heading', { name: 'As found (variant)' })).toBeVisible();
  await more('As found (variant)', 'Delete the scene');
  await page
    .getByRole('listitem')
    .filter({ hasText: '“As found (variant)” is deleted.' })
    .getByRole('button', { name: 'Undo' })
    .click();
  await expect(page.getByText('“As found (variant)” is back.')).toBeVisible();
  await expect(page.getByText('renamed “Layout 1” to “As found”')).toBeVisible();
});

test('A person changes the facts of a project', async ({ enter }) => {
  const { page } = await enter('Hanne Frost');
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'Frost shop' });
  const { id: project } = await api<Named>(page, 'POST', `/teams/${team}/projects`, { name: 'Blue pickup' });
  await page.goto(`/projects/${project}`);
  await page.getByRole('button', { name: 'More for this project' }).click();
  await page.getByRole('menuitem', { name: 'Change the facts' }).click();
  await page.getByLabel('Notes').fill('Heater box still on a guess.');
  await page.getByLabel('Lengths are shown in').selectOption('in');
  await page.getByRole('button', { name: 'Save the facts' }).click();
  await expect(page.getByText('Heater box still on a guess.')).toBeVisible();
  await expect(page.getByText('inches and fractions')).toBeVisible();
});

test('A reader of a list that failed tries again and has it', async ({ enter }) => {
  const { page } = await enter('Levi Stroud');
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'Stroud shop' });
  await api(page, 'POST', `/teams/${team}/projects`, { name: 'Blue pickup' });
  let isBroken = true;
  await page.route(`**/api/teams/${team}/projects?*`, (route) => (isBroken ? route.abort() : route.continue()));
  await page.goto(`/teams/${team}`);
  await expect(page.getByText('The server could not be reached.')).toBeVisible();
  isBroken = false;
  await page.getByRole('button', { name: 'Try again' }).click();
  await expect(page.getByRole('heading', { name: 'Blue pickup' })).toBeVisible();
});
