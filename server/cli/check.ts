// `npm run --silent check -- SCENE.json [--out REPORT.json] [--progress]`: a document and its meshes in, a report out,
// without database, server or browser. Exit 0: nothing hits, is tight or loose. 1: something does. 2: refused, with one
// line on standard error that names the file, the path inside it and the reason; nothing is written then.
import { createHash } from 'node:crypto';
import {
  closeSync,
  fstatSync,
  openSync,
  readFileSync,
  realpathSync,
  renameSync,
  rmSync,
  writeFileSync,
  writeSync,
} from 'node:fs';
import path from 'node:path';
import { checkScene, loadedMesh, meshNames, prepareScene, type LoadedMesh, type Report } from '#shared/check';
import { MAX_MESH_BYTES, meshFromStl } from '#shared/geometry';
import { loadSceneText, MAX_DOCUMENT_BYTES, type Scene } from '#shared/scene';

const USAGE = 'usage: npm run --silent check -- SCENE.json [--out REPORT.json] [--progress]';

/** Ends the command with exit 2 and one line. */
class Refused extends Error {}

interface Options {
  readonly scene: string;
  readonly out: string | null;
  readonly progress: boolean;
}

function readOptions(args: readonly string[]): Options {
  let scene: string | null = null;
  let out: string | null = null;
  let progress = process.stderr.isTTY;
  for (let i = 0; i < args.length; i += 1) {
    const arg = args[i]!;
    if (arg === '--progress') progress = true;
    else if (arg === '--out') {
      i += 1;
      const file = args[i];
      if (file === undefined || file === '') throw new Refused(`--out needs a file name; ${USAGE}`);
      out = file;
    } else if (arg.startsWith('--')) throw new Refused(`unknown option ${arg}; ${USAGE}`);
    else if (scene !== null) throw new Refused(`one scene at a time; ${USAGE}`);
    else scene = arg;
  }
  if (scene === null) throw new Refused(USAGE);
  return { scene, out, progress };
}

/** The words of a system error that a person can act on. */
function faultOf(error: unknown): string {
  const code = (error as NodeJS.ErrnoException).code;
  if (code === 'ENOENT') return 'the file does not exist';
  if (code === 'EACCES' || code === 'EPERM') return 'the file may not be read';
  if (code === 'EISDIR') return 'this is a folder, not a file';
  return error instanceof Error ? error.message : String(error);
}

/** Reads a whole file, refused beyond `most` bytes before anything is read. */
function readWithin(file: string, most: number, what: string): Buffer {
  const handle = openSync(file, 'r');
  try {
    const stat = fstatSync(handle);
    if (stat.isDirectory()) throw new Error('this is a folder, not a file');
    if (!stat.isFile()) throw new Error('this is not an ordinary file');
    if (stat.size > most) throw new Error(`${what} has ${stat.size} bytes, more than the ${most} allowed`);
    return readFileSync(handle);
  } finally {
    closeSync(handle);
  }
}

function readScene(file: string): { scene: Scene; sha256: string } {
  let bytes: Buffer;
  try {
    bytes = readWithin(file, MAX_DOCUMENT_BYTES, 'the document');
  } catch (error) {
    throw new Refused(`${file}: ${faultOf(error)}`);
  }
  const loaded = loadSceneText(bytes);
  if (!loaded.ok) {
    const first = loaded.refusals[0];
    throw new Refused(first.path === '' ? `${file}: ${first.reason}` : `${file}: ${first.path}: ${first.reason}`);
  }
  return { scene: loaded.scene, sha256: createHash('sha256').update(bytes).digest('hex') };
}

/** Where in the document a mesh is first named. */
function placeOf(scene: Scene, name: string): string {
  for (const [i, c] of scene.components.entries()) {
    for (const [j, s] of c.solids.entries()) {
      if (s.shape.kind === 'mesh' && s.shape.mesh === name) return `components[${i}].solids[${j}].shape.mesh`;
    }
  }
  return 'components';
}

function readMeshes(scene: Scene, file: string): Map<string, LoadedMesh> {
  const folder = realpathSync(path.dirname(file));
  const meshes = new Map<string, LoadedMesh>();
  for (const name of meshNames(scene)) {
    const refuse = (reason: string): Refused => new Refused(`${file}: ${placeOf(scene, name)}: ${name}: ${reason}`);
    let bytes: Buffer;
    try {
      const real = realpathSync(path.join(folder, name));
      // a link inside the folder may still point out of it
      if (!real.startsWith(folder.endsWith(path.sep) ? folder : folder + path.sep)) {
        throw new Error("the mesh lies outside the document's folder");
      }
      bytes = readWithin(real, MAX_MESH_BYTES, 'the mesh');
    } catch (error) {
      throw refuse(faultOf(error));
    }
    const result = meshFromStl(bytes);
    if (!result.ok) throw refuse(result.reason);
    meshes.set(name, loadedMesh(result.mesh, createHash('sha256').update(bytes).digest('hex')));
  }
  return meshes;
}

/** Writes beside the target first, so that a fault leaves what was there. */
function writeReport(report: Report, out: string | null): void {
  const text = `${JSON.stringify(report, null, 2)}\n`;
  if (out === null) {
    writeAll(1, text);
    return;
  }
  const beside = `${out}.${process.pid}.part`;
  try {
    writeFileSync(beside, text);
    renameSync(beside, out);
  } catch (error) {
    rmSync(beside, { force: true });
    const code = (error as NodeJS.ErrnoException).code;
    throw new Refused(`${out}: ${code === 'ENOENT' ? 'its folder does not exist' : faultOf(error)}`);
  }
}

/** Writes everything although a pipe may take it in parts. */
function writeAll(handle: number, text: string): void {
  const bytes = Buffer.from(text);
  let done = 0;
  while (done < bytes.length) {
    try {
      done += writeSync(handle, bytes, done);
    } catch (error) {
      const code = (error as NodeJS.ErrnoException).code;
      if (code === 'EPIPE') return;
      if (code !== 'EAGAIN') throw error;
    }
  }
}

function progressLine(): (done: number, total: number) => void {
  let shown = -1;
  return (done, total) => {
    const percent = Math.floor((100 * done) / total);
    if (percent === shown) return;
    shown = percent;
    const end = done === total ? '\n' : '';
    const text = `checked ${done} of ${total} (${percent} %)`;
    process.stderr.write(process.stderr.isTTY ? `\r${text}${end}` : `${text}\n`);
  };
}

function run(args: readonly string[]): number {
  const options = readOptions(args);
  const { scene, sha256 } = readScene(options.scene);
  const prepared = prepareScene(scene, readMeshes(scene, options.scene));
  if (!prepared.ok) {
    throw new Refused(`${options.scene}: ${prepared.refusal.path}: ${prepared.refusal.reason}`);
  }
  const report = checkScene(prepared.prepared, sha256, options.progress ? progressLine() : undefined);
  writeReport(report, options.out);
  const { hits, tight, loose } = report.totals;
  return hits + tight + loose > 0 ? 1 : 0;
}

try {
  process.exitCode = run(process.argv.slice(2));
} catch (error) {
  // one line, whatever a file name or a value in it may hold
  const text = error instanceof Refused ? error.message : `the check failed: ${faultOf(error)}`;
  process.stderr.write(`${text.replace(/\p{Cc}+/gu, ' ')}\n`);
  process.exitCode = 2;
}
