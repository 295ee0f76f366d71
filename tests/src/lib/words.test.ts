import { describe, expect, it } from 'vitest';
import { CATEGORIES } from '#shared/scene';
import { FINISHES, finishOf } from '../../../src/lib/finishes';
import { countOf, formatBytes, formatWhen } from '../../../src/lib/format';
import { displayFor } from '../../../src/lib/me';
import { categoryLabel, inWords } from '../../../src/lib/part-words';
import { safePath, signInPath } from '../../../src/lib/return-path';

describe('names of parts', () => {
  it('follow the person’s choice, in any case and number', () => {
    expect(inWords('Hood, inner fenders and the Firewall; a fender liner under the cowl.', 'uk')).toBe(
      'Bonnet, inner wings and the Bulkhead; a wing liner under the scuttle.',
    );
  });

  it('stay in the US and within other words', () => {
    expect(inWords('hood', 'us')).toBe('hood');
    expect(inWords('neighbourhood, cowling', 'uk')).toBe('neighbourhood, cowling');
  });

  it('cover every category, and every category has a finish', () => {
    for (const category of CATEGORIES) {
      expect(categoryLabel(category, 'us')).not.toBe('');
      expect(FINISHES).toContain(finishOf(category));
    }
    expect(categoryLabel('fender-liner', 'uk')).toBe('wing liner');
  });
});

describe('units', () => {
  it('the person’s choice wins over the project’s, that over the document’s', () => {
    expect(displayFor({ display: 'mm' }, 'in', 'in-decimal')).toBe('mm');
    expect(displayFor({ display: null }, 'in', 'in-decimal')).toBe('in');
    expect(displayFor(null, null, 'in-decimal')).toBe('in-decimal');
  });
});

describe('figures', () => {
  it('counts in singular and plural', () => {
    expect(countOf(1, 'scene')).toBe('1 scene');
    expect(countOf(0, 'mesh', 'meshes')).toBe('0 meshes');
  });

  it('gives sizes in three figures', () => {
    expect([0, 999, 40_500_084, 256 * 1024 * 1024].map(formatBytes)).toEqual([
      '0 bytes',
      '999 bytes',
      '40.5 MB',
      '268 MB',
    ]);
  });

  it('says a moment as near as it is', () => {
    const now = new Date(2026, 4, 15, 9, 0);
    const at = (...parts: [number, number, number, number, number]): string =>
      formatWhen(new Date(...parts).toISOString(), now, 'en-GB');
    expect(at(2026, 4, 15, 8, 5)).toBe('today, 8:05');
    expect(at(2026, 4, 14, 23, 59)).toBe('yesterday, 23:59');
    expect(at(2026, 2, 1, 12, 0)).toBe('1 Mar, 12:00');
    expect(at(2025, 11, 31, 12, 0)).toBe('31 Dec 2025, 12:00');
  });
});

describe('the way back after signing in', () => {
  it.each(['//evil.example', 'https://evil.example', '/\\evil.example', 'javascript:alert(1)', '/a\nb', '', null])(
    'never leaves the site: %j',
    (path) => {
      expect(safePath(path)).toBe('/');
    },
  );

  it('keeps path, query and hash', () => {
    expect(safePath('/scenes/x?finding=y#z')).toBe('/scenes/x?finding=y#z');
    expect(signInPath('/scenes/x?a=b')).toBe('/sign-in?back=%2Fscenes%2Fx%3Fa%3Db');
    expect(signInPath('/')).toBe('/sign-in');
  });
});
