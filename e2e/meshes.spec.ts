import { api, boxStl, expect, expectAccessible, test, type Member } from './support';

interface Named {
  readonly id: string;
}

const stl = (name: string, buffer: Buffer) => ({ name, mimeType: 'model/stl', buffer });

async function openMeshes({ page }: Member): Promise<string> {
  const { id } = await api<Named>(page, 'POST', '/teams', { name: 'Mesh shop' });
  await page.goto(`/teams/${id}/meshes`);
  await expect(page.getByText('No mesh yet')).toBeVisible();
  return id;
}

test('A designer brings in a mesh and says its unit by the size it gives', async ({ enter }) => {
  const member = await enter('Dag Ambler');
  await openMeshes(member);
  const { page } = member;
  await page.getByTestId('mesh-file').setInputFiles(stl('wiper.stl', boxStl(4.25, 6, 9)));
  const question = page.getByRole('region', { name: 'Unit of wiper.stl' });
  await expect(question).toBeVisible();
  await expectAccessible(page);
  await expect(question.getByText('closed shape')).toBeVisible();
  await expect(question.getByLabel(/^inches/)).toBeChecked();
  await expect(question.getByLabel(/^inches/)).toHaveAccessibleName(/4 1\/4 inches by 6 inches by 9 inches/);
  await question.getByRole('button', { name: 'It is in inches' }).click();
  await expect(page.getByRole('row', { name: /wiper\.stl/ })).toContainText('file in inches');

  await page.getByTestId('mesh-file').setInputFiles(stl('same-again.stl', boxStl(4.25, 6, 9)));
  await expect(page.getByText('The team has this file already, as “wiper.stl”.')).toBeVisible();
  await expect(page.getByRole('row')).toHaveCount(2);

  await page.getByRole('button', { name: 'More for wiper.stl' }).click();
  await page.getByRole('menuitem', { name: 'Change the unit' }).click();
  await page.getByLabel(/^centimetres/).check();
  await page.getByRole('button', { name: 'It is in centimetres' }).click();
  await expect(page.getByRole('row', { name: /wiper\.stl/ })).toContainText('file in centimetres');
});

test('Files that cannot be used are refused with the reason and leave nothing', async ({ enter }) => {
  const member = await enter('Ona Reyes');
  const team = await openMeshes(member);
  const { page } = member;
  const whole = boxStl(40, 60, 90);
  const notFinite = Buffer.from(whole);
  notFinite.writeFloatLE(NaN, 84 + 12);
  await page
    .getByTestId('mesh-file')
    .setInputFiles([
      stl('empty.stl', Buffer.alloc(0)),
      stl('page.stl', Buffer.from('<html>gone</html>'.repeat(20))),
      stl('short.stl', whole.subarray(0, 200)),
      stl('nan.stl', notFinite),
    ]);
  const uploads = page.getByRole('list', { name: 'Uploads' });
  await expect(uploads.getByText('empty.stl was not taken: the file is empty.')).toBeVisible();
  await expect(uploads.getByText(/page\.stl was not taken/)).toBeVisible();
  await expect(uploads.getByText(/short\.stl was not taken: the file is truncated/)).toBeVisible();
  await expect(uploads.getByText(/nan\.stl was not taken: triangle 1 of 12/)).toBeVisible();
  expect(await api(page, 'GET', `/teams/${team}/meshes`)).toEqual([]);
  await uploads.getByRole('button', { name: 'Put away' }).first().click();
  await expect(uploads.getByRole('listitem')).toHaveCount(3);
});

test('An upload shows how far it is and can be cancelled', async ({ enter }) => {
  const member = await enter('Per Aske');
  const team = await openMeshes(member);
  const { page } = member;
  const session = await page.context().newCDPSession(page);
  await session.send('Network.emulateNetworkConditions', {
    offline: false,
    latency: 0,
    downloadThroughput: -1,
    uploadThroughput: 200_000,
  });
  // bytes behind the triangles are ignored by the reader, but they take their time on the way
  const heavy = Buffer.concat([boxStl(40, 60, 90), Buffer.alloc(4_000_000)]);
  await page.getByTestId('mesh-file').setInputFiles(stl('heavy.stl', heavy));
  const bar = page.getByRole('progressbar', { name: 'heavy.stl' });
  await expect(bar).toBeVisible();
  await expect.poll(async () => Number(await bar.getAttribute('aria-valuenow'))).toBeGreaterThan(0);
  await page.getByRole('button', { name: 'Cancel' }).click();
  await expect(bar).toHaveCount(0);
  expect(await api(page, 'GET', `/teams/${team}/meshes`)).toEqual([]);
});

test('A mesh that a scene uses cannot be deleted, and the scene is named', async ({ enter }) => {
  const member = await enter('Liv Torvald');
  const team = await openMeshes(member);
  const { page } = member;
  await page.getByTestId('mesh-file').setInputFiles(stl('liner.stl', boxStl(400, 60, 300)));
  await page.getByRole('button', { name: 'It is in millimetres' }).click();
  await expect(page.getByRole('row', { name: /liner\.stl/ })).toBeVisible();
  const [mesh] = await api<{ sha256: string }[]>(page, 'GET', `/teams/${team}/meshes`);
  const { id: project } = await api<Named>(page, 'POST', `/teams/${team}/projects`, { name: 'Blue pickup' });
  const { id: scene } = await api<Named>(page, 'POST', `/projects/${project}/scenes`, { name: 'Layout 1' });
  const open = await api<{ saveNumber: number; document: Record<string, unknown> }>(
    page,
    'GET',
    `/scenes/${scene}/document`,
  );
  await api(page, 'PUT', `/scenes/${scene}/document`, {
    base: open.saveNumber,
    saveId: crypto.randomUUID(),
    document: {
      ...open.document,
      components: [
        {
          id: 'liner',
          name: 'Fender liner',
          category: 'fender-liner',
          solids: [{ id: 'shell', shape: { kind: 'mesh', mesh: mesh!.sha256, scale: 1 } }],
        },
      ],
    },
  });
  await page.getByRole('button', { name: 'More for liner.stl' }).click();
  await page.getByRole('menuitem', { name: 'Delete the mesh' }).click();
  await page.getByRole('button', { name: 'Delete the mesh' }).click();
  await expect(page.getByText('It is used by “Layout 1” (Blue pickup)')).toBeVisible();
  await page.getByRole('button', { name: 'Keep it as it is' }).click();

  await page.goto(`/projects/${project}`);
  await expect(page.getByRole('region', { name: 'Meshes' })).toContainText('liner.stl');
});
