// The compiled command, run as `npm run check` runs it: reports and exit codes, and one line for every kind of bad input.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Report } from '#shared/check';
import { block, findingOf, mesh, motion, part, rod, sceneOf, slide, swing } from '../fixtures/scenes';
import { boxSoup } from '../fixtures/soups';
import { asciiStl, binaryStl, textBytes } from '../fixtures/stl';

type Json = Readonly<Record<string, unknown>>;
const ROOT = path.resolve(import.meta.dirname, '../..');
const COMMAND = path.join(ROOT, 'server/setup/check.mjs');
let folder = '';

interface Run {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
}

function run(...args: readonly string[]): Run {
  const env = { ...process.env };
  delete env['INIT_CWD'];
  const { status, stdout, stderr } = spawnSync(process.execPath, [COMMAND, ...args], {
    cwd: folder,
    encoding: 'utf8',
    env,
  });
  return { code: status, out: stdout, err: stderr };
}

type Files = Readonly<Record<string, Uint8Array | string>>;
function write(files: Files): void {
  for (const [name, content] of Object.entries(files)) {
    mkdirSync(path.dirname(path.join(folder, name)), { recursive: true });
    writeFileSync(path.join(folder, name), content);
  }
}
function check(document: Json, files: Files = {}): { readonly code: number | null; readonly report: Report } {
  write({ 'scene.json': JSON.stringify(document), ...files });
  const { code, out, err } = run('scene.json');
  expect(err).toBe('');
  return { code, report: JSON.parse(out) as Report };
}

beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'check-'));
  // brings the compiled command up to date
  expect(run().code).toBe(2);
}, 120_000);
afterAll(() => {
  rmSync(folder, { recursive: true, force: true });
});

const apart = (): Json =>
  sceneOf([part('a', [block([10, 10, 10])]), part('b', [block([10, 10, 10], { at: [40, 0, 0] })])]);

describe('reports', () => {
  test('all clear: exit 0, the report on standard output, its hash that of the bytes read', () => {
    const { code, report } = check(apart());
    expect(code).toBe(0);
    expect([report.format, report.version, report.scene.name]).toEqual(['gapwright-report', 1, 'Test']);
    const bytes = readFileSync(path.join(folder, 'scene.json'));
    expect(report.scene.sha256).toBe(createHash('sha256').update(bytes).digest('hex'));
    expect(findingOf(report, 'a', 'b').gap).toBe(30);
  });

  test.each([
    ['tight', 15],
    ['hits', 9],
  ])('%s: exit 1', (verdict, x) => {
    const { code, report } = check(
      sceneOf([part('a', [block([10, 10, 10])]), part('b', [block([10, 10, 10], { at: [x, 0, 0] })])]),
    );
    expect([code, report.findings[0]!.verdict]).toEqual([1, verdict]);
  });

  test.each([
    ['loose', 20, 1],
    ['seated', 10, 0],
  ])('a joint that is %s', (verdict, x, exit) => {
    const rules = { pairs: [{ between: [{ component: 'a' }, { component: 'b' }], joint: {} }] };
    const parts = [part('a', [block([10, 10, 10])]), part('b', [block([10, 10, 10], { at: [x, 0, 0] })])];
    const { code, report } = check(sceneOf(parts, { rules }));
    expect([code, report.findings[0]!.verdict]).toEqual([exit, verdict]);
  });

  test('--out writes the same report to the file and says nothing', () => {
    write({ 'scene.json': JSON.stringify(apart()) });
    const shown = run('scene.json');
    const { code, out, err } = run('scene.json', '--out', 'report.json');
    expect([code, out, err]).toEqual([0, '', '']);
    expect(readFileSync(path.join(folder, 'report.json'), 'utf8')).toBe(shown.out);
    rmSync(path.join(folder, 'report.json'));
  });

  test('progress goes to standard error, and only when asked for', () => {
    write({ 'scene.json': JSON.stringify(apart()) });
    const { code, out, err } = run('scene.json', '--progress');
    expect(code).toBe(0);
    expect(err).toMatch(/checked 1 of 1/);
    expect(() => JSON.parse(out) as unknown).not.toThrow();
  });
});

