import { describe, expect, it } from 'vitest';
import {
  edits,
  loadScene,
  removeComponents,
  renameComponent,
  type Component,
  type Motion,
  type NamedEdit,
  type Scene,
} from '#shared/scene';
import { sampleDocument } from './sample';

function sample(): Scene {
  const result = loadScene(sampleDocument());
  if (!result.ok) throw new Error(result.refusals[0].reason);
  return result.scene;
}

const part = (scene: Scene, id: string): Component => scene.components.find((c) => c.id === id)!;

const stroke: Motion = {
  id: 'extra',
  name: 'Extra',
  use: 'service',
  steps: [{ kind: 'slide', along: [1, 0, 0], from: 0, to: 5 }],
};

describe('named edits', () => {
  const scene = sample();
  const box = { kind: 'box', size: [1, 1, 1] } as const;

  it.each<[NamedEdit, string]>([
    [edits.addComponent(scene, { ...part(scene, 'firewall'), id: 'n', name: 'Cowl' }), 'Add Cowl'],
    [edits.moveComponent(scene, 'brake-pedal', { at: [1, 2, 3] }), 'Move Brake pedal'],
    [edits.removeComponents(scene, ['brake-pedal']), 'Remove Brake pedal'],
    [edits.removeComponents(scene, ['brake-pedal', 'firewall']), 'Remove 2 parts'],
    [edits.duplicateComponents(scene, ['firewall'], [0, 0, 1]), 'Copy Firewall'],
    [edits.renameComponent(scene, 'firewall', 'Bulkhead'), 'Rename Firewall'],
    [edits.setCategory(scene, 'firewall', 'cowl'), 'Change what Firewall is'],
    [edits.setSource(scene, 'firewall', 'guess'), 'Change the source of Firewall'],
    [edits.setTolerance(scene, 'firewall', 4), 'Change the tolerance of Firewall'],
    [edits.setNote(scene, 'firewall', 'x'), 'Change the note on Firewall'],
    [
      edits.setRecipeResult(scene, 'firewall', {
        recipe: { kind: 'x', params: {} },
        solids: [{ id: 'x', shape: box }],
        motions: [],
        holes: [],
      }),
      'Rebuild Firewall',
    ],
    [edits.reorderComponents(scene, ['firewall', 'brake-pedal']), 'Change the fitting order'],
    [edits.addSolid(scene, 'firewall', { id: 'rib', shape: box }), 'Add a solid to Firewall'],
    [edits.removeSolid(scene, 'brake-pedal', 'pad'), 'Remove pad of Brake pedal'],
    [edits.setShape(scene, 'firewall', 'sheet', box), 'Resize Firewall'],
    [edits.moveSolid(scene, 'brake-pedal', 'arm', { at: [1, 1, 1] }), 'Move arm of Brake pedal'],
    [edits.renameSolid(scene, 'brake-pedal', 'arm', 'Arm'), 'Rename arm of Brake pedal'],
    [edits.addMotion(scene, 'firewall', stroke), 'Add Extra to Firewall'],
    [edits.changeMotion(scene, 'brake-pedal', 'stroke', { name: 'x' }), 'Change Brake stroke of Brake pedal'],
    [edits.removeMotion(scene, 'brake-pedal', 'stroke'), 'Remove Brake stroke of Brake pedal'],
    [edits.clampTogether(scene, ['firewall', 'brake-pedal'], 'Box', [0, 0, 0]), 'Clamp 2 parts together as Box'],
    [edits.partAgain(scene, 'pedal-box'), 'Part Pedal box'],
    [edits.moveToGroup(scene, 'firewall', 'pedal-box'), 'Clamp Firewall to Pedal box'],
    [edits.moveToGroup(scene, 'brake-pedal', undefined), 'Take Brake pedal out of its group'],
    [edits.moveGroup(scene, 'pedal-box', {}), 'Move Pedal box'],
    [edits.renameGroup(scene, 'pedal-box', 'x'), 'Rename Pedal box'],
    [edits.addLaser(scene, { id: 'x', name: 'Floor line', point: [0, 0, 0], normal: [0, 0, 1] }), 'Add Floor line'],
    [edits.removeLaser(scene, 'column-line'), 'Remove Column line'],
    [edits.renameLaser(scene, 'column-line', 'x'), 'Rename Column line'],
    [edits.moveLaser(scene, 'column-line', [1, 1, 1]), 'Move Column line'],
    [
      edits.setPairGap(scene, { group: 'pedal-box' }, { category: 'inner-fender' }, 4),
      'Set the gap of Pedal box and inner fender',
    ],
    [edits.setJoint(scene, 'brake-pedal', 'firewall', 1), 'Join Brake pedal and Firewall'],
    [edits.setJoint(scene, 'pedal-bracket', 'firewall', null), 'Part Pedal bracket and Firewall'],
    [edits.removeRule(scene, 0), 'Remove the gap rule of Brake pedal and column'],
    [edits.removeRule(scene, 1), 'Remove the joint of Pedal bracket and Firewall'],
    [edits.setGeneralGaps(scene, { gap: 7, touch: 0.02 }), 'Change the general gaps'],
    [edits.setName(scene, 'Layout 4'), 'Rename the scene to Layout 4'],
    [edits.setDisplay(scene, 'mm'), 'Change the unit'],
    [edits.setAccuracy(scene, 0.1), 'Change the accuracy'],
  ])('%#: %s', ({ label, edit }, expected) => {
    expect(label).toBe(expected);
    const after = edit(scene);
    expect(after).not.toEqual(scene);
    expect(loadScene(after).ok).toBe(true);
    expect(scene).toEqual(sample());
  });

  it('changes nothing where the document would not load any more', () => {
    for (const { edit } of [
      edits.setTolerance(scene, 'firewall', -1),
      edits.setName(scene, ''),
      edits.setAccuracy(scene, 0),
      edits.setShape(scene, 'firewall', 'sheet', { kind: 'box', size: [0, 1, 1] }),
      edits.moveComponent(scene, 'firewall', { at: [0, 0, 1e9] }),
      edits.moveGroup(scene, 'pedal-box', { at: [0, 0, 99_999] }),
      edits.addMotion(scene, 'brake-pedal', { ...stroke, use: 'operating' }),
      edits.addMotion(scene, 'firewall', { ...stroke, steps: [] }),
      edits.moveLaser(scene, 'column-line', [0, 0, 0], [0, 0, 0]),
      edits.setPairGap(scene, { category: 'hood' }, { category: 'engine' }, -1),
      edits.setGeneralGaps(scene, { touch: 0 }),
      edits.addComponent(scene, { ...part(scene, 'firewall'), id: 'x', group: 'nobody' }),
      edits.moveComponent(scene, 'nobody', {}),
    ]) {
      expect(edit(scene)).toBe(scene);
    }
  });

  it('acts on the scene as it is when it runs', () => {
    const move = edits.moveComponent(scene, 'firewall', { at: [1, 0, 0] });
    const later = renameComponent(scene, 'brake-pedal', 'Brake');
    expect(part(move.edit(later), 'firewall').pose).toEqual({ at: [1, 0, 0] });
    expect(part(move.edit(later), 'brake-pedal').name).toBe('Brake');
    expect(move.edit(removeComponents(scene, ['firewall'])).components).toHaveLength(2);
  });
});
