// The whole story on the demo shop's own car, as three different people: the designer frees a conflict and runs a dry fit, the
// reviewer reads the report and stands at the witness mark, and somebody with the link turns it on a phone.
import type { Browser, Page } from '@playwright/test';
import { expect, expectAccessible, expectNoSideways, test } from './support';

// drawn without a graphics unit here: a small window keeps it quick
test.use({ viewport: { width: 1000, height: 640 } });

async function comeInAs(browser: Browser, role: string, address: string): Promise<Page> {
  const context = await browser.newContext({
    locale: 'en-GB',
    reducedMotion: 'reduce',
    viewport: { width: 1000, height: 640 },
    extraHTTPHeaders: { 'x-forwarded-for': address },
  });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByRole('button', { name: new RegExp(`${role}$`) }).click();
  await expect(page.getByRole('heading', { name: 'Your teams' })).toBeVisible();
  return page;
}

async function openScene(page: Page, name: RegExp): Promise<void> {
  await page.getByRole('link', { name: /Harbour pickup/ }).click();
  await page.getByRole('link', { name }).first().click();
  await expect(page.getByText('live', { exact: true })).toBeVisible({ timeout: 60_000 });
}

test('A designer frees the wiper, a reviewer reads what is left and stands at it, a stranger turns it on a phone', async ({
  browser,
}) => {
  test.setTimeout(240_000);
  const designer = await comeInAs(browser, 'designer', '198.18.77.1');
  await expectAccessible(designer);
  const url =
    await test.step('the designer moves the brace out of the link’s way, and the dry fit agrees', async () => {
      await openScene(designer, /First try, five conflicts/);
      const rail = designer.getByRole('region', { name: 'Parts' });
      await expect(designer.getByText('all answered')).toBeVisible();
      await rail
        .getByRole('button', { name: /^Cowl brace/ })
        .first()
        .click();
      const across = designer.getByRole('textbox', { name: /of column line$|column line/ }).first();
      // from left of the crank to right of it, well clear of its circle
      await across.fill('12');
      await across.press('Enter');
      await expect(designer.getByRole('button', { name: /^Undo: Move Cowl brace/ })).toBeEnabled();
      await expect(designer.locator('.save-words')).toHaveText('saved');
      await expectAccessible(designer);
      await designer.getByRole('button', { name: 'Run dry fit' }).click();
      await designer.getByRole('link', { name: /Report \d/ }).click({ timeout: 60_000 });
      await expect(designer.getByRole('region', { name: 'In one sentence' })).toContainText('Clutch cylinder hits');
      await expect(designer.getByRole('list').getByText('Cowl brace, Wiper motor', { exact: true })).toHaveCount(0);
      await expectAccessible(designer);
      return designer.url();
    });

  await test.step('the reviewer reads it, opens the worst finding, and may look but not move', async () => {
    const reviewer = await comeInAs(browser, 'reviewer', '198.18.77.2');
    await reviewer.goto(url);
    await expect(reviewer.getByRole('region', { name: 'In one sentence' })).toContainText('hits');
    await expect(reviewer.getByText('Pedals, brakes and steering can kill.')).toBeVisible();
    await expect(reviewer.getByRole('button', { name: 'Make share link' })).toHaveCount(0);
    await expectAccessible(reviewer);
    const entry = reviewer.getByRole('listitem').filter({ hasText: 'Clutch pedal, Harness clip' }).first();
    await entry.getByRole('link', { name: 'Clutch pedal, Harness clip', exact: true }).click();
    await expect(reviewer.getByRole('region', { name: /^Finding: Clutch pedal, Harness clip/ })).toBeVisible({
      timeout: 60_000,
    });
    await expect(reviewer.getByRole('button', { name: 'Run dry fit' })).toHaveCount(0);
    await expectAccessible(reviewer);
    await reviewer.context().close();
  });

  await test.step('somebody with the link reads it on a phone and stands at a finding', async () => {
    await designer.goto(url);
    await designer.getByRole('button', { name: 'Make share link' }).click();
    const link = await designer.getByLabel('Share link', { exact: true }).first().inputValue();
    const phone = await browser.newContext({ viewport: { width: 390, height: 844 }, hasTouch: true });
    const stranger = await phone.newPage();
    await stranger.goto(link);
    await expect(stranger.getByRole('heading', { name: /Harbour pickup/ })).toBeVisible();
    await expect(stranger.getByText('Pedals, brakes and steering can kill.')).toBeVisible();
    await expect(stranger.getByText('Dag Tollefsen')).toHaveCount(0);
    await expectNoSideways(stranger);
    await stranger
      .getByRole('button', { name: /Brake pedal, Steering column/ })
      .first()
      .click({ timeout: 60_000 });
    await expect(stranger.getByText('back to rest')).toBeVisible();
    await expectAccessible(stranger);
    await phone.close();
  });
  await designer.context().close();
});
