import type { Page } from '@playwright/test';
import { api, boxStl, expect, expectAccessible, expectNoSideways, linkInMail, test, type Member } from './support';

interface Named {
  readonly id: string;
}

// the picture is drawn without a graphics unit here: a small window keeps it quick
test.use({ viewport: { width: 1000, height: 640 } });

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

/** Opens a scene; the camera goes at once to where it is sent, as it does for people who want no movement. */
async function openBench(page: Page, scene: string): Promise<void> {
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await page.goto(`/scenes/${scene}`);
  await expect(page.getByRole('heading', { name: 'Layout 1' })).toBeVisible();
}

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
  await openBench(page, start.scene);
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
  await openBench(page, scene);
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

test('Lengths are typed as in the shop; what cannot be read is refused and says why', async ({ enter }) => {
  const member = await enter('Ona Reyes');
  const { page } = member;
  await sceneWithParts(member);
  await tag(page, 'Brake pedal').click();
  const place = page.getByLabel('right of column line');
  await expect(place).toHaveValue('4 23/32');
  for (const [typed, shown] of [
    ['5 3/8', '5 3/8'],
    ['5.5in', '5 1/2'],
    ['136,5 mm', '5 3/8'],
    ['4-1/8"', '4 1/8'],
    ['+1/8', '4 1/4'],
    ['-1/16', '4 3/16'],
  ] as const) {
    await place.fill(typed);
    await place.press('Enter');
    await expect(place).toHaveValue(shown);
  }
  await place.fill('1,250');
  await place.press('Enter');
  await expect(page.getByText('1,250 could mean 1250 or 1.25')).toBeVisible();
  await expect(place).toHaveValue('1,250');
  await place.press('Escape');
  await expect(place).toHaveValue('4 3/16');

  await page.getByRole('button', { name: 'Unit: Inches and fractions' }).click();
  await page.getByRole('menuitem', { name: 'Millimetres' }).click();
  await expect(place).toHaveValue('106.4');
  await page.getByRole('tab', { name: 'Size' }).click();
  await page.getByLabel('wide').fill('-4');
  await page.keyboard.press('Enter');
  await expect(page.getByText('Must be at least 0.4 mm.')).toBeVisible();
  await expectAccessible(page);
});

test('Everything at the bench works without a mouse', async ({ enter }) => {
  const member = await enter('Per Aske');
  const { page } = member;
  await sceneWithParts(member);
  await tag(page, 'Wiper motor').focus();
  await page.keyboard.press('Enter');
  await expect(page.getByLabel('left of column line')).toHaveValue('9 29/64');
  // from the driver's seat the right arrow is the car's right
  await page.keyboard.press('1');
  await expect(page.getByRole('button', { name: "Driver's seat" })).toHaveAttribute('aria-pressed', 'true');
  await page.keyboard.press('ArrowRight');
  await expect(page.getByLabel('left of column line')).toHaveValue('9 25/64');
  await page.keyboard.press('Shift+ArrowLeft');
  await expect(page.getByLabel('left of column line')).toHaveValue('9 41/64');
  await expect(page.getByRole('button', { name: 'Undo: Move Wiper motor' })).toBeEnabled();
  await page.keyboard.press('h');
  await expect(page.getByRole('button', { name: 'Take Wiper motor off the bench' })).toBeAttached();
  await page.keyboard.press('u');
  await page.keyboard.press('?');
  await expect(page.getByRole('dialog', { name: 'Keys' })).toContainText('nudge by the step');
  await page.keyboard.press('Escape');
  await page.keyboard.press('c');
  await expect(page.getByRole('group', { name: 'Cutaway' })).toBeVisible();
  await page.keyboard.press('c');
  await page.keyboard.press('n');
  await expect(page.getByRole('region', { name: /^Finding/ })).toBeVisible();
  await page.keyboard.press('Escape');
  await page.keyboard.press('m');
  await expect(page.getByRole('menuitem', { name: 'Duplicate' })).toBeVisible();
  await page.keyboard.press('Escape');
  await page.keyboard.press('Delete');
  await expect(tag(page, 'Wiper motor')).toBeHidden();
  await page.getByRole('button', { name: 'Undo', exact: true }).click();
  await expect(tag(page, 'Wiper motor')).toBeVisible();
});

