// What a first visit has to fetch before anything shows.
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';
import { build, type Rollup } from 'vite';
import { afterEach, describe, expect, it, vi } from 'vitest';

const ROOT = fileURLToPath(new URL('../../..', import.meta.url));

/** gzip, bytes. */
const MOST = 250_000;

afterEach(() => vi.unstubAllEnvs());

describe('the entry of the client', () => {
  it('is small, and does not bring the 3D library', async () => {
    // the test runner's own setting would build React's development form
    vi.stubEnv('NODE_ENV', 'production');
    const result = (await build({
      root: ROOT,
      configFile: `${ROOT}/vite.config.ts`,
      logLevel: 'silent',
      mode: 'production',
      build: { write: false },
    })) as Rollup.RollupOutput;
    const chunks = new Map(
      result.output.filter((o): o is Rollup.OutputChunk => o.type === 'chunk').map((chunk) => [chunk.fileName, chunk]),
    );
    const entry = [...chunks.values()].find((chunk) => chunk.isEntry && chunk.name === 'index');
    expect(entry).toBeDefined();
    // all that the entry imports at once, however far
    const first = new Set<string>();
    const follow = (name: string): void => {
      if (first.has(name) || !chunks.has(name)) return;
      first.add(name);
      chunks.get(name)!.imports.forEach(follow);
    };
    follow(entry!.fileName);
    const modules = [...first].flatMap((name) => Object.keys(chunks.get(name)!.modules));
    expect(modules.filter((id) => /node_modules\/(three|@react-three|three-mesh-bvh|manifold-3d)\//.test(id))).toEqual(
      [],
    );
    const size = [...first].reduce((sum, name) => sum + gzipSync(chunks.get(name)!.code).length, 0);
    expect(size).toBeGreaterThan(20_000);
    expect(size).toBeLessThan(MOST);
  }, 120_000);
});
