import type { Page } from '@playwright/test';
import { api, expect, test, type Member } from './support';

interface Named {
  readonly id: string;
}
interface Document {
  readonly saveNumber: number;
  readonly document: {
    readonly components: readonly { readonly id: string; readonly pose: { readonly at: number[] } }[];
  };
}

// the picture is drawn without a graphics unit here: a small window keeps it quick
test.use({ viewport: { width: 1000, height: 640 } });

const box = (id: string, name: string, at: number[]) => ({
  id,
  name,
  category: 'other',
  pose: { at },
  solids: [{ id: 'body', shape: { kind: 'box', size: [60, 60, 60] } }],
});

/** A scene with two boxes, put there through the API. */
async function twoBoxes({ page }: Member): Promise<string> {
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'Harbour shop' });
  const { id: project } = await api<Named>(page, 'POST', `/teams/${team}/projects`, { name: 'Harbour Lane pickup' });
  const { id: scene } = await api<Named>(page, 'POST', `/projects/${project}/scenes`, { name: 'Layout 1' });
  const { saveNumber, document } = await read(page, scene);
  const components = [box('heater', 'Heater box', [200, 0, 300]), box('wiper', 'Wiper motor', [0, 300, 300])];
  await api(page, 'PUT', `/scenes/${scene}/document`, {
    base: saveNumber,
    saveId: crypto.randomUUID(),
    document: { ...document, components },
  });
  return scene;
}

const read = (page: Page, scene: string): Promise<Document> => api(page, 'GET', `/scenes/${scene}/document`);
const places = async (page: Page, scene: string): Promise<Record<string, number[]>> =>
  Object.fromEntries((await read(page, scene)).document.components.map((c) => [c.id, c.pose.at]));

async function openBench(page: Page, scene: string): Promise<void> {
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await page.goto(`/scenes/${scene}`);
  await expect(page.getByText('live', { exact: true })).toBeVisible();
}

const word = (page: Page) => page.getByRole('banner').getByRole('status');

/** Where `times` nudges to the right of the picture take a part: the bench opens at the engine bay, looking rearward. */
const nudged = (y: number, times: number): number => y - times * (25.4 / 16);

/** Selects a part by its tag and nudges it once with a key. */
async function nudge(page: Page, name: string, key: string): Promise<void> {
  await page
    .getByRole('region', { name: /^Parts/ })
    .getByRole('button', { name: new RegExp(`^${name}`) })
    .click();
  await page.getByRole('main').focus();
  await page.keyboard.press(key);
}

test('A designer reloads right after moving a part, and the part is where it was put', async ({ enter }) => {
  const member = await enter('Dag Ambler');
  const { page } = member;
  const scene = await twoBoxes(member);
  await openBench(page, scene);
  await nudge(page, 'Heater box', 'ArrowRight');
  await page.keyboard.press('ArrowRight');
  await page.reload();
  await expect(word(page)).toHaveText('saved');
  await expect.poll(() => places(page, scene)).toMatchObject({ heater: [200, nudged(0, 2), 300] });
});

test('A designer’s save is carried out but its answer is lost, the tab is closed, and nothing is lost or doubled', async ({
  enter,
}) => {
  const member = await enter('Dag Ambler');
  const scene = await twoBoxes(member);
  const { page } = member;
  const before = (await read(page, scene)).saveNumber;
  await openBench(page, scene);
  // the server does its work and is gone before it can say so
  await page.route('**/api/scenes/*/document', async (route) => {
    if (route.request().method() === 'PUT') await route.fetch();
    await route.abort('connectionreset');
  });
  await nudge(page, 'Heater box', 'ArrowRight');
  await expect(word(page)).toContainText('offline, kept here');
  await nudge(page, 'Wiper motor', 'ArrowRight');
  expect(await places(page, scene)).toMatchObject({ heater: [200, nudged(0, 1), 300], wiper: [0, 300, 300] });
  const tab = await page.context().newPage();
  await page.close();
  await openBench(tab, scene);
  await expect(word(tab)).toHaveText('saved');
  expect(await places(tab, scene)).toMatchObject({ heater: [200, nudged(0, 1), 300], wiper: [0, nudged(300, 1), 300] });
  expect((await read(tab, scene)).saveNumber).toBe(before + 2);
});

test('A designer works at one scene in two tabs: both see it all, and are asked where both moved the same part', async ({
  enter,
}) => {
  test.slow();
  const member = await enter('Dag Ambler');
  const { page: one } = member;
  const scene = await twoBoxes(member);
  const two = await one.context().newPage();
  await openBench(one, scene);
  await openBench(two, scene);
  await nudge(two, 'Wiper motor', 'ArrowRight');
  await nudge(one, 'Heater box', 'ArrowRight');
  for (const tab of [one, two]) await expect(word(tab)).toHaveText('saved');
  await expect
    .poll(() => places(one, scene))
    .toMatchObject({ heater: [200, nudged(0, 1), 300], wiper: [0, nudged(300, 1), 300] });

  // the first cannot reach the server while the second moves the same part
  await one.route('**/api/scenes/*/document', (route) => route.abort());
  await nudge(one, 'Heater box', 'ArrowRight');
  await expect(word(one)).toContainText('offline, kept here');
  await nudge(two, 'Heater box', 'ArrowLeft');
  await expect.poll(() => places(two, scene)).toMatchObject({ heater: [200, 0, 300] });
  await one.unroute('**/api/scenes/*/document');
  await one.getByRole('button', { name: 'Look at both' }).click({ timeout: 40_000 });
  await expect(one.getByRole('dialog').getByRole('row', { name: /Heater box/ })).toBeVisible();
  await one.getByRole('button', { name: 'Keep yours' }).click();
  await expect(word(one)).toHaveText('saved');
  await expect
    .poll(() => places(one, scene))
    .toMatchObject({ heater: [200, nudged(0, 2), 300], wiper: [0, nudged(300, 1), 300] });
});
