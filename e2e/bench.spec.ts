import type { Page } from '@playwright/test';
import { api, boxStl, expect, expectAccessible, expectNoSideways, linkInMail, test, type Member } from './support';

interface Named {
  readonly id: string;
}

// the picture is drawn without a graphics unit here: a small window keeps it quick
test.use({ viewport: { width: 1120, height: 700 } });

interface Start {
  readonly team: string;
  readonly project: string;
  readonly scene: string;
}

async function newScene({ page }: Member): Promise<Start> {
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'Harbour shop' });
  const { id: project } = await api<Named>(page, 'POST', `/teams/${team}/projects`, { name: 'Harbour Lane pickup' });
  const { id: scene } = await api<Named>(page, 'POST', `/projects/${project}/scenes`, { name: 'Layout 1' });
  return { team, project, scene };
}

const tags = (page: Page) => page.getByRole('region', { name: /^Parts/ });
const tag = (page: Page, name: string) => tags(page).getByRole('button', { name: new RegExp(`^${name}`) });
const ladder = (page: Page) => page.getByRole('region', { name: 'Gaps' });

const box = (id: string, name: string, category: string, size: number[], at: number[], more = {}) => ({
  id,
  name,
  category,
  pose: { at },
  tolerance: 1,
  solids: [{ id: 'body', shape: { kind: 'box', size } }],
  ...more,
});

/** A firewall, a pedal and a wiper motor, put there through the API. */
async function sceneWithParts(member: Member): Promise<Start> {
  const start = await newScene(member);
  const { page } = member;
  const path = `/scenes/${start.scene}/document`;
  const { saveNumber, document } = await api<{ saveNumber: number; document: object }>(page, 'GET', path);
  await api(page, 'PUT', path, {
    base: saveNumber,
    saveId: crypto.randomUUID(),
    document: {
      ...document,
      lasers: [{ id: 'column-line', name: 'Column line', point: [0, 300, 0], normal: [0, 1, 0] }],
      components: [
        box('firewall', 'Firewall', 'firewall', [2, 1300, 500], [0, 0, 500]),
        box('brake-pedal', 'Brake pedal', 'pedal', [20, 12, 240], [120, 420, 480]),
        box('wiper-motor', 'Wiper motor', 'wiper', [110, 150, 100], [-90, 60, 640]),
      ],
    },
  });
  await page.goto(`/scenes/${start.scene}`);
  return start;
}

