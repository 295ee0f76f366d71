import type { Browser, Page } from '@playwright/test';
import { api, boxStl, expect, expectAccessible, expectNoSideways, test, type Member } from './support';

interface Named {
  readonly id: string;
}

// the pictures are drawn without a graphics unit here: a small window keeps them quick
test.use({ viewport: { width: 1000, height: 640 } });

const box = (id: string, name: string, category: string, size: number[], at: number[], more = {}) => ({
  id,
  name,
  category,
  pose: { at },
  tolerance: 1,
  solids: [{ id: 'body', shape: { kind: 'box', size } }],
  ...more,
});

const swing = { kind: 'swing', point: [0, 0, 120], axis: [0, 1, 0], from: 0, to: 30 };
const stroke = { id: 'stroke', name: 'Brake stroke', use: 'operating', steps: [swing] };

/** A scene in which a pedal meets a bracket on its way, and a mesh is wanted for the picture. */
async function sceneWithHit({ page }: Member): Promise<string> {
  const { id: team } = await api<Named>(page, 'POST', '/teams', { name: 'Harbour shop' });
  const { id: project } = await api<Named>(page, 'POST', `/teams/${team}/projects`, { name: 'Harbour Lane pickup' });
  const { id: scene } = await api<Named>(page, 'POST', `/projects/${project}/scenes`, { name: 'Layout 1' });
  const sent = await page.request.post(`/api/teams/${team}/meshes`, {
    multipart: { file: { name: 'liner.stl', mimeType: 'model/stl', buffer: boxStl(380, 8, 300) } },
  });
  const { mesh } = (await sent.json()) as { mesh: { sha256: string } };
  const path = `/scenes/${scene}/document`;
  const { saveNumber, document } = await api<{ saveNumber: number; document: object }>(page, 'GET', path);
  await api(page, 'PUT', path, {
    base: saveNumber,
    saveId: crypto.randomUUID(),
    document: {
      ...document,
      components: [
        box('firewall', 'Firewall', 'firewall', [2, 1300, 500], [-200, 0, 500]),
        box('brake-pedal', 'Brake pedal', 'pedal', [20, 12, 240], [120, 420, 480], { motions: [stroke] }),
        box('clip', 'Harness bracket', 'bracket', [30, 80, 4], [60, 420, 380]),
        box('liner', 'Fender liner', 'fender-liner', [1, 1, 1], [-300, 700, 300], {
          solids: [{ id: 'skin', shape: { kind: 'mesh', mesh: mesh.sha256, scale: 1 } }],
        }),
      ],
    },
  });
  return scene;
}

async function runDryFit(page: Page, scene: string): Promise<void> {
  await page.goto(`/scenes/${scene}/dry-fits`);
  await expect(page.getByText('No dry fit yet')).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'Run dry fit' }).click();
  await page.getByRole('link', { name: 'Report of revision 1' }).click();
  await expect(page.getByRole('heading', { name: /Layout 1, revision 1/ })).toBeVisible();
}

async function asStranger(browser: Browser, url: string): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 390, height: 844 }, hasTouch: true });
  const page = await context.newPage();
  await page.goto(url);
  return page;
}

test('A designer runs a dry fit and reads what is wrong first, with pictures that this browser draws', async ({
  enter,
}) => {
  test.slow();
  const member = await enter('Dag Ambler');
  const { page } = member;
  const scene = await sceneWithHit(member);
  await runDryFit(page, scene);
  await expect(page.getByRole('region', { name: 'In one sentence' })).toContainText(/hits .*of “Brake stroke”/);
  await expect(page.getByRole('region', { name: 'Roll-call' })).toContainText('brake booster');
  await expect(page.getByText('Pedals, brakes and steering can kill.')).toBeVisible();
  const entry = page.getByRole('listitem').filter({ hasText: 'Brake pedal, Harness bracket' }).first();
  await expect(entry.getByText(/hits from/)).toBeVisible();
  await expect(entry.locator('img')).toBeVisible({ timeout: 60_000 });
  await expectAccessible(page);
  await page.setViewportSize({ width: 390, height: 844 });
  await expectNoSideways(page);
  await page.setViewportSize({ width: 1000, height: 640 });
  await entry.getByRole('link', { name: 'Brake pedal, Harness bracket', exact: true }).click();
  await expect(page.getByRole('region', { name: /^Finding: Brake pedal, Harness bracket/ })).toBeVisible({
    timeout: 30_000,
  });
});

test('A designer takes a picture, posts the link, a stranger looks at it on a phone, and the link is revoked', async ({
  enter,
  browser,
}) => {
  test.slow();
  const member = await enter('Dag Ambler');
  const { page } = member;
  const scene = await sceneWithHit(member);
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await page.goto(`/scenes/${scene}`);
  await page.getByRole('button', { name: 'Run dry fit' }).click();
  await expect(page.getByRole('link', { name: 'Report 1' })).toBeVisible({ timeout: 30_000 });
  await page.getByRole('button', { name: 'Take picture' }).click();
  const sheet = page.getByRole('dialog', { name: 'Picture of revision 1' });
  await expect(sheet).toBeVisible({ timeout: 30_000 });
  await expect(sheet.getByRole('link', { name: 'Download' })).toHaveAttribute('download', /revision-1\.png$/);
  await sheet.getByRole('button', { name: 'Make share link' }).click();
  const url = await sheet.getByLabel('Share link', { exact: true }).inputValue();
  await expect(sheet.getByLabel('For a build thread (BBCode)', { exact: true })).toHaveValue(
    /\[img\].*\/picture\[\/img\]/,
  );

  const head = await (await page.request.get(url)).text();
  expect(head).toContain('property="og:image"');

  const stranger = await asStranger(browser, url);
  await expect(stranger.getByRole('heading', { name: 'Harbour Lane pickup: Layout 1' })).toBeVisible();
  await expect(stranger.getByText('Pedals, brakes and steering can kill.')).toBeVisible();
  await expect(stranger.getByRole('link', { name: 'The picture in full size' })).toBeVisible();
  await expectNoSideways(stranger);
  await stranger
    .getByRole('button', { name: /Brake pedal, Harness bracket/ })
    .first()
    .click({ timeout: 30_000 });
  await expect(stranger.getByText('back to rest')).toBeVisible();
  await expectAccessible(stranger);

  await sheet.getByRole('button', { name: 'Revoke the link' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Revoke the link' }).click();
  await expect(page.getByRole('alertdialog')).toBeHidden();
  await stranger.reload();
  await expect(stranger.getByRole('heading', { name: 'This link was revoked' })).toBeVisible();
  await stranger.context().close();
});
