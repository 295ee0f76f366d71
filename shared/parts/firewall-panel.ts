// A firewall: raked sheet with the column's opening and one for the pedal box, swages and a flange under the cowl.
import type { Hole, Solid, Vec3 } from '#shared/scene';
import { applyRigid, rigidFromPose, turnByRigid } from '#shared/units';
import { angle, BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { panel, type Patch } from './panel';
import { box, placed, roundVec } from './solids';

const SWAGE = 6;

export const firewallPanel = defineRecipe({
  kind: 'firewall-panel',
  name: 'Firewall panel',
  ukName: 'Bulkhead panel',
  category: 'firewall',
  about: 'Sheet between engine and cabin, at its rake, with openings for the column and the pedal box.',
  frame:
    'Origin in the middle of the lower edge, on the cabin side. The sheet lies ahead of it and leans back by its rake.',
  params: {
    width: length('Width', [500, 1300, 1900], 'Across the car.', BY_EYE),
    height: length('Height', [250, 520, 900], 'Along the sheet.', BY_EYE),
    thickness: length('Sheet thickness', [0.7, 1.2, 6], '', MEMORY),
    rake: angle('Rake', [0, 9, 25], 'From the vertical; the top is further back.', MEMORY),
    columnAcross: length('Column opening across', [-900, 350, 900], 'From the middle; minus is left.', BY_EYE),
    columnUp: length('Column opening up', [40, 200, 860], 'From the lower edge, along the sheet.', BY_EYE),
    columnOpening: length('Column opening', [0, 76, 200], 'Side of the square; 0 for none.', MEMORY),
    boxAcross: length('Pedal-box opening across', [-900, 520, 900], 'From the middle; minus is left.', BY_EYE),
    boxUp: length('Pedal-box opening up', [40, 330, 860], 'Its middle, from the lower edge.', BY_EYE),
    boxWidth: length('Pedal-box opening width', [0, 0, 400], '0 for none.', BY_EYE),
    boxHeight: length('Pedal-box opening height', [20, 90, 300], '', BY_EYE),
    swages: choice(
      'Swages',
      { yes: 'pressed in', no: 'flat sheet' },
      'yes',
      'Ribs that stiffen the sheet, towards the engine.',
    ),
  },
  faults: (p) => {
    const faults = [];
    const inside = (y: number, z: number, wide: number, high: number): boolean =>
      Math.abs(y) + wide / 2 < p.width / 2 && z - high / 2 > 0 && z + high / 2 < p.height;
    if (p.columnOpening >= 1 && !inside(p.columnAcross, p.columnUp, p.columnOpening, p.columnOpening)) {
      faults.push({ key: 'columnAcross', message: 'Column opening must lie within the sheet.' });
    }
    if (p.boxWidth >= 1 && !inside(p.boxAcross, p.boxUp, p.boxWidth, p.boxHeight)) {
      faults.push({ key: 'boxAcross', message: 'Pedal-box opening must lie within the sheet.' });
    }
    return faults;
  },
  build: (p) => {
    const patch = (y: number, z: number, wide: number, high: number): Patch => ({
      y: [y - wide / 2, y + wide / 2],
      z: [z - high / 2, z + high / 2],
    });
    const openings: Patch[] = [
      ...(p.columnOpening >= 1 ? [patch(p.columnAcross, p.columnUp, p.columnOpening, p.columnOpening)] : []),
      ...(p.boxWidth >= 1 ? [patch(p.boxAcross, p.boxUp, p.boxWidth, p.boxHeight)] : []),
    ];
    const whole: Patch = { y: [-p.width / 2, p.width / 2], z: [0, p.height] };
    const solids: Solid[] = [
      ...panel('sheet', 'Sheet', p.thickness, whole, openings),
      box('top-flange', 'Top flange', [18, p.width, p.thickness], [9, 0, p.height - p.thickness / 2]),
    ];
    if (p.swages === 'yes') {
      // a swage gives way to an opening
      const clear = (y: number): boolean => openings.every((o) => y + 14 < o.y[0] || y - 14 > o.y[1]);
      const count = Math.max(2, Math.floor(p.width / 160));
      for (let i = 0; i < count; i += 1) {
        const y = ((i + 0.5) / count - 0.5) * p.width;
        if (clear(y)) {
          const at: Vec3 = [-p.thickness - SWAGE / 2, y, p.height * 0.5];
          solids.push(box(`swage-${i + 1}`, 'Swage', [SWAGE, 20, p.height * 0.8], at));
        }
      }
    }
    const holes: Hole[] =
      p.columnOpening >= 1
        ? [{ id: 'column', at: [0, p.columnAcross, p.columnUp], axis: [1, 0, 0], diameter: p.columnOpening }]
        : [];
    const turned = placed(solids, { turn: [0, p.rake, 0] });
    return { solids: turned, motions: [], holes: placedHoles(holes, p.rake) };
  },
});

/** Holes turned with the sheet. */
function placedHoles(holes: readonly Hole[], rake: number): Hole[] {
  const frame = rigidFromPose([0, 0, 0], [0, rake, 0]);
  return holes.map((hole) => ({
    ...hole,
    at: roundVec(applyRigid(frame, hole.at)),
    axis: turnByRigid(frame, hole.axis),
  }));
}
