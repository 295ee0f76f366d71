import { describe, expect, it } from 'vitest';
import type { Finding } from '#shared/check';
import { CAUTION_SHORT } from '#shared/review';
import { captionOf, worstOfPairs } from '../../../../src/features/shares/caption';
import { layoutCaption, wrapped, type Measure } from '../../../../src/features/shares/caption-layout';
import { finding, smallScene } from '../bench/support';

const BASE = {
  projectName: 'Harbour Lane pickup',
  scene: smallScene(),
  number: 7,
  standpoint: 'Engine bay',
  isDryFit: true,
  display: 'in',
} as const;

const hit = (a: string, b: string, length: number): Finding =>
  finding(a, b, 'hits', { overlap: { volume: null, pushOut: { vector: [0, 0, length], length } } });

/** Every letter is half as wide as it is high. */
const measure: Measure = (runs, size) => runs.reduce((sum, run) => sum + run.text.length * size * run.size * 0.5, 0);

const texts = (runs: readonly { readonly text: string }[]): string => runs.map((run) => run.text).join('');

describe('what stands under a picture', () => {
  it('says verdict, reading, pair and place of the worst findings, one a pair', () => {
    const caption = captionOf({
      ...BASE,
      findings: [
        hit('brake-pedal', 'column', 7.9),
        finding('brake-pedal', 'column', 'hits', { motions: [{ component: 'brake-pedal', motion: 'stroke' }] }),
        finding('clutch-pedal', 'column', 'tight', { gap: 6, gapAtLeast: 6, margin: -4 }),
        finding('wiper', 'column', 'clears'),
      ],
    });
    expect(caption.title).toBe('Harbour Lane pickup / Layout 1');
    expect(caption.seen).toBe('revision 7 · Engine bay');
    expect(caption.findings.map((f) => [f.verdict, f.pair, f.where])).toEqual([
      ['hits', 'Brake pedal, Column', 'at rest'],
      ['tight', 'Clutch pedal, Column', 'at rest'],
    ]);
    expect(texts(caption.findings[0]!.reading).replace(/\u00a0+/g, ' ')).toBe('hits overlaps 5⁄16"');
    expect(caption.rest).toBe('');
    expect(caption.caution).toBe(CAUTION_SHORT);
  });

  it('counts what it does not list, by pairs', () => {
    const pairs = ['firewall', 'floor', 'column', 'clutch-pedal', 'wiper', 'gone'];
    const findings = pairs.flatMap((id) => [hit('brake-pedal', id, 3), hit('brake-pedal', id, 2)]);
    const caption = captionOf({ ...BASE, findings });
    expect(caption.findings).toHaveLength(4);
    expect(caption.rest).toBe('And 2 more.');
    expect(worstOfPairs(findings)).toHaveLength(6);
  });

  it('never sells a live check as a dry fit, nor silence as a result', () => {
    expect(captionOf({ ...BASE, findings: [], isDryFit: false }).rest).toBe(
      'Live check of the bench, not yet a dry fit. Nothing was compared yet.',
    );
    expect(captionOf({ ...BASE, findings: [finding('wiper', 'column', 'clears')] }).rest).toBe(
      'Every pair that was checked clears.',
    );
    expect(captionOf({ ...BASE, findings: [hit('wiper', 'column', 2)], isDryFit: false }).rest).toBe(
      'Live check of the bench, not yet a dry fit.',
    );
  });

  it('leaves the standpoint away where a hand has moved the camera', () => {
    expect(captionOf({ ...BASE, standpoint: null, findings: [] }).seen).toBe('revision 7');
  });
});

describe('the strip under a picture', () => {
  const long = captionOf({
    ...BASE,
    projectName: 'A pickup with a name that is far too long to stand in one line of any picture '.repeat(3).trim(),
    findings: ['firewall', 'floor', 'column', 'wiper'].map((id) => hit('brake-pedal', id, 3)),
  });

  it.each([320, 640, 1280, 2400])('keeps every text within a picture %i px wide', (width) => {
    const { items, height, name } = layoutCaption(long, width, measure);
    for (const item of items) {
      if (item.kind !== 'text') continue;
      expect(item.x).toBeGreaterThanOrEqual(0);
      expect(item.x + measure(item.runs, item.size, item.weight), texts(item.runs)).toBeLessThanOrEqual(width);
      expect(item.y).toBeLessThan(height);
    }
    expect(name.x).toBeGreaterThan(0);
  });

  it('says the whole caution, on as many lines as it takes', () => {
    const { items } = layoutCaption(long, 320, measure);
    const said = items.flatMap((item) => (item.kind === 'text' ? [texts(item.runs)] : [])).join(' ');
    expect(said).toContain(CAUTION_SHORT);
  });

  it('marks each finding besides colouring it', () => {
    const { items } = layoutCaption(long, 1280, measure);
    expect(items.filter((item) => item.kind === 'glyph')).toHaveLength(4);
  });

  it('breaks at spaces and cuts a word that is longer than the line', () => {
    expect(wrapped('aa bb cc', 5 * 5, 10, 400, measure)).toEqual(['aa bb', 'cc']);
    expect(wrapped('abcdefgh', 5 * 5, 10, 400, measure)).toEqual(['abcd…']);
  });
});
