import { describe, expect, it } from 'vitest';
import { loadScene, worldPose, type Scene } from '#shared/scene';
import {
  labelOf,
  setCoordinate,
  setTurnInCar,
  shift,
  turn,
  turnInCar,
  zeroPoint,
} from '../../../../src/features/bench/edits';
import {
  clamp,
  duplicate,
  movedNow,
  nudge,
  partGroup,
  remove,
  sayRemoved,
  takeOutOfGroup,
  turnBy,
} from '../../../../src/features/bench/part-deeds';
import { clickPart } from '../../../../src/features/bench/click-part';
import { box, smallScene, testBench } from './support';

const at = (scene: Scene, id: string): number[] => {
  const m = worldPose(
    scene,
    scene.components.find((c) => c.id === id)!,
  );
  return [m[3]!, m[7]!, m[11]!];
};

describe('selecting', () => {
  it('takes a part, then its group, then the part again', () => {
    const bench = testBench();
    clickPart(bench, 'brake-pedal', false);
    expect(movedNow(bench)).toEqual({ parts: ['brake-pedal'], group: null });
    clickPart(bench, 'brake-pedal', false);
    expect(movedNow(bench).group).toBe('pedal-box');
    clickPart(bench, 'brake-pedal', false);
    expect(movedNow(bench).group).toBeNull();
  });

  it('adds with Shift and takes away again', () => {
    const bench = testBench();
    clickPart(bench, 'wiper', false);
    clickPart(bench, 'column', true);
    expect(bench.session.getState().selected).toEqual(['wiper', 'column']);
    clickPart(bench, 'wiper', true);
    expect(bench.session.getState().selected).toEqual(['column']);
    clickPart(bench, null, true);
    expect(bench.session.getState().selected).toEqual(['column']);
    clickPart(bench, null, false);
    expect(bench.session.getState().selected).toEqual([]);
  });

  it('means no group where parts of several are selected', () => {
    const bench = testBench();
    bench.session.getState().select(['wiper', 'brake-pedal']);
    bench.session.getState().set({ reach: 'group' });
    expect(movedNow(bench)).toEqual({ parts: ['wiper', 'brake-pedal'], group: null });
  });
});

describe('moving', () => {
  it('shifts a part that is clamped in a turned group along the car, not along the group', () => {
    const start = smallScene();
    const scene: Scene = {
      ...start,
      groups: [{ ...start.groups[0]!, pose: { at: [100, 400, 600], turn: [20, -9, 35] } }],
    };
    const before = at(scene, 'brake-pedal');
    const after = at(shift(scene, { parts: ['brake-pedal'], group: null }, [10, -4, 3]), 'brake-pedal');
    [10, -4, 3].forEach((by, k) => expect(after[k]! - before[k]!).toBeCloseTo(by, 4));
  });

  it('moves a group with all that is clamped in it', () => {
    const scene = shift(smallScene(), { parts: ['brake-pedal'], group: 'pedal-box' }, [0, 25, 0]);
    expect(at(scene, 'clutch-pedal')[1]).toBeCloseTo(365);
    expect(scene.components).toEqual(smallScene().components);
  });

  it('nudges under a name that undo shows, and not at all for those who only look', () => {
    const bench = testBench();
    bench.session.getState().select(['wiper']);
    nudge(bench, [0, 1.5875, 0]);
    expect(bench.open.getState().undoLabel).toBe('Move Wiper');
    expect(at(bench.open.getState().scene, 'wiper')[1]).toBeCloseTo(1.5875);
    const reader = testBench({ canEdit: false });
    reader.session.getState().select(['wiper']);
    nudge(reader, [0, 1, 0]);
    expect(reader.open.getState().undoLabel).toBeNull();
  });

  it('never leaves a document that does not load', () => {
    const bench = testBench();
    bench.session.getState().select(['wiper']);
    nudge(bench, [0, 200_000, 0]);
    expect(bench.open.getState().scene).toEqual(smallScene());
  });

  it('turns about a point in the car and keeps the zero point where only angles are set', () => {
    const moved = { parts: ['wiper'], group: null };
    const scene = turn(smallScene(), moved, [0, 0, 700], [0, 0, 1], 90);
    const [x, y] = at(scene, 'wiper');
    expect(x).toBeCloseTo(0);
    expect(y).toBeCloseTo(-200);
    const inGroup = { parts: ['brake-pedal'], group: null };
    const angled = setTurnInCar(smallScene(), inGroup, [0, 0, 30]);
    expect(turnInCar(angled, inGroup)[2]).toBeCloseTo(30);
    zeroPoint(angled, inGroup).forEach((v, k) => expect(v).toBeCloseTo(zeroPoint(smallScene(), inGroup)[k]!));
  });

  it('turns in place by key', () => {
    const bench = testBench();
    bench.session.getState().select(['wiper']);
    turnBy(bench, [0, 0, 1], -1);
    expect(turnInCar(bench.open.getState().scene, { parts: ['wiper'], group: null })[2]).toBeCloseTo(-1);
    expect(bench.open.getState().undoLabel).toBe('Turn Wiper');
  });

  it('sets one coordinate and leaves the others', () => {
    const scene = setCoordinate(smallScene(), { parts: ['wiper'], group: null }, 0, -175);
    expect(at(scene, 'wiper')).toEqual([-175, 0, 700]);
  });

  it('names what moves', () => {
    const scene = smallScene();
    expect(labelOf('Move', scene, { parts: ['wiper', 'column'], group: null })).toBe('Move 2 parts');
    expect(labelOf('Turn', scene, { parts: ['brake-pedal'], group: 'pedal-box' })).toBe('Turn Pedal box');
  });
});

