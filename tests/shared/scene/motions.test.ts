import fc from 'fast-check';
import { expect, it } from 'vitest';
import { fixedSolids, loadScene, movedSolids, operatingMotions, serviceMotions } from '#shared/scene';
import { arbitraryScene } from './arbitrary-scene';
import { sampleDocument, spoiled } from './sample';

it('tells what moves while driving from what is moved to fit it', () => {
  const steps = [{ kind: 'slide', along: [1, 0, 0], to: 5 }];
  const document = spoiled(sampleDocument(), 'components[0].motions', [
    { id: 'stroke', name: 'Stroke', use: 'operating', solids: ['pad'], steps },
    { id: 'out', name: 'Draw-out', use: 'service', steps },
  ]);
  const result = loadScene(document);
  if (!result.ok) throw new Error(result.refusals[0].reason);
  const pedal = result.scene.components[0]!;
  expect(operatingMotions(pedal).map((m) => m.id)).toEqual(['stroke']);
  expect(serviceMotions(pedal).map((m) => m.id)).toEqual(['out']);
  expect(movedSolids(pedal, pedal.motions[0]!).map((s) => s.id)).toEqual(['pad']);
  expect(movedSolids(pedal, pedal.motions[1]!).map((s) => s.id)).toEqual(['arm', 'pad']);
  expect(fixedSolids(pedal).map((s) => s.id)).toEqual(['arm']);
});

it('puts every solid on one side: carried by one operating motion, or fixed', () => {
  fc.assert(
    fc.property(arbitraryScene, (scene) => {
      for (const c of scene.components) {
        const carried = operatingMotions(c).flatMap((m) => movedSolids(c, m));
        expect([...carried, ...fixedSolids(c)].map((s) => s.id).sort()).toEqual(c.solids.map((s) => s.id).sort());
      }
    }),
  );
});

it('makes scenes at random that load as they are', () => {
  fc.assert(
    fc.property(arbitraryScene, (scene) => {
      expect(loadScene(structuredClone(scene))).toEqual({ ok: true, scene });
    }),
  );
});
