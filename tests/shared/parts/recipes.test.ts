// All recipes by the same rules: what they build loads, at any measurement that they allow; what they cannot build is refused
// with a sentence that names the measurement.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  newPart,
  rebuildPart,
  RECIPES,
  STAND_IN_NOTE,
  type NumberParam,
  type Param,
  type PartRecipe,
} from '#shared/parts';
import { loadScene, newScene, type Component } from '#shared/scene';

const SEED = 20_260;

function loads(component: Component): string {
  const scene = { ...newScene('Recipes', 'mm'), components: [component] };
  const loaded = loadScene(JSON.parse(JSON.stringify(scene)));
  return loaded.ok ? 'loads' : `${loaded.refusals[0].path}: ${loaded.refusals[0].reason}`;
}

const isNumber = (p: Param): p is NumberParam => p.unit !== 'choice';

const anyValue = (p: Param): fc.Arbitrary<number | string> => {
  if (p.unit === 'choice') return fc.constantFrom(...p.choices.map((c) => c.value));
  if (p.unit === 'count') return fc.integer({ min: p.min, max: p.max });
  // evenly over the range, both ends among them
  return fc.integer({ min: 0, max: 2000 }).map((k) => p.min + ((p.max - p.min) * k) / 2000);
};
const anyParams = (recipe: PartRecipe): fc.Arbitrary<Record<string, number | string>> =>
  fc.record(Object.fromEntries(recipe.params.map((p) => [p.key, anyValue(p)])));

test('there are more than eight, each with a kind and a name of its own', () => {
  expect(RECIPES.length).toBeGreaterThanOrEqual(8);
  expect(new Set(RECIPES.map((r) => r.kind)).size).toBe(RECIPES.length);
  expect(new Set(RECIPES.map((r) => r.name)).size).toBe(RECIPES.length);
});

describe.each(RECIPES.map((r) => [r.name, r] as const))('%s', (_name, recipe) => {
  const build = (params: Readonly<Record<string, number | string>>): Component => {
    const made = newPart(recipe.kind, params, { id: 'part' });
    if (!made.ok) throw new Error(made.faults[0].message);
    return made.component;
  };

  test('builds with its usual measurements, as a guess that a measured part replaces', () => {
    const part = build({});
    expect(loads(part)).toBe('loads');
    expect(part.source).toBe('guess');
    expect(part.tolerance).toBe(12);
    expect(part.note).toBe(STAND_IN_NOTE);
    expect(part.solids.length).toBeLessThanOrEqual(60);
  });

  test(`builds or refuses with a sentence at any measurements in their limits (seed ${SEED})`, () => {
    let built = 0;
    fc.assert(
      fc.property(anyParams(recipe), (params) => {
        const made = newPart(recipe.kind, params, { id: 'part' });
        if (made.ok) {
          built += 1;
          expect(loads(made.component)).toBe('loads');
        } else {
          const keys = new Set(recipe.params.map((p) => p.key));
          for (const fault of made.faults) expect(keys.has(fault.key), fault.message).toBe(true);
        }
      }),
      { seed: SEED, numRuns: 150 },
    );
    expect(built).toBeGreaterThan(0);
  });

  test('refuses what lies beyond a limit, is no number, or is unknown, and names it', () => {
    for (const p of recipe.params.filter(isNumber)) {
      for (const bad of [p.min - 1, p.max + 1, NaN, Infinity, '12', null]) {
        const made = recipe.build({ [p.key]: bad });
        expect(made.ok, `${p.key} = ${String(bad)}`).toBe(false);
        if (!made.ok) expect(made.faults[0].message).toContain(p.label);
      }
    }
    const unknown = recipe.build({ colour: 3 });
    expect(unknown.ok).toBe(false);
    expect(recipe.build([]).ok).toBe(false);
    expect(recipe.build(null).ok).toBe(false);
  });

  test('built again, it keeps its place, name, tolerance and note', () => {
    const part: Component = { ...build({}), name: 'Ours', tolerance: 3, note: 'measured', pose: { at: [1, 2, 3] } };
    const again = rebuildPart(part, {});
    expect(again).toEqual({ ok: true, component: part });
  });
});
