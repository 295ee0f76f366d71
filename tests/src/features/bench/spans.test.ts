import { describe, expect, it } from 'vitest';
import { freeingOf, movedBy } from '../../../../src/features/bench/ladder/freeing';
import { joinSpans, spansOf } from '../../../../src/lib/spans';
import { clustersOf, movedTo, orderOf } from '../../../../src/features/bench/rail/clusters';
import { finding, smallScene } from './support';

describe('the stretches of a stroke', () => {
  const motion = { component: 'brake-pedal', motion: 'stroke' };

  it('of all that it meets are made one where they touch', () => {
    expect(
      joinSpans([
        [0.5, 0.7],
        [0.1, 0.2],
        [0.2, 0.3],
        [0.6, 0.9],
      ]),
    ).toEqual([
      [0.1, 0.3],
      [0.5, 0.9],
    ]);
  });

  it('come from every finding of the motion, and from no other', () => {
    const { hits, tight } = spansOf(
      [
        finding('brake-pedal', 'column', 'hits', {
          motions: [motion],
          hitSpans: [[0.41, 0.43]],
          tightSpans: [[0.3, 0.6]],
        }),
        finding('brake-pedal', 'floor', 'tight', { motions: [motion], tightSpans: [[0.9, 1]] }),
        finding('clutch-pedal', 'floor', 'hits', {
          motions: [{ component: 'clutch-pedal', motion: 'stroke' }],
          hitSpans: [[0, 1]],
        }),
      ],
      'brake-pedal',
      'stroke',
    );
    expect(hits).toEqual([[0.41, 0.43]]);
    expect(tight).toEqual([
      [0.3, 0.6],
      [0.9, 1],
    ]);
  });

  it('show at least the place itself where two motions were checked against one another', () => {
    const both = finding('brake-pedal', 'clutch-pedal', 'hits', {
      motions: [motion, { component: 'clutch-pedal', motion: 'stroke' }],
      hitSpans: null,
      tightSpans: null,
    });
    const at = { ...both.at, positions: [0.6, 0.2] };
    expect(spansOf([{ ...both, at }], 'clutch-pedal', 'stroke').hits).toEqual([[0.2, 0.2]]);
  });
});

describe('what would change a finding', () => {
  const scene = smallScene();
  const pushed = (a: string, b: string, vector: readonly [number, number, number]) =>
    finding(a, b, 'hits', { overlap: { volume: null, pushOut: { vector, length: Math.hypot(...vector) } } });

  it('is the verified push-out of the first of the pair', () => {
    const freeing = freeingOf(scene, pushed('brake-pedal', 'column', [8, 0, -2]))!;
    expect(freeing).toMatchObject({ part: 'brake-pedal', vector: [8, 0, -2], verified: true });
    expect(freeing.moves.map((m) => m.direction)).toEqual(['rearward', 'down']);
  });

  it('never asks for the car to be moved: a body panel stays, the other goes the opposite way', () => {
    const freeing = freeingOf(scene, pushed('firewall', 'wiper', [5, 0, 0]))!;
    expect(freeing.part).toBe('wiper');
    expect(freeing.vector[0]).toBeCloseTo(-5);
  });

  it('goes straight apart by what lacks where a pair is only tight, and says that nobody has tried it', () => {
    const tight = finding('column', 'wiper', 'tight', {
      gap: 6,
      margin: -4,
      at: {
        positions: [],
        points: [
          [0, 6, 0],
          [0, 0, 0],
        ],
        solids: ['body', 'body'],
      },
    });
    expect(freeingOf(scene, tight)).toMatchObject({ part: 'column', vector: [0, 4, 0], verified: false });
  });

  it('says nothing of what clears', () => {
    expect(freeingOf(scene, finding('column', 'wiper', 'clears', { gap: 40, margin: 30 }))).toBeNull();
  });

  it('takes the group along, but not where both are clamped in it', () => {
    const out = freeingOf(scene, pushed('brake-pedal', 'column', [8, 0, 0]))!;
    expect(movedBy(scene, out, ['brake-pedal', 'column'])).toEqual({ parts: ['brake-pedal'], group: 'pedal-box' });
    const within = freeingOf(scene, pushed('brake-pedal', 'clutch-pedal', [0, 8, 0]))!;
    expect(movedBy(scene, within, ['brake-pedal', 'clutch-pedal'])).toEqual({ parts: ['brake-pedal'], group: null });
  });
});

describe('the tags of the rail', () => {
  it('stand in the fitting order, clamped ones side by side', () => {
    const scene = smallScene();
    const scattered = {
      ...scene,
      components: ['brake-pedal', 'firewall', 'clutch-pedal', 'column', 'floor', 'wiper'].map((id) =>
        scene.components.find((c) => c.id === id)!,
      ),
    };
    const clusters = clustersOf(scattered);
    expect(clusters.map((c) => [c.label, c.parts.map((p) => p.id).join(' ')])).toEqual([
      ['Pedal box', 'brake-pedal clutch-pedal'],
      ['Body', 'firewall'],
      ['Single parts', 'column'],
      ['Body', 'floor'],
      ['Single parts', 'wiper'],
    ]);
    expect(orderOf(clusters)).toHaveLength(6);
  });

  it('change places one at a time', () => {
    expect(movedTo(['a', 'b', 'c', 'd'], 'a', 2)).toEqual(['b', 'c', 'a', 'd']);
    expect(movedTo(['a', 'b', 'c'], 'b', -4)).toEqual(['b', 'a', 'c']);
    expect(movedTo(['a', 'b', 'c'], 'a', 99)).toEqual(['b', 'c', 'a']);
  });
});
