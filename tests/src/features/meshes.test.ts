// @vitest-environment happy-dom
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { MeshLine } from '#shared/api';
import { drawMesh } from '../../../src/features/meshes/draw-mesh';
import { healthWords } from '../../../src/features/meshes/mesh-health';
import { extentOf } from '../../../src/features/meshes/mesh-size';
import { MOST_BYTES, useUploads } from '../../../src/features/meshes/upload-store';

const TEAM = '0b8e7c36-6f2c-4c58-9d0c-1f3c2f1f7a11';
const mesh: MeshLine = {
  teamId: TEAM,
  sha256: 'a'.repeat(64),
  name: 'liner.stl',
  bytes: 84,
  form: 'binary',
  triangles: 12,
  low: [-1, 0, 2],
  high: [1, 4, 5],
  kind: 'body',
  badEdges: 0,
  shells: 1,
  dropped: 0,
  unit: null,
  guess: 'in',
  uploadedBy: 'Odile Marchetti',
  createdAt: '2026-12-01T10:00:00.000Z',
};

describe('the health of a mesh', () => {
  it('is said in plain words', () => {
    expect(healthWords(mesh)).toEqual({ is: 'closed shape', notes: [] });
    expect(healthWords({ ...mesh, kind: 'sheet', badEdges: 1, shells: 3, dropped: 2 })).toEqual({
      is: 'open surface',
      notes: [
        '1 torn or folded edge: only its surface is checked',
        '3 pieces in one file',
        '2 useless triangles left out',
      ],
    });
  });

  it('its size follows the unit', () => {
    expect(extentOf(mesh, 'mm')).toEqual([2, 4, 3]);
    expect(extentOf(mesh, 'in')).toEqual([50.8, 101.6, 76.19999999999999]);
  });
});

describe('the picture of a mesh', () => {
  it('fills far triangles before near ones, inside the picture', () => {
    const corners: (readonly [number, number])[] = [];
    const fills: number[] = [];
    const context = {
      fillRect: () => undefined,
      beginPath: () => undefined,
      moveTo: (x: number, y: number) => corners.push([x, y]),
      lineTo: (x: number, y: number) => corners.push([x, y]),
      closePath: () => undefined,
      fill: () => fills.push(corners.length / 3),
      stroke: () => undefined,
    } as unknown as CanvasRenderingContext2D;
    // the eye stands at front left above; x is rearward, so the second triangle is the nearer one
    const positions = Float32Array.from([100, 0, 0, 100, 10, 0, 100, 0, 10, 0, 0, 0, 0, 30, 0, 0, 0, 30]);
    drawMesh(context, { positions, index: Uint32Array.from([3, 4, 5, 0, 1, 2]) }, 176, 112, {
      ground: '#000',
      face: [200, 200, 200],
    });
    expect(fills).toHaveLength(2);
    for (const [x, y] of corners) {
      expect(x).toBeGreaterThanOrEqual(0);
      expect(x).toBeLessThanOrEqual(176);
      expect(y).toBeGreaterThanOrEqual(0);
      expect(y).toBeLessThanOrEqual(112);
    }
    const width = (k: number): number => {
      const xs = corners.slice(3 * k, 3 * k + 3).map(([x]) => x);
      return Math.max(...xs) - Math.min(...xs);
    };
    // drawn first is the far, small one
    expect(width(0)).toBeLessThan(width(1));
  });
});

/** Stands in for the browser's request: what a test lets happen, happens. */
class StubRequest extends EventTarget {
  static readonly sent: StubRequest[] = [];
  readonly upload = new EventTarget();
  status = 0;
  responseText = '';
  open(): void {
    this.status = 0;
  }
  send(): void {
    StubRequest.sent.push(this);
  }
  abort(): void {
    this.dispatchEvent(new Event('abort'));
  }
  answer(status: number, body: unknown): void {
    this.status = status;
    this.responseText = JSON.stringify(body);
    this.dispatchEvent(new Event('load'));
  }
}

const settle = () => new Promise((resolve) => setTimeout(resolve, 0));
const file = (name: string, size = 10): File => {
  const made = new File(['x'], name);
  Object.defineProperty(made, 'size', { value: size });
  return made;
};

describe('uploads', () => {
  beforeEach(() => vi.stubGlobal('XMLHttpRequest', StubRequest));
  afterEach(() => {
    vi.unstubAllGlobals();
    StubRequest.sent.length = 0;
    for (const { id } of useUploads.getState().uploads) useUploads.getState().drop(id);
  });

  it('go up one after another, and are forgotten when they are taken', async () => {
    const taken = vi.fn();
    useUploads.getState().add(TEAM, [file('a.stl'), file('b.stl')], taken);
    await settle();
    expect(useUploads.getState().uploads.map((u) => u.state)).toEqual(['sending', 'waiting']);
    StubRequest.sent[0]!.answer(201, { mesh, isNew: true });
    await settle();
    expect(taken).toHaveBeenCalledWith(mesh, true);
    expect(useUploads.getState().uploads.map((u) => [u.name, u.state])).toEqual([['b.stl', 'sending']]);
    StubRequest.sent[1]!.answer(201, { mesh, isNew: false });
    await settle();
    expect(useUploads.getState().uploads).toEqual([]);
  });

  it('show how far they are, and that the server reads', async () => {
    useUploads.getState().add(TEAM, [file('a.stl', 1000)], vi.fn());
    await settle();
    const progress = Object.assign(new Event('progress'), { loaded: 600, total: 1200 });
    StubRequest.sent[0]!.upload.dispatchEvent(progress);
    expect(useUploads.getState().uploads[0]).toMatchObject({ sent: 500, state: 'sending' });
    StubRequest.sent[0]!.upload.dispatchEvent(new Event('load'));
    expect(useUploads.getState().uploads[0]).toMatchObject({ state: 'reading' });
    StubRequest.sent[0]!.answer(201, { mesh, isNew: true });
    await settle();
  });

  it('that are refused stay with the reason, and the next one goes on', async () => {
    useUploads.getState().add(TEAM, [file('bad.stl'), file('good.stl')], vi.fn());
    await settle();
    StubRequest.sent[0]!.answer(422, {
      type: 'x',
      title: 'The file was not taken.',
      status: 422,
      code: 'mesh/refused',
      detail: 'bad.stl was not taken: the file is empty.',
    });
    await settle();
    expect(useUploads.getState().uploads[0]).toMatchObject({
      state: 'failed',
      problem: 'bad.stl was not taken: the file is empty.',
    });
    expect(StubRequest.sent).toHaveLength(2);
    StubRequest.sent[1]!.answer(201, { mesh, isNew: true });
    await settle();
  });

  it('can be cancelled, under way or waiting', async () => {
    const taken = vi.fn();
    useUploads.getState().add(TEAM, [file('a.stl'), file('b.stl')], taken);
    await settle();
    const [first, second] = useUploads.getState().uploads;
    useUploads.getState().drop(second!.id);
    useUploads.getState().drop(first!.id);
    await settle();
    expect(useUploads.getState().uploads).toEqual([]);
    expect(StubRequest.sent).toHaveLength(1);
    expect(taken).not.toHaveBeenCalled();
  });

  it('too large are refused before a byte goes up', async () => {
    useUploads.getState().add(TEAM, [file('huge.stl', MOST_BYTES + 1)], vi.fn());
    await settle();
    expect(useUploads.getState().uploads[0]).toMatchObject({ state: 'failed' });
    expect(useUploads.getState().uploads[0]!.problem).toMatch(/256 MB/);
    expect(StubRequest.sent).toHaveLength(0);
  });
});
