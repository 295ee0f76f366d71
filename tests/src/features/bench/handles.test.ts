// @vitest-environment happy-dom
import { describe, expect, it } from 'vitest';
import { Matrix4, PerspectiveCamera } from 'three';
import { catchesAlong, snapTravel } from '../../../../src/features/bench/handles/catches';
import { componentBox, sceneBox } from '../../../../src/features/bench/viewport/extent';
import { project, type Frame } from '../../../../src/features/bench/viewport/frame';
import { alongAxis, angleOn, onPlane, planeAxes, rayAt } from '../../../../src/features/bench/viewport/ray';
import { dot } from '../../../../src/features/bench/viewport/vectors';
import { NO_MESHES, smallScene } from './support';

function frameFrom(eye: readonly [number, number, number]): Frame {
  const camera = new PerspectiveCamera(32, 1.5, 10, 20_000);
  camera.up.set(0, 0, 1);
  camera.position.set(...eye);
  camera.lookAt(0, 0, 500);
  camera.updateMatrixWorld();
  return {
    width: 900,
    height: 600,
    matrix: new Matrix4().multiplyMatrices(camera.projectionMatrix, camera.matrixWorldInverse).toArray(),
    isSquare: false,
    millimetresPerPixel: null,
    eye,
  };
}

describe('a ray from the screen', () => {
  const frame = frameFrom([-1800, 700, 1400]);

  it('goes through the point that shows there', () => {
    const point = [120, -80, 620] as const;
    const at = project(frame, point)!;
    const ray = rayAt(frame, at.x, at.y);
    const away = point.map((x, k) => x - ray.from[k]!) as [number, number, number];
    const along = dot(away, ray.along);
    const miss = away.map((x, k) => x - ray.along[k]! * along);
    expect(Math.hypot(...miss)).toBeLessThan(0.05);
  });

  it('says nothing of what is behind the eye', () => {
    expect(project(frame, [-4000, 1500, 2500])).toBeNull();
  });

  it('moves an arrow exactly as far as the hand goes along it', () => {
    const foot = [0, 0, 500] as const;
    const tip = project(frame, [0, 140, 500])!;
    expect(alongAxis(rayAt(frame, tip.x, tip.y), foot, [0, 1, 0])).toBeCloseTo(140, 1);
  });

  it('gives no answer for an arrow that points at the eye', () => {
    const ray = { from: [0, 0, 0], along: [1, 0, 0] } as const;
    expect(alongAxis(ray, [5, 5, 5], [1, 0, 0])).toBeNull();
    expect(onPlane(ray, [5, 5, 5], [0, 1, 0])).toBeNull();
  });

  it('turns by the right-hand rule about each axis', () => {
    for (const axis of [
      [1, 0, 0],
      [0, 1, 0],
      [0, 0, 1],
    ] as const) {
      const [u, v] = planeAxes(axis);
      const at = [10, 20, 30] as const;
      const beside = (w: readonly number[]) => at.map((x, k) => x + 5 * w[k]!) as [number, number, number];
      expect(angleOn(beside(u), at, [u, v])).toBeCloseTo(0);
      expect(angleOn(beside(v), at, [u, v])).toBeCloseTo(90);
    }
  });
});

describe('catching', () => {
  const scene = smallScene();
  const wiper = scene.components.find((c) => c.id === 'wiper')!;
  const wiperBox = componentBox(scene, wiper, NO_MESHES)!;
  const moving = new Set(['wiper']);

  it('offers lasers for the zero point and faces of what stands in the way', () => {
    const across = catchesAlong(scene, NO_MESHES, 1, [-200, 0, 700], wiperBox, moving);
    expect(across).toContainEqual({ travel: 300, words: 'on Column line' });
    const along = catchesAlong(scene, NO_MESHES, 0, [-200, 0, 700], wiperBox, moving);
    // the wiper's rear face at -150 meets the firewall's front at -1
    expect(along).toContainEqual({ travel: 149, words: 'flush with Firewall' });
    expect(along.some((c) => c.words === 'flush with Wiper')).toBe(false);
    expect(along.some((c) => c.words === 'flush with Floor')).toBe(false);
  });

  it('holds what is near, the nearest first, and lets go beyond its reach', () => {
    const catches = [
      { travel: 50, words: 'on A' },
      { travel: 54, words: 'on B' },
    ];
    const options = { mode: 'step', step: 10, reach: 5 } as const;
    expect(snapTravel(53, 0, catches, options)).toEqual({ travel: 54, words: 'on B' });
    expect(snapTravel(51, 0, catches, options)).toEqual({ travel: 50, words: 'on A' });
    expect(snapTravel(43, 0, catches, options)).toEqual({ travel: 40, words: null });
  });

  it('goes by steps that count from the datum, so that readings come out round', () => {
    const travel = snapTravel(11, 3.4, [], { mode: 'step', step: 5, reach: 1 }).travel;
    expect(3.4 + travel).toBeCloseTo(15);
    expect(3.4 + snapTravel(10, 3.4, [], { mode: 'fine', step: 5, reach: 1 }).travel).toBeCloseTo(13.75);
  });

  it('catches on nothing and rounds nothing when the hand goes free', () => {
    const free = { mode: 'free', step: 10, reach: 100 } as const;
    expect(snapTravel(49.3, 0, [{ travel: 50, words: 'on A' }], free)).toEqual({ travel: 49.3, words: null });
  });

  it('takes a whole group by its box', () => {
    const box = sceneBox(scene, NO_MESHES, new Set(['brake-pedal', 'clutch-pedal']))!;
    expect(box.low[1]).toBeCloseTo(334);
    expect(box.high[1]).toBeCloseTo(446);
  });
});
