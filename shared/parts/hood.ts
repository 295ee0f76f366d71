// A hood: skin, ribs underneath, and its swing about the hinges at the cowl.
import type { Motion, Solid } from '#shared/scene';
import { angle, BY_EYE, defineRecipe, length, MEMORY } from './define';
import { bar, box, cylinder, placed } from './solids';

export const hood = defineRecipe({
  kind: 'hood',
  name: 'Hood',
  ukName: 'Bonnet',
  category: 'hood',
  about: 'Skin with its inner frame, hinged behind, swinging up over everything in the engine bay.',
  frame: 'Origin in the middle of the hinge axis. The hood reaches forward (-X); its rear lip lies behind the hinges.',
  params: {
    width: length('Width', [400, 1250, 1800], 'Across the car.', BY_EYE),
    lengthAhead: length('Length ahead of hinge', [300, 1000, 1600], 'Hinge axis to the front edge.', BY_EYE),
    lipBehind: length('Lip behind hinge', [0, 60, 150], 'It dips as the hood opens.', MEMORY),
    skinAbove: length('Skin above hinge', [0, 40, 150], 'Hinge axis to the underside of the skin, shut.', BY_EYE),
    frameDepth: length('Frame depth', [5, 22, 60], 'How far the inner frame hangs below the skin.', BY_EYE),
    fall: angle('Fall to the front', [0, 3, 15], 'The front edge is lower.', BY_EYE),
    opens: angle('Opens by', [10, 50, 95], 'Swing from shut to fully open.', MEMORY),
  },
  build: (p) => {
    const whole = p.lengthAhead + p.lipBehind;
    const middle = (p.lipBehind - p.lengthAhead) / 2;
    const skin = 1;
    const under = p.skinAbove - p.frameDepth / 2;
    const rib = 40;
    const level: Solid[] = [
      box('skin', 'Skin', [whole, p.width, skin], [middle, 0, p.skinAbove + skin / 2]),
      ...[-1, 1].map((side) =>
        box(
          `rail-${side < 0 ? 1 : 2}`,
          'Side frame',
          [whole - 40, rib, p.frameDepth],
          [middle, side * (p.width / 2 - 40), under],
        ),
      ),
      box('rail-front', 'Front frame', [rib, p.width - 80, p.frameDepth], [-p.lengthAhead + 40, 0, under]),
      box('rail-rear', 'Rear frame', [rib, p.width - 80, p.frameDepth], [-50, 0, under]),
      ...[-1, 1].map((side) =>
        bar(
          `brace-${side < 0 ? 1 : 2}`,
          'Diagonal frame',
          { wide: rib * 0.7, thick: p.frameDepth * 0.8, flat: [0, 0, 1] },
          [-p.lengthAhead + 60, side * 40, under],
          [-70, side * (p.width / 2 - 70), under],
        ),
      ),
      ...[-1, 1].map((side) =>
        cylinder(`hinge-${side < 0 ? 1 : 2}`, 'Hinge', 16, 40, [0, side * (p.width / 2 - 60), 0], 'y'),
      ),
    ];
    const solids = placed(level, { turn: [0, -p.fall, 0] });
    const opens: Motion = {
      id: 'open',
      name: 'Open the hood',
      use: 'service',
      steps: [{ kind: 'swing', point: [0, 0, 0], axis: [0, 1, 0], from: 0, to: p.opens }],
    };
    return { solids, motions: [opens], holes: [] };
  },
});