describe('deeds on parts', () => {
  it('clamps parts together without moving them, and parts them again', () => {
    const bench = testBench();
    const before = bench.open.getState().scene;
    bench.session.getState().select(['wiper', 'column']);
    clamp(bench);
    const { scene } = bench.open.getState();
    const group = scene.groups.find((g) => g.id !== 'pedal-box')!;
    expect(scene.components.filter((c) => c.group === group.id).map((c) => c.id)).toEqual(['column', 'wiper']);
    for (const id of ['wiper', 'column']) at(scene, id).forEach((v, k) => expect(v).toBeCloseTo(at(before, id)[k]!));
    expect(loadScene(scene).ok).toBe(true);
    partGroup(bench);
    expect(bench.open.getState().scene.groups.map((g) => g.id)).toEqual(['pedal-box']);
    at(bench.open.getState().scene, 'wiper').forEach((v, k) => expect(v).toBeCloseTo(at(before, 'wiper')[k]!));
  });

  it('takes one part out of its group where it stands', () => {
    const bench = testBench();
    const before = at(bench.open.getState().scene, 'clutch-pedal');
    bench.session.getState().select(['clutch-pedal']);
    takeOutOfGroup(bench);
    const { scene } = bench.open.getState();
    expect(scene.components.find((c) => c.id === 'clutch-pedal')?.group).toBeUndefined();
    at(scene, 'clutch-pedal').forEach((v, k) => expect(v).toBeCloseTo(before[k]!));
  });

  it('copies beside the original and selects the copy', () => {
    const bench = testBench();
    bench.session.getState().select(['wiper']);
    duplicate(bench);
    const { selected } = bench.session.getState();
    expect(selected).toHaveLength(1);
    expect(selected[0]).not.toBe('wiper');
    expect(at(bench.open.getState().scene, selected[0]!)[1]).toBeCloseTo(50);
    expect(bench.open.getState().undoLabel).toBe('Copy Wiper');
  });

  it('deletes a whole group with its rules, and brings it back', () => {
    const bench = testBench();
    clickPart(bench, 'brake-pedal', false);
    clickPart(bench, 'brake-pedal', false);
    const removed = remove(bench)!;
    expect(sayRemoved(removed.names)).toBe('Deleted 2 parts.');
    expect(bench.open.getState().scene.groups).toEqual([]);
    expect(loadScene(bench.open.getState().scene).ok).toBe(true);
    removed.undo();
    expect(bench.open.getState().scene).toEqual(smallScene());
  });

  it('does not take back something else when its undo comes too late', () => {
    const bench = testBench();
    bench.session.getState().select(['wiper']);
    const removed = remove(bench)!;
    bench.session.getState().select(['column']);
    nudge(bench, [0, 0, 5]);
    removed.undo();
    expect(at(bench.open.getState().scene, 'column')[2]).toBeCloseTo(605);
    expect(bench.open.getState().scene.components.some((c) => c.id === 'wiper')).toBe(false);
  });

  it('deletes nothing where nothing is selected', () => {
    expect(remove(testBench())).toBeNull();
    expect(
      remove(testBench({ scene: { ...smallScene(), components: [box('a', 'other', [1, 1, 1], [0, 0, 0])] } })),
    ).toBeNull();
  });
});
