import { describe, expect, it } from 'vitest';
import type { Finding, Report } from '#shared/check';
import { gapChart } from '../../../../src/features/report/gap-chart';
import { finding, smallScene } from '../bench/support';

const report = (findings: readonly Finding[]): Report => ({
  format: 'gapwright-report',
  version: 1,
  engine: '1.0.0',
  scene: { name: 'Layout 1', sha256: '' },
  accuracy: 0.05,
  meshes: [],
  totals: { hits: 0, tight: 0, loose: 0, seated: 0, clears: 0 },
  unchecked: [],
  findings,
});

const STROKE = { motions: [{ component: 'brake-pedal', motion: 'stroke' }] };
const found = [
  finding('brake-pedal', 'column', 'hits', STROKE),
  finding('wiper', 'firewall', 'tight'),
  finding('brake-pedal', 'clutch-pedal', 'seated'),
  finding('brake-pedal', 'column', 'clears'),
  finding('floor', 'column', 'clears'),
];

describe('the gap chart', () => {
  it('shows the worst finding of a pair, whichever way round it is asked', () => {
    const { worst } = gapChart(smallScene(), report(found), 12);
    expect(worst('column', 'brake-pedal')?.verdict).toBe('hits');
    expect(worst('brake-pedal', 'column')?.verdict).toBe('hits');
    expect(worst('floor', 'wiper')).toBeNull();
  });

  it('takes the parts with the closest calls and sets them in the order of the scene', () => {
    const { parts, left } = gapChart(smallScene(), report(found), 4);
    expect(parts.map((p) => p.id)).toEqual(['firewall', 'column', 'brake-pedal', 'wiper']);
    expect(left).toBe(1);
  });

  it('has no place for parts that are only jointed', () => {
    const { parts, left } = gapChart(smallScene(), report(found), Infinity);
    expect(parts.map((p) => p.id)).not.toContain('clutch-pedal');
    expect(left).toBe(0);
  });
});