describe('answers', () => {
  test('a thin sheet that an arm meets only between 41 % and 43 % of its stroke', () => {
    // The arm hangs from the pivot, ±w thick, and swings 40 degrees about +Y. The sheet lies in the radial plane at 42 % of
    // that, from 200 to 240 below the pivot: the arm's side meets its nearer edge at ± asin(w / 200) from there.
    const stroke = 40;
    const half = 0.01 * stroke;
    const w = 200 * Math.sin((half * Math.PI) / 180);
    const theta = (0.42 * stroke * Math.PI) / 180;
    const at = (r: number, y: number): number[] => [-r * Math.sin(theta), y, -r * Math.cos(theta)];
    const sheet = [...at(200, -5), ...at(240, -5), ...at(240, 5), ...at(200, -5), ...at(240, 5), ...at(200, 5)];
    const arm = part('arm', [block([2 * w, 12, 300], { at: [0, 0, -150] })], { motions: [motion([swing(stroke)])] });
    const { code, report } = check(sceneOf([arm, part('sheet', [mesh('sheet.stl')])]), {
      'sheet.stl': asciiStl(sheet),
    });
    const f = findingOf(report, 'arm', 'sheet', ['arm']);
    expect([code, f.verdict, f.gap, f.hitSpans!.length]).toEqual([1, 'hits', 0, 1]);
    // a hit begins `touch` before contact; its ends are good to 0.05 mm of travel at 300 from the pivot
    const touching = (Math.asin((w + 0.01) / 200) * 180) / Math.PI / stroke;
    const slack = ((0.05 / 300) * (180 / Math.PI)) / stroke;
    const [from, to] = f.hitSpans![0]!;
    expect(Math.abs(from - (0.42 - touching))).toBeLessThan(slack);
    expect(Math.abs(to - (0.42 + touching))).toBeLessThan(slack);
    expect([from, to].map((p) => Math.round(1000 * p))).toEqual([410, 430]);
    expect(report.meshes[0]).toMatchObject({ mesh: 'sheet.stl', kind: 'sheet', triangles: 2, badEdges: 4 });
    // at rest it is far off
    expect(findingOf(report, 'arm', 'sheet').verdict).toBe('clears');
  });

  test('a part wholly inside another', () => {
    const parts = [
      part('shell', [mesh('big.stl')]),
      part('core', [mesh('small.stl', { at: [1, 2, 3] })]),
      part('pin', [rod(4, 8)]),
    ];
    const { code, report } = check(sceneOf(parts), {
      'big.stl': binaryStl(boxSoup(100, 100, 100)),
      'small.stl': asciiStl(boxSoup(10, 10, 10)),
    });
    expect([code, report.totals.hits]).toEqual([1, 3]);
    for (const f of report.findings) expect([f.gap, f.gapAtLeast]).toEqual([0, 0]);
  });

  test('two pedals side by side keep a constant gap, in every combination of their strokes', () => {
    const pedal = (id: string, y: number): Json =>
      part(id, [block([20, 12, 260], { at: [0, y, -130] }, 'arm'), block([8, 60, 50], { at: [-10, y, -255] }, 'pad')], {
        motions: [motion([swing(24)])],
      });
    const begun = performance.now();
    const { code, report } = check(sceneOf([pedal('brake', 0), pedal('clutch', -75)]));
    const f = findingOf(report, 'brake', 'clutch', ['brake', 'clutch']);
    expect([code, f.verdict]).toEqual([0, 'clears']);
    expect(f.gap).toBeCloseTo(15, 6);
    expect(f.gapAtLeast).toBeGreaterThan(15 - 0.05);
    // starting Node and all: travel bounds alone would need millions of looks
    expect(performance.now() - begun).toBeLessThan(8000);
  });

  test('a mesh in inches: a block of 2 inches is 50.8 mm', () => {
    const parts = [
      part('inch', [mesh('sub/inch.stl', {}, 25.4)]),
      part('wall', [block([10, 200, 200], { at: [55, 0, 0] })]),
    ];
    const { code, report } = check(sceneOf(parts), { 'sub/inch.stl': binaryStl(boxSoup(2, 2, 2)) });
    // 50 less 25.4
    expect([code, report.findings[0]!.verdict]).toEqual([0, 'clears']);
    expect(report.findings[0]!.gap).toBeCloseTo(24.6, 5);
  });

  test('a service motion in two steps: up first, then out, past a brace', () => {
    const out = motion([slide([0, 0, 1], 30), slide([1, 0, 0], 200)], { id: 'draw-out', use: 'service' });
    const brace = part('brace', [block([10, 100, 40], { at: [60, 0, 0] })]);
    const { report } = check(sceneOf([part('cylinder', [block([40, 40, 10])], { motions: [out] }), brace]));
    const f = findingOf(report, 'brace', 'cylinder', ['cylinder']);
    // the block's underside passes 25 - 20 = 5 above the brace
    expect(f.gap).toBeCloseTo(5, 5);
    expect(f.at.positions[0]).toBeGreaterThan(0.5);
  });
});

