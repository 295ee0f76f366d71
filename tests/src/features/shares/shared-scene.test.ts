import { describe, expect, it } from 'vitest';
import { sharedScene, sharedSentence } from '../../../../src/features/shares/shared-scene';

const drawable = {
  name: 'Layout 3',
  display: 'in',
  lasers: [],
  groups: [],
  components: [
    {
      id: 'liner',
      name: 'Fender liner',
      category: 'fender-liner',
      pose: {},
      motions: [],
      solids: [{ id: 'skin', shape: { kind: 'mesh', mesh: '0', scale: 1 } }],
    },
  ],
};

describe('a shared scene', () => {
  it('is a scene again, with nothing of what the team keeps to itself', () => {
    const scene = sharedScene({ document: drawable });
    expect(scene?.components[0]).toMatchObject({ id: 'liner', tolerance: 0, holes: [] });
    expect(scene?.rules.pairs).toEqual([]);
  });

  it('is nothing where it cannot be read', () => {
    expect(sharedScene({ document: null })).toBeNull();
    expect(sharedScene({ document: { ...drawable, components: [{ id: 'X' }] } })).toBeNull();
  });

  it('has no sentence without a report', () => {
    expect(sharedSentence({ sentence: null })).toEqual([]);
  });
});
