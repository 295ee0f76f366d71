// Small scenes and edits for the tests of the open document.
import fc from 'fast-check';
import {
  addComponent,
  addLaser,
  clampTogether,
  duplicateComponents,
  loadScene,
  moveToGroup,
  newScene,
  partAgain,
  patchHead,
  patchRules,
  removeComponents,
  removeLaser,
  removeRule,
  renameComponent,
  reorderComponents,
  setComponentPose,
  setGroupPose,
  setJoint,
  setPairGap,
  setTolerance,
  type Component,
  type Scene,
} from '#shared/scene';

export const box = (id: string, x: number, more: Partial<Component> = {}): Component => ({
  id,
  name: `Box ${id}`,
  category: 'other',
  pose: { at: [x, 0, 0] },
  tolerance: 0,
  solids: [{ id: 'body', shape: { kind: 'box', size: [10, 10, 10] } }],
  motions: [],
  holes: [],
  ...more,
});

/** Three boxes in a row, 20 mm apart, and a rule. */
export function row(): Scene {
  const empty = newScene('Row', 'mm');
  const scene = { ...empty, components: [box('a', 0), box('b', 20), box('c', 40)] };
  return setPairGap(scene, { component: 'a' }, { component: 'b' }, 5);
}

export const move = (id: string, x: number) => (scene: Scene) => setComponentPose(scene, id, { at: [x, 0, 0] });
export const xOf = (scene: Scene, id: string): number | undefined =>
  scene.components.find((c) => c.id === id)?.pose.at?.[0];

export type Change = (scene: Scene) => Scene;

/** Changes nothing where it would leave a document that does not load, as the named edits do. */
export const sound =
  (change: Change): Change =>
  (scene) => {
    const next = change(scene);
    return loadScene(next).ok ? next : scene;
  };

const whole = fc.integer({ min: -500, max: 500 });
const pick = fc.nat(50);
const idAt = (scene: Scene, n: number): string => scene.components[n % Math.max(1, scene.components.length)]?.id ?? '';

/** Edits of every kind; which part they are for depends on the scene they meet. */
export const arbitraryChange: fc.Arbitrary<Change> = fc
  .oneof(
    fc.tuple(pick, whole).map(
      ([n, x]): Change =>
        (s) =>
          move(idAt(s, n), x)(s),
    ),
    fc.tuple(pick, whole).map(
      ([n, x]): Change =>
        (s) =>
          setTolerance(s, idAt(s, n), Math.abs(x) / 10),
    ),
    pick.map(
      (n): Change =>
        (s) =>
          removeComponents(s, [idAt(s, n)]),
    ),
    pick.map(
      (n): Change =>
        (s) =>
          renameComponent(s, idAt(s, n), `Part ${n}`),
    ),
    pick.map(
      (n): Change =>
        (s) =>
          duplicateComponents(s, [idAt(s, n)], [0, 50, 0]).scene,
    ),
    fc.tuple(pick, whole).map(([n, x]): Change => (s) => {
      const id = `new-${n}`;
      return s.components.some((c) => c.id === id) ? s : addComponent(s, box(id, x));
    }),
    fc.array(pick, { maxLength: 6 }).map((ns): Change => (s) => {
      const ids = s.components.map((c) => c.id);
      for (const [i, n] of ns.entries()) if (ids.length > 0) ids.push(...ids.splice((n + i) % ids.length, 1));
      return reorderComponents(s, ids);
    }),
    fc.tuple(pick, pick).map(([n, m]): Change => (s) => {
      const ids = [...new Set([idAt(s, n), idAt(s, m)])];
      return ids.length < 2 ? s : clampTogether(s, ids, `Group ${n}`, [n, 0, 0]).scene;
    }),
    pick.map(
      (n): Change =>
        (s) =>
          partAgain(s, s.groups[n % Math.max(1, s.groups.length)]?.id ?? ''),
    ),
    fc.tuple(pick, whole).map(([n, x]): Change => (s) => {
      const group = s.groups[n % Math.max(1, s.groups.length)];
      return group === undefined ? s : setGroupPose(s, group.id, { at: [x, 0, 0] });
    }),
    pick.map(
      (n): Change =>
        (s) =>
          moveToGroup(s, idAt(s, n), s.groups[0]?.id),
    ),
    fc.tuple(pick, pick, pick).map(([n, m, gap]): Change => (s) => {
      const [a, b] = [idAt(s, n), idAt(s, m)];
      return a === b ? s : setPairGap(s, { component: a }, { component: b }, gap);
    }),
    fc.tuple(pick, pick).map(([n, m]): Change => (s) => {
      const [a, b] = [idAt(s, n), idAt(s, m)];
      return a === b ? s : setJoint(s, a, b, 1);
    }),
    pick.map(
      (n): Change =>
        (s) =>
          removeRule(s, n % Math.max(1, s.rules.pairs.length)),
    ),
    pick.map(
      (n): Change =>
        (s) =>
          patchHead(s, { name: `Scene ${n}` }),
    ),
    pick.map(
      (n): Change =>
        (s) =>
          patchRules(s, { gap: n }),
    ),
    pick.map((n): Change => (s) => {
      const id = `laser-${n}`;
      return s.lasers.some((l) => l.id === id)
        ? removeLaser(s, id)
        : addLaser(s, { id, name: id, point: [n, 0, 0], normal: [0, 1, 0] });
    }),
  )
  .map(sound);