test('A designer arranges a pedal box, a wiper motor and a scanned liner, gives a pedal its swing and reads the gap', async ({
  enter,
}) => {
  const member = await enter('Dag Ambler');
  const { page } = member;
  const { team, scene } = await newScene(member);
  await page.request.post(`/api/teams/${team}/meshes`, {
    multipart: { file: { name: 'fender_liner.stl', mimeType: 'model/stl', buffer: boxStl(380, 8, 300) } },
  });
  await page.goto(`/scenes/${scene}`);
  await expect(page.getByText('Nothing on the bench yet.')).toBeVisible();
  await expect(page.getByText('11 missing')).toBeVisible();
  await expectAccessible(page);

  const shelf = page.getByRole('dialog', { name: 'The shelf' });
  const putOnBench = shelf.getByRole('button', { name: 'Put it on the bench' });
  await test.step('the firewall, as a box of typed size', async () => {
    await page.getByRole('button', { name: 'Take a part from the shelf' }).click();
    await shelf.getByRole('tab', { name: 'Box or cylinder' }).click();
    await shelf.getByLabel('long').fill('1/8');
    await shelf.getByLabel('wide').fill('1320 mm');
    await shelf.getByLabel('high').fill('20 1/2');
    await shelf.getByLabel('Call it').fill('Bulkhead panel');
    await shelf.getByLabel('Kind of part').selectOption('firewall');
    await putOnBench.click();
    await expect(page.getByRole('textbox', { name: 'Name of the part' })).toHaveValue('Bulkhead panel');
    const name = page.getByRole('textbox', { name: 'Name of the part' });
    await name.fill('Firewall');
    await name.press('Enter');
  });

  await test.step('a pedal and its bracket, clamped together as the pedal box', async () => {
    for (const [recipe, called] of [
      ['Hanging pedal', 'Brake pedal'],
      ['Pedal bracket', 'Bracket'],
    ] as const) {
      await page.keyboard.press('p');
      await shelf.getByRole('button', { name: recipe }).click();
      await shelf.getByLabel('Call it').fill(called);
      await putOnBench.click();
      await expect(shelf).toBeHidden();
    }
    await tag(page, 'Brake pedal').click({ modifiers: ['Shift'] });
    await expect(page.getByRole('heading', { name: '2 parts' })).toBeVisible();
    await page.keyboard.press('Control+g');
    const name = page.getByRole('textbox', { name: 'Name of the group' });
    await name.fill('Pedal box');
    await name.press('Enter');
    await expect(page.getByText('Pedal box has no joint to the firewall and the cowl')).toBeVisible();
    // the words carry the side; a minus goes to the other one
    await page.getByLabel('ahead of firewall').fill('=-8 1/4');
    await page.keyboard.press('Enter');
    await expect(page.getByLabel('behind firewall')).toHaveValue('8 1/4');
  });

  await test.step('what the roll-call misses: wiper motor and liner', async () => {
    await page.getByRole('button', { name: 'wiper motor and linkage?' }).click();
    await page.getByRole('menuitem', { name: 'Place one' }).click();
    await shelf.getByRole('tab', { name: 'Box or cylinder' }).click();
    await shelf.getByLabel('Call it').fill('Wiper motor');
    await expect(shelf.getByLabel('Kind of part')).toHaveValue('wiper');
    await putOnBench.click();
    await page.getByLabel('ahead of firewall').fill('6 1/2');
    await page.keyboard.press('Enter');
    await expect(page.getByLabel('ahead of firewall')).toHaveValue('6 1/2');

    await page.getByRole('button', { name: 'fender liner?' }).click();
    await page.getByRole('menuitem', { name: 'Place one' }).click();
    await shelf.getByRole('tab', { name: 'Meshes of the team' }).click();
    await putOnBench.click();
    await expect(page.getByRole('textbox', { name: 'Name of the part' })).toHaveValue('fender liner');
    await page.getByRole('tab', { name: 'Size' }).click();
    await expect(page.getByText('a closed shape')).toBeVisible();
    await expect(page.getByText('9 missing')).toBeVisible();
  });

  await test.step('the swing of the pedal, run along by hand', async () => {
    await tag(page, 'Brake pedal').click();
    await page.getByRole('tab', { name: 'Motion' }).click();
    await page.getByText('How it goes').click();
    const to = page.getByLabel('to', { exact: true });
    await to.fill('14');
    await to.press('Enter');
    await page.getByRole('slider').first().fill('250');
    await expect(page.getByRole('region', { name: 'Stroke to bottom-out' })).toContainText('50 %');
    await expect(page.getByRole('button', { name: /^Undo: Change Stroke/ })).toBeEnabled();
  });

  await test.step('the gap, read off the ladder and followed to its witness mark', async () => {
    await expect(ladder(page)).toContainText('to spare');
    await page.keyboard.press('i');
    const list = page.getByRole('dialog', { name: 'All gaps' });
    await expectAccessible(page);
    await list
      .getByRole('button', { name: /Brake pedal, Firewall/ })
      .first()
      .click();
    const finding = page.getByRole('region', { name: 'Finding: Brake pedal, Firewall' });
    await expect(finding).toContainText('needs');
    await expect(finding).toContainText('common practice, no source');
    await expectAccessible(page);
    await page.keyboard.press('Escape');
    await expect(finding).toBeHidden();
  });

  await test.step('undone by name, saved, and there again after a reload', async () => {
    await page.keyboard.press('Control+z');
    await expect(page.getByRole('button', { name: /^Redo: Change Stroke/ })).toBeEnabled();
    await expect(page.locator('.save-words')).toHaveText('saved');
    await page.reload();
    await expect(tag(page, 'fender liner')).toBeVisible();
    await expect(page.getByText('Pedal box', { exact: true })).toBeVisible();
  });
});
