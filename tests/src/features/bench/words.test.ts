import { describe, expect, it } from 'vitest';
import type { Motion } from '#shared/scene';
import { heightOf, pairName, readingOf } from '../../../../src/lib/finding-words';
import { sayPosition, stepAt, strokeEnds } from '../../../../src/lib/motion-words';
import { decidingRule, generalOrigin, originOf, ruleWords, sideWords } from '../../../../src/lib/rule-words';
import { stepFor } from '../../../../src/features/bench/steps';
import { sayRecord } from '../../../../src/features/bench/top-bar/conflict-words';
import { finding, smallScene } from './support';

describe('a reading', () => {
  it('never says more room than there is: gaps are rounded down, overlaps up', () => {
    expect(readingOf(finding('a', 'b', 'tight', { gap: 4.74 }), 'in').parts?.text).toBe('5/32');
    const hit = finding('a', 'b', 'hits', { overlap: { volume: null, pushOut: { vector: [0, 0, 4], length: 4 } } });
    expect(readingOf(hit, 'in')).toMatchObject({ word: 'overlaps', parts: { text: '3/16' } });
  });

  it('is the proven bound, not the nearest sample', () => {
    expect(readingOf(finding('a', 'b', 'clears', { gap: 20, gapAtLeast: 19.4 }), 'mm').parts?.text).toMatch(
      /^19(\.4)?$/,
    );
  });

  it('says that two touch where no depth is known', () => {
    expect(readingOf(finding('a', 'b', 'hits'), 'in')).toEqual({ word: 'touches', parts: null });
  });

  it('says how far a seated joint is pressed in', () => {
    const seated = finding('a', 'b', 'seated', {
      gap: 0,
      overlap: { volume: 3, pushOut: { vector: [0.5, 0, 0], length: 0.5 } },
    });
    expect(readingOf(seated, 'mm').word).toBe('in by');
  });

  it('stands at its margin, or below zero where it hits', () => {
    expect(heightOf(finding('a', 'b', 'tight', { margin: -3 }))).toBe(-3);
    expect(heightOf(finding('a', 'b', 'hits', { margin: 5 }))).toBe(0);
  });

  it('names the two parts, or the id of one that is gone', () => {
    expect(pairName(smallScene(), { between: ['brake-pedal', 'gone'] })).toBe('Brake pedal, gone');
  });
});

describe('a motion', () => {
  const steps: Motion = {
    id: 'out',
    name: 'Out',
    use: 'service',
    steps: [
      { kind: 'slide', along: [-1, 0, 0], from: 0, to: 50 },
      { kind: 'swing', point: [0, 0, 0], axis: [0, 0, 1], from: 0, to: 90 },
    ],
  };

  it('shares its positions among its steps', () => {
    expect(stepAt(steps, 0.25)?.value).toBeCloseTo(25);
    expect(stepAt(steps, 0.75)).toMatchObject({ step: { kind: 'swing' } });
    expect(stepAt(steps, 0.75)?.value).toBeCloseTo(45);
    expect(stepAt(steps, 1)?.value).toBeCloseTo(90);
  });

  it('says where it stands in per cent and in its own measure', () => {
    expect(sayPosition(steps, 0.25, 'mm')).toMatch(/^25 % · 25 ?mm$/);
    expect(sayPosition(steps, 0.75, 'mm')).toMatch(/^75 % · 45/);
  });

  it('calls its ends by what it is', () => {
    expect(strokeEnds(steps, 'master-cylinder')).toEqual(['fitted', 'out']);
    expect(strokeEnds({ ...steps, use: 'operating' }, 'pedal')).toEqual(['rest', 'bottoms out']);
    expect(strokeEnds({ ...steps, use: 'operating' }, 'wiper')).toEqual(['start', 'end']);
  });
});

describe('a gap rule', () => {
  const scene = smallScene();

  it('says which row decided and where the row comes from', () => {
    const arm = finding('brake-pedal', 'column', 'tight', { rule: 'category-category', required: 12 });
    expect(decidingRule(scene, arm)?.gap).toBe(12);
    expect(ruleWords(scene, arm)).toMatch(/common practice, no source: arm to column/);
  });

  it('is yours once its figure is changed', () => {
    const rule = scene.rules.pairs.find((r) => r.gap === 12)!;
    expect(originOf({ ...rule, gap: 14 })).toBe('yours');
    expect(generalOrigin({ ...scene, rules: { ...scene.rules, gap: 7 } }, 'gap')).toBe('yours');
    expect(generalOrigin(scene, 'movingGap')).toMatch(/finger's width/);
  });

  it('prefers the row whose gap was required', () => {
    const own = { between: [{ component: 'brake-pedal' }, { component: 'column' }], gap: 9 } as const;
    const with9 = { ...scene, rules: { ...scene.rules, pairs: [...scene.rules.pairs, own] } };
    const f = finding('brake-pedal', 'column', 'tight', { rule: 'component-component', required: 9 });
    expect(decidingRule(with9, f)).toBe(own);
    expect(ruleWords(with9, f)).toBe('yours');
  });

  it('has sides in the words of whoever reads', () => {
    expect(sideWords(scene, { category: 'hood' }, 'uk')).toBe('any bonnet');
    expect(sideWords(scene, { group: 'pedal-box' }, 'us')).toBe('any of Pedal box');
    expect(sideWords(scene, { component: 'wiper' }, 'us')).toBe('Wiper');
  });
});

describe('a conflict', () => {
  const scene = smallScene();
  const moved = {
    ...scene,
    components: scene.components.map((c) =>
      c.id === 'wiper' ? { ...c, pose: { at: [-180, 0, 700] }, tolerance: 4 } : c,
    ),
  } as typeof scene;

  it('says only what differs', () => {
    expect(sayRecord('components wiper', moved, scene, 'mm')).toBe('at -180 mm, 0 mm, 700 mm; tolerance 4 mm');
    expect(sayRecord('components column', moved, scene, 'mm')).toBe('the same');
  });

  it('says that one side deleted what the other changed', () => {
    const without = { ...scene, components: scene.components.filter((c) => c.id !== 'wiper') };
    expect(sayRecord('components wiper', without, moved, 'mm')).toBe('deleted');
    expect(sayRecord('components wiper', moved, without, 'mm')).toMatch(/^still there/);
  });
});

describe('the step of a nudge', () => {
  it('is the smallest of its unit until another of that unit is chosen', () => {
    expect(stepFor('in', null)).toBeCloseTo(25.4 / 16);
    expect(stepFor('mm', 5)).toBe(5);
    expect(stepFor('in', 5)).toBeCloseTo(25.4 / 16);
  });
});
