import { describe, expect, it } from 'vitest';
import { groupFindings, matches, picturedFindings } from '../../../../src/features/report/finding-groups';
import { finding, smallScene } from '../bench/support';

const scene = smallScene();
const STROKE = { motions: [{ component: 'brake-pedal', motion: 'stroke' }] };
const all = [
  finding('brake-pedal', 'column', 'hits', STROKE),
  finding('clutch-pedal', 'column', 'tight'),
  finding('brake-pedal', 'firewall', 'loose'),
  finding('brake-pedal', 'clutch-pedal', 'seated'),
  finding('floor', 'wiper', 'clears'),
  finding('column', 'wiper', 'clears', { insideSheet: true }),
];

describe('the findings of a report', () => {
  it('tell trouble in full and gather what is in order', () => {
    const { full, clears, seated } = groupFindings(scene, all, '', null);
    expect(full.map((f) => f.verdict)).toEqual(['clears', 'hits', 'tight', 'loose']);
    expect(clears.map((f) => f.between)).toEqual([['floor', 'wiper']]);
    expect(seated).toHaveLength(1);
  });

  it('say first what may lie inside a broken scan, whatever its verdict', () => {
    expect(groupFindings(scene, all, '', null).full[0]?.insideSheet).toBe(true);
  });

  it('lose none and double none', () => {
    const { full, clears, seated } = groupFindings(scene, all, '', null);
    expect(new Set([...full, ...clears, ...seated]).size).toBe(all.length);
    expect(full.length + clears.length + seated.length).toBe(all.length);
  });

  it('narrow down to a verdict', () => {
    const { full, clears, seated } = groupFindings(scene, all, '', 'tight');
    expect(full.map((f) => f.verdict)).toEqual(['tight']);
    expect([...clears, ...seated]).toEqual([]);
  });

  it('are found by the names of parts and motions, in any order and case', () => {
    expect(all.filter((f) => matches(scene, f, 'COLUMN pedal'))).toHaveLength(2);
    expect(all.filter((f) => matches(scene, f, 'brake stroke'))).toHaveLength(1);
    expect(all.filter((f) => matches(scene, f, 'at rest'))).toHaveLength(5);
    expect(all.filter((f) => matches(scene, f, 'gearbox'))).toHaveLength(0);
  });

  it('have pictures taken of trouble alone, the worst first', () => {
    expect(picturedFindings(all, 2).map((f) => f.verdict)).toEqual(['hits', 'tight']);
    expect(picturedFindings(all, 24)).toHaveLength(3);
  });
});
