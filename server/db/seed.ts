// `node dist/server/seed.js`: the demo team, once. A second run finds it there and changes nothing.
import { createHash, randomUUID } from 'node:crypto';
import { copyFile, mkdir, readFile } from 'node:fs/promises';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { hashPassword } from 'better-auth/crypto';
import { eq, sql } from 'drizzle-orm';
import { meshNames } from '#shared/check';
import { missingFrom, rollCall, type RollCallKey } from '#shared/review';
import { loadScene, type Scene } from '#shared/scene';
import { readConfig, type Config } from '../config';
import { askForDryFit } from '../dry-fits/rules';
import { jobs } from '../jobs/jobs';
import { guessUnit, judgeFile, meshKey } from '../meshes/rules';
import { noteActivity } from '../projects/rules';
import { createFileStore, type FileStore } from '../storage/file-store';
import { openDatabase, tables, type Database, type Transaction } from './client';
import { DEMO_PASSWORD, DEMO_PEOPLE } from './demo-people';

const { account, membership, mesh, project, projectGuest, scene, team, user } = tables;

const DEMO = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../../assets/demo');
const TEAM = 'Tide Street Metalworks';

interface DemoProject {
  readonly name: string;
  readonly car: string;
  readonly display: 'mm' | 'in' | 'in-decimal';
  readonly notes: string;
  readonly notOnThisCar: readonly RollCallKey[];
  readonly scenes: readonly string[];
}

async function seedPeople(tx: Transaction): Promise<{ teamId: string; ids: Record<string, string> }> {
  const ids: Record<string, string> = {};
  const password = await hashPassword(DEMO_PASSWORD);
  const [made] = await tx.insert(team).values({ name: TEAM }).returning({ id: team.id });
  for (const person of DEMO_PEOPLE) {
    const id = randomUUID();
    ids[person.role] = id;
    await tx.insert(user).values({ id, name: person.name, email: person.email, emailVerified: true });
    await tx
      .insert(account)
      .values({ id: randomUUID(), accountId: id, providerId: 'credential', userId: id, password });
    await tx.insert(membership).values({ teamId: made!.id, personId: id, role: person.role });
  }
  return { teamId: made!.id, ids };
}

/** Takes a demo mesh in as an upload would; gives its hash. */
async function seedMesh(
  tx: Transaction,
  store: FileStore,
  files: string,
  teamId: string,
  name: string,
  by: string,
): Promise<string> {
  const file = path.join(DEMO, name);
  const bytes = await readFile(file);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  const judged = await judgeFile(file);
  if (!judged.ok) throw new Error(`${name}: ${judged.reason}`);
  const { facts } = judged;
  await mkdir(path.join(files, 'incoming'), { recursive: true });
  const copy = path.join(files, 'incoming', `seed-${randomUUID()}`);
  await copyFile(file, copy);
  await store.takeFile(meshKey(teamId, sha256), copy);
  const unit = guessUnit(facts);
  await tx
    .insert(mesh)
    .values({
      teamId,
      sha256,
      name: path.basename(name),
      bytes: bytes.length,
      ...facts,
      guess: unit,
      unit,
      uploadedBy: by,
    })
    .onConflictDoNothing();
  return sha256;
}

function withHashes(document: Scene, hashes: ReadonlyMap<string, string>): Scene {
  return {
    ...document,
    components: document.components.map((c) => ({
      ...c,
      solids: c.solids.map((s) =>
        s.shape.kind === 'mesh' ? { ...s, shape: { ...s.shape, mesh: hashes.get(s.shape.mesh) ?? s.shape.mesh } } : s,
      ),
    })),
  };
}

async function seedProject(
  tx: Transaction,
  store: FileStore,
  config: Config,
  teamId: string,
  ids: Record<string, string>,
): Promise<void> {
  const facts = JSON.parse(await readFile(path.join(DEMO, 'demo.json'), 'utf8')) as DemoProject;
  const { scenes, notOnThisCar, ...rest } = facts;
  const [made] = await tx
    .insert(project)
    .values({ teamId, ...rest, notOnThisCar: [...notOnThisCar] })
    .returning({ id: project.id });
  const designer = ids['designer']!;
  await noteActivity(tx, made!.id, designer, 'made the project');
  await tx.insert(projectGuest).values({ projectId: made!.id, personId: ids['guest']! });
  const hashes = new Map<string, string>();
  for (const file of scenes) {
    const loaded = loadScene(JSON.parse(await readFile(path.join(DEMO, file), 'utf8')));
    if (!loaded.ok) throw new Error(`${file}: ${loaded.refusals[0].path}: ${loaded.refusals[0].reason}`);
    for (const name of meshNames(loaded.scene)) {
      if (!hashes.has(name)) hashes.set(name, await seedMesh(tx, store, config.files, teamId, name, designer));
    }
    const document = withHashes(loaded.scene, hashes);
    const [placed] = await tx
      .insert(scene)
      .values({
        projectId: made!.id,
        name: document.name,
        document,
        parts: document.components.length,
        meshes: meshNames(document),
        updatedBy: designer,
        // lists are in the order of time, and the transaction has one time for all
        createdAt: sql`clock_timestamp()`,
        updatedAt: sql`clock_timestamp()`,
      })
      .returning({ sceneId: scene.id, saveNumber: scene.saveNumber });
    await noteActivity(tx, made!.id, designer, `made the scene “${document.name}”`);
    // a finished layout has its dry fit, which the server works out as soon as it runs; one under way has none yet
    if (missingFrom(rollCall(document, notOnThisCar)).length === 0) await askForDryFit(tx, jobs, placed!, designer);
  }
}

/** Makes the demo team if it is not there. True if it was made. */
export async function seedDemo(db: Database, store: FileStore, config: Config): Promise<boolean> {
  if (config.mode === 'production') throw new Error('there are no demo accounts in production');
  return db.transaction(async (tx) => {
    const [there] = await tx.select({ id: user.id }).from(user).where(eq(user.email, DEMO_PEOPLE[0]!.email));
    if (there !== undefined) return false;
    const { teamId, ids } = await seedPeople(tx);
    await seedProject(tx, store, config, teamId, ids);
    return true;
  });
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  try {
    const config = readConfig(process.env);
    const database = openDatabase(config.databaseUrl, 2, () => undefined);
    await seedDemo(database.db, await createFileStore(config), config);
    await database.close();
  } catch (error) {
    process.stderr.write(`The demo could not be made: ${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  }
}