test('A hand drags a part by its handle: the ladder moves along, Esc puts it back', async ({ enter }) => {
  const member = await enter('Liv Torvald');
  const { page } = member;
  await sceneWithParts(member);
  await tag(page, 'Wiper motor').click();
  await page.keyboard.press('8');
  const rung = ladder(page).getByRole('button', { name: /Firewall, Wiper motor/ });
  await expect(rung).toContainText('1 5/16');
  const rear = page.locator('.handle', { hasText: 'rear' }).locator('.handle-hit');
  const [x1, y1, x2, y2] = await rear.evaluate((line) =>
    ['x1', 'y1', 'x2', 'y2'].map((k) => Number(line.getAttribute(k))),
  );
  const [x, y] = [(x1! + x2!) / 2, (y1! + y2!) / 2];
  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.move(x + (x2! - x1!) * 0.2, y + (y2! - y1!) * 0.2, { steps: 4 });
  await expect(rung).not.toContainText('1 5/16');
  await page.keyboard.press('Escape');
  await page.mouse.up();
  await expect(rung).toContainText('1 5/16');
  await expect(page.getByRole('button', { name: 'Nothing to undo' })).toBeDisabled();
  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.move(x + (x2! - x1!) * 0.2, y + (y2! - y1!) * 0.2, { steps: 4 });
  await page.mouse.up();
  await expect(page.getByRole('button', { name: 'Undo: Move Wiper motor' })).toBeEnabled();
});

test('Two people change one scene: different parts go together, the same part is shown side by side', async ({
  enter,
}) => {
  const owner = await enter('Odile Ferris');
  const friend = await enter('Tam Kerr');
  const { team, scene } = await sceneWithParts(owner);
  await api(owner.page, 'POST', `/teams/${team}/invitations`, { email: friend.email, role: 'designer', projects: [] });
  const link = await linkInMail(friend.page.request, friend.email, /invites you/);
  await friend.page.request.post(`/api/invitations/${link.split('/').at(-1)}/accept`);
  await openBench(friend.page, scene);

  const move = async ({ page }: Member, part: string, field: string | RegExp, text: string): Promise<void> => {
    await tag(page, part).click();
    await page.getByLabel(field).fill(text);
    await page.getByLabel(field).press('Enter');
  };
  const saved = ({ page }: Member) => expect(page.locator('.save-words')).toHaveText('saved');
  await saved(friend);
  await move(owner, 'Brake pedal', 'right of column line', '6');
  await saved(owner);
  await move(friend, 'Wiper motor', 'left of column line', '10');
  await saved(friend);
  // the friend's save brought the owner's move along
  await tag(friend.page, 'Brake pedal').click();
  await expect(friend.page.getByLabel('right of column line')).toHaveValue('6');

  await move(owner, 'Brake pedal', 'right of column line', '7');
  await saved(owner);
  await move(friend, 'Brake pedal', 'right of column line', '5');
  await friend.page.getByRole('button', { name: 'Look at both' }).click();
  const both = friend.page.getByRole('dialog', { name: 'Two people changed the same' });
  await expect(both.getByRole('row', { name: /^Brake pedal/ })).toBeVisible();
  await expectAccessible(friend.page);
  await both.getByRole('button', { name: 'Take theirs' }).click();
  await saved(friend);
  await expect(friend.page.getByLabel('right of column line')).toHaveValue('7');
});

test('On a phone the bench is read: gaps, tape and tags come up from below', async ({ enter }) => {
  const member = await enter('Ida Holm');
  const { page } = member;
  await page.setViewportSize({ width: 390, height: 844 });
  await sceneWithParts(member);
  const gaps = page.getByRole('button', { name: /^Gaps/ });
  await expect(gaps).toBeVisible();
  await expectNoSideways(page);
  await expectAccessible(page);
  await gaps.click();
  await ladder(page)
    .getByRole('button', { name: /Firewall, Wiper motor/ })
    .click();
  await tag(page, 'Wiper motor').click();
  await page.getByRole('button', { name: /^Tape/ }).click();
  await expect(page.getByLabel('left of column line')).toHaveValue('9 29/64');
  await expectNoSideways(page);
  await page.getByRole('button', { name: 'Put the tape away' }).click();
  await expect(page.getByLabel('left of column line')).toBeHidden();
});
