import { describe, expect, it } from 'vitest';
import { parseAngle } from '#shared/units';

describe('angles', () => {
  it.each([
    ['12.5', 12.5],
    ['12,5', 12.5],
    ['12,5°', 12.5],
    ['12.5 º', 12.5],
    ['-9 deg', -9],
    ['−9°', -9],
    ['1 degree', 1],
    ['22 1/2 degrees', 22.5],
    ['22½', 22.5],
    ['=+3', 3],
  ])('%s', (text, expected) => {
    expect(parseAngle(text)).toEqual({ ok: true, degrees: expected, relative: false });
  });

  it('adds with a plus, never with a minus', () => {
    expect(parseAngle('+1', { current: 10 })).toEqual({ ok: true, degrees: 11, relative: true });
    expect(parseAngle('-1', { current: 10 })).toEqual({ ok: true, degrees: -1, relative: false });
    expect(parseAngle('=+1', { current: 10 })).toEqual({ ok: true, degrees: 1, relative: false });
  });

  it.each([
    ['', 'Type an angle in degrees, like 12.5.'],
    ['steep', '“steep” is not an angle: “steep” is not a number. Type degrees, like 12.5.'],
    ['1,250', '“1,250” is not an angle: 1,250 could mean 1250 or 1.25; write 1250 or 1.25.'],
    ['1/0', '“1/0” is not an angle: 1/0 divides by zero. Type degrees, like 12.5.'],
    ['5 mm', '“5 mm” is not an angle: “5 mm” is not a number. Type degrees, like 12.5.'],
    ['3601', 'That is more than 3600 degrees. Type degrees, like 12.5.'],
    ['9'.repeat(61), 'That is too long for an angle. Type degrees, like 12.5.'],
  ])('refuses %j', (text, expected) => {
    expect(parseAngle(text)).toEqual({ ok: false, reason: expected });
  });
});