describe('bad input: exit 2, one line that names file, place and reason, nothing written', () => {
  const box = block([10, 10, 10]);
  const one = (more: Json, rest: Json = {}): Json => sceneOf([part('a', [box], more)], rest);
  const shaped = (shape: Json): Json => sceneOf([part('a', [{ id: 's', shape }])]);
  const meshed = (name: string, scale = 1): Json => sceneOf([part('a', [mesh(name, {}, scale)])]);
  const stroke = (step: Json): Json => one({ motions: [motion([step])] });
  const joined = (x: Json, y: Json): Json => one({}, { rules: { pairs: [{ between: [x, y], joint: {} }] } });
  const good = binaryStl(boxSoup(2, 2, 2));

  test.each<[string, Json | string, Files, RegExp]>([
    ['not JSON', '{"format":', {}, /./],
    ['another kind of document', { format: 'other' }, {}, /: format: /],
    ['a newer version', { ...apart(), version: 99 }, {}, /: version: /],
    ['no name', { ...apart(), name: undefined }, {}, /: name: is missing/],
    ['an unknown key', { ...apart(), colour: 'red' }, {}, /: colour: is not known/],
    ['an unknown key inside', one({ mass: 3 }), {}, /: components\[0\]\.mass: is not known/],
    [
      'a size of 0',
      shaped({ kind: 'box', size: [1, 0, 1] }),
      {},
      /components\[0\]\.solids\[0\]\.shape\.size\[1\]: must be greater than 0/,
    ],
    [
      'a size that is text',
      shaped({ kind: 'box', size: [1, '2', 1] }),
      {},
      /shape\.size\[1\]: must be a finite number/,
    ],
    [
      'a size that is no number',
      JSON.stringify(shaped({ kind: 'box', size: [1, 2, 77] })).replace('77', '1e999'),
      {},
      /shape\.size\[2\]: /,
    ],
    ['an unknown shape', shaped({ kind: 'cone' }), {}, /shape\.kind: must be one of/],
    [
      'a negative diameter',
      shaped({ kind: 'cylinder', diameter: -1, length: 2 }),
      {},
      /shape\.diameter: must be greater than 0/,
    ],
    ['a scale of 0', meshed('a.stl', 0), { 'a.stl': good }, /shape\.scale: must be greater than 0/],
    ['a negative gap', one({}, { rules: { gap: -1 } }), {}, /: rules\.gap: /],
    ['a touch of 0', one({}, { rules: { touch: 0 } }), {}, /: rules\.touch: /],
    ['too fine an accuracy', one({}, { accuracy: 0.00001 }), {}, /: accuracy: /],
    ['a negative tolerance', one({ tolerance: -2 }), {}, /components\[0\]\.tolerance: /],
    ['a zero axis', stroke(swing(1, { axis: [0, 0, 0] })), {}, /motions\[0\]\.steps\[0\]\.axis: /],
    ['a zero direction', stroke(slide([0, 0, 0], 1)), {}, /motions\[0\]\.steps\[0\]\.along: /],
    ['a motion without steps', one({ motions: [motion([])] }), {}, /motions\[0\]\.steps: /],
    ['no solids', sceneOf([part('a', [])]), {}, /components\[0\]\.solids: /],
    [
      'a motion of an unknown solid',
      one({ motions: [motion([swing(1)], { solids: ['x'] })] }),
      {},
      /motions\[0\]\.solids\[0\]: /,
    ],
    [
      'a solid in two operating motions',
      one({ motions: [motion([swing(1)]), motion([swing(2)], { id: 'two' })] }),
      {},
      /motions\[1\]: /,
    ],
    ['from in a later step', one({ motions: [motion([swing(1), swing(2, { from: 1 })])] }), {}, /steps\[1\]\.from: /],
    ['too long a slide', stroke(slide([1, 0, 0], 20_001)), {}, /steps\[0\]\.to: /],
    ['too far a swing', stroke(swing(3601)), {}, /steps\[0\]\.to: /],
    ['the same id twice', sceneOf([part('a', [box]), part('a', [box])]), {}, /components\[1\]\.id: /],
    ['an id with capitals', sceneOf([part('A', [box])]), {}, /components\[0\]\.id: /],
    ['an unknown group', one({ group: 'g' }), {}, /components\[0\]\.group: /],
    ['an unknown category', one({ category: 'spoiler' }), {}, /components\[0\]\.category: /],
    [
      'a joint with a category',
      joined({ component: 'a' }, { category: 'pedal' }),
      {},
      /rules\.pairs\[0\]\.between\[1\]: /,
    ],
    [
      'a rule for an unknown part',
      joined({ component: 'a' }, { component: 'z' }),
      {},
      /rules\.pairs\[0\]\.between\[1\]\.component: /,
    ],
    ['farther than 100 m', one({ pose: { at: [99_999, 0, 0] } }), {}, /components\[0\]\.solids\[0\]\.shape: /],
    ['an absolute mesh path', meshed('/etc/hostname'), {}, /shape\.mesh: /],
    ['a mesh path that leaves the folder', meshed('../a.stl'), {}, /shape\.mesh: /],
    ['a missing mesh', meshed('none.stl'), {}, /shape\.mesh: none\.stl: the file does not exist/],
    ['an empty mesh', meshed('a.stl'), { 'a.stl': '' }, /shape\.mesh: a\.stl: the file is empty/],
    ['a truncated mesh', meshed('a.stl'), { 'a.stl': good.subarray(0, 600) }, /shape\.mesh: a\.stl: .*truncated/],
    [
      'a mesh without endsolid',
      meshed('a.stl'),
      { 'a.stl': asciiStl(boxSoup(1, 1, 1)).replace('endsolid', '') },
      /shape\.mesh: a\.stl: /,
    ],
    [
      'a mesh of another format',
      meshed('a.stl'),
      { 'a.stl': textBytes('ply\nformat ascii 1.0\n'.repeat(9)) },
      /shape\.mesh: a\.stl: .*not STL/,
    ],
    [
      'a coordinate that is no number',
      meshed('a.stl'),
      { 'a.stl': binaryStl([NaN, ...boxSoup(1, 1, 1).slice(1)]) },
      /shape\.mesh: a\.stl: .*not a finite number/,
    ],
    [
      'a mesh with no triangle left',
      meshed('a.stl'),
      { 'a.stl': binaryStl([1, 1, 1, 1, 1, 1, 1, 1, 1]) },
      /shape\.mesh: a\.stl: .*no triangle is left/,
    ],
    ['a mesh that its scale takes beyond 100 m', meshed('a.stl', 1e6), { 'a.stl': good }, /solids\[0\]\.shape: /],
    ['a mesh that is a folder', meshed('sub'), { 'sub/x': 'x' }, /shape\.mesh: sub: this is a folder/],
  ])('%s', (_, document, files, line) => {
    const text = typeof document === 'string' ? document : JSON.stringify(document);
    write({ 'scene.json': text, 'kept.json': 'as it was', ...files });
    const before = readdirSync(folder).sort();
    for (const out of [[], ['--out', 'new.json'], ['--out', 'kept.json']]) {
      const { code, out: shown, err } = run('scene.json', ...out);
      expect([code, shown]).toEqual([2, '']);
      expect(err).toMatch(/^scene\.json: [^\n]+\n$/);
      expect(err).toMatch(line);
      if (out.length === 0 && files !== undefined && Object.keys(files).length === 0) break;
    }
    expect(readFileSync(path.join(folder, 'kept.json'), 'utf8')).toBe('as it was');
    expect(readdirSync(folder).sort()).toEqual(before);
  });

  test.each<[string, readonly string[], RegExp]>([
    ['no scene', [], /^usage: /],
    ['two scenes', ['a.json', 'b.json'], /^one scene at a time/],
    ['an unknown option', ['scene.json', '--fast'], /^unknown option --fast/],
    ['--out without a name', ['scene.json', '--out'], /^--out needs a file name/],
    ['a scene that is not there', ['none.json'], /^none\.json: the file does not exist\n$/],
    ['a scene that is a folder', ['.'], /^\.: this is a folder/],
    [
      'a report into a folder that is not there',
      ['scene.json', '--out', 'no/where.json'],
      /^no\/where\.json: its folder does not exist\n$/,
    ],
  ])('%s', (_, args, line) => {
    write({ 'scene.json': JSON.stringify(apart()) });
    const { code, out, err } = run(...args);
    expect([code, out]).toEqual([2, '']);
    expect(err).toMatch(line);
    expect(err.match(/\n/g)).toHaveLength(1);
  });

  test('a document beyond 4 MB, and a link that leads out of the folder', () => {
    write({ 'scene.json': `${JSON.stringify(apart())}${' '.repeat(4 * 1024 * 1024)}` });
    expect(run('scene.json')).toMatchObject({
      code: 2,
      out: '',
      err: expect.stringMatching(/^scene\.json: the document has \d+ bytes[^\n]*\n$/) as string,
    });
    const outside = path.join(folder, '..', `${path.basename(folder)}.stl`);
    writeFileSync(outside, good);
    symlinkSync(outside, path.join(folder, 'link.stl'));
    write({ 'scene.json': JSON.stringify(meshed('link.stl')) });
    const { code, err } = run('scene.json');
    rmSync(outside);
    expect([code, err]).toEqual([2, expect.stringMatching(/link\.stl: the mesh lies outside/)]);
    expect(existsSync(path.join(folder, 'new.json'))).toBe(false);
  });
});
