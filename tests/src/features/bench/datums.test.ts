import { describe, expect, it } from 'vitest';
import { cutOf } from '../../../../src/features/bench/cutaway/cut-of';
import { datumCoordinate, datumFor, datumsOf, readingFrom, SIDES } from '../../../../src/features/bench/tape/datums';
import { box, smallScene } from './support';

const INCH = 25.4;

describe('the datums of the tape', () => {
  const scene = smallScene();

  it('begin with what the shop measures from: firewall along the car, laser across, floor upwards', () => {
    expect(datumsOf(scene, 0).map((d) => d.name)).toEqual(['Firewall', 'zero of the car']);
    expect(datumsOf(scene, 1).map((d) => d.name)).toEqual(['Column line', 'middle of the car']);
    expect(datumsOf(scene, 2).map((d) => d.name)).toEqual(['Floor', 'zero of the car']);
  });

  it('read 4 1/8 right of the column line', () => {
    const at = [140, 300 + 4.125 * INCH, 600] as const;
    const datum = datumFor(scene, 1, undefined);
    const reading = readingFrom(datum, 1, at);
    expect(reading / INCH).toBeCloseTo(4.125);
    expect(SIDES[1]![reading > 0 ? 0 : 1]).toBe('right of');
  });

  it('read off the face that looks into the cabin, not the middle of the sheet', () => {
    expect(readingFrom(datumFor(scene, 0, undefined), 0, [1, 0, 500])).toBeCloseTo(0);
    expect(readingFrom(datumFor(scene, 2, undefined), 2, [0, 0, 50])).toBeCloseTo(0);
  });

  it('meet a raked firewall where the tape would: level, at the height of the part', () => {
    const raked = {
      ...scene,
      components: scene.components.map((c) =>
        c.id === 'firewall' ? { ...c, pose: { at: [0, 0, 500], turn: [0, -30, 0] } as const } : c,
      ),
    };
    const datum = datumFor(raked, 0, undefined);
    const low = datumCoordinate(datum, 0, [0, 0, 400]);
    const high = datumCoordinate(datum, 0, [0, 0, 600]);
    // 200 mm of height on a 30 degree rake
    expect(Math.abs(high - low)).toBeCloseTo(200 * Math.tan(Math.PI / 6), 6);
    expect(readingFrom(datum, 0, [high + 12, 0, 600])).toBeCloseTo(12);
  });

  it('leave out planes that lean too far to be read square', () => {
    const leaning = {
      ...scene,
      lasers: [...scene.lasers, { id: 'skew', name: 'Skew', point: [0, 0, 0], normal: [1, 1.2, 0] } as const],
    };
    expect(datumsOf(leaning, 1).map((d) => d.name)).toContain('Skew');
    expect(datumsOf(leaning, 0).map((d) => d.name)).not.toContain('Skew');
  });

  it('fall back when the chosen one is gone', () => {
    expect(datumFor(scene, 1, 'laser gone').key).toBe('laser column-line');
    expect(datumFor(scene, 1, 'zero').key).toBe('zero');
  });

  it('take the largest sheet of a panel of several', () => {
    const panel = box('firewall', 'firewall', [2, 10, 10], [0, 0, 0], {
      solids: [
        { id: 'flange', shape: { kind: 'box', size: [40, 40, 4] } },
        { id: 'sheet', shape: { kind: 'box', size: [2, 1000, 500] }, pose: { at: [30, 0, 0] } },
      ],
    });
    expect(datumFor({ ...scene, components: [panel] }, 0, undefined).point[0]).toBeCloseTo(31);
  });
});

describe('a cutaway', () => {
  const scene = smallScene();

  it('hangs on the usual datum, its far side taken away', () => {
    const cut = cutOf(scene, { axis: 1, datum: null, offset: 10, isFlipped: false });
    expect(cut).toEqual({ point: [0, 310, 0], towards: [0, 1, 0] });
  });

  it('takes the other side when it is turned round, at the same place', () => {
    const cut = cutOf(scene, { axis: 1, datum: 'zero', offset: -25, isFlipped: true });
    expect(cut?.point).toEqual([0, -25, 0]);
    expect(cut?.towards.map((x) => x + 0)).toEqual([0, -1, 0]);
  });

  it('means right by right though the laser looks left', () => {
    const mirrored = { ...scene, lasers: [{ ...scene.lasers[0]!, normal: [0, -2, 0] as const }] };
    const cut = cutOf(mirrored, { axis: 1, datum: null, offset: 10, isFlipped: false });
    expect(cut?.point[1]).toBeCloseTo(310);
    expect(cut?.towards[1]).toBeCloseTo(1);
  });

  it('is none when none hangs', () => {
    expect(cutOf(scene, null)).toBeNull();
  });
});
