// A single hydraulic cylinder with a remote reservoir, as it is bolted to the engine side of a firewall.
import type { Hole, Motion, Solid, Vec3 } from '#shared/scene';
import { BY_EYE, choice, defineRecipe, length, MEMORY } from './define';
import { add, box, cylinder, hex, rod } from './solids';

const FLANGE = 9;

export const masterCylinder = defineRecipe({
  kind: 'master-cylinder',
  name: 'Master cylinder',
  category: 'master-cylinder',
  about:
    'Single cylinder with flange, stepped barrel, reservoir port, boot and push rod, and its draw-out for service.',
  frame: 'Origin in the middle of the flange’s rear face, which sits on the firewall. The nose looks forward (-X).',
  params: {
    bodyLength: length('Flange to nose', [80, 140, 280], 'From the firewall to the foremost point.', MEMORY),
    bodyDiameter: length('Barrel diameter', [25, 38, 60], 'At its thickest.', MEMORY),
    boltSpacing: length('Flange bolts', [40, 57, 100], 'From bolt to bolt.', MEMORY),
    bolts: choice(
      'Bolts stand',
      { upright: 'one above the other', across: 'side by side' },
      'upright',
      'How the flange is turned.',
    ),
    rodLength: length('Push rod from flange', [30, 120, 220], 'From the flange’s rear face to the rod’s end.', MEMORY),
    rodDiameter: length('Push rod diameter', [6, 8, 14], '', MEMORY),
    bootDiameter: length('Boot diameter', [14, 30, 50], 'Of what goes through the firewall.', BY_EYE),
    portAhead: length('Reservoir port ahead of flange', [20, 48, 200], 'Middle of the port.', BY_EYE),
    outlet: choice(
      'Outlet',
      { left: 'to the left', right: 'to the right', up: 'upwards' },
      'up',
      'Where the pressure line leaves, near the nose.',
    ),
    drawOut: length(
      'Draw-out',
      [20, 60, 250],
      'How far it is pulled forward to come off: 40 to 60 with the rod unpinned first.',
      MEMORY,
    ),
  },
  faults: (p) => {
    const faults = [];
    if (p.portAhead + 14 > p.bodyLength * 0.62) {
      faults.push({
        key: 'portAhead',
        message: 'Reservoir port must sit on the thick part of the barrel, in its rear half.',
      });
    }
    if (p.boltSpacing < p.bodyDiameter + 12) {
      faults.push({
        key: 'boltSpacing',
        message: 'Flange bolts would stand in the barrel; they must be 12 mm further apart than it is thick.',
      });
    }
    if (p.rodDiameter + 4 > p.bootDiameter) {
      faults.push({ key: 'bootDiameter', message: 'Boot diameter must be at least 4 mm more than the push rod’s.' });
    }
    return faults;
  },
  build: (p) => {
    const half = p.boltSpacing / 2;
    const bolts: Vec3[] =
      p.bolts === 'upright'
        ? [
            [0, 0, half],
            [0, 0, -half],
          ]
        : [
            [0, half, 0],
            [0, -half, 0],
          ];
    const web = p.bodyDiameter * 0.8;
    const d = p.bodyDiameter;
    const thickEnd = p.bodyLength * 0.64;
    const thinEnd = p.bodyLength - 10;
    const from = (x: number, y = 0, z = 0): Vec3 => [-x, y, z];
    const outletAt = from(p.bodyLength - 24);
    const way: Vec3 = p.outlet === 'up' ? [0, 0, 1] : [0, p.outlet === 'left' ? -1 : 1, 0];
    const out = (x: number): Vec3 => add(outletAt, [way[0] * x, way[1] * x, way[2] * x]);
    const port = from(p.portAhead, 0, 0);
    const top = d / 2;
    const solids: Solid[] = [
      box(
        'flange',
        'Flange',
        p.bolts === 'upright' ? [FLANGE, web, 2 * half] : [FLANGE, 2 * half, web],
        from(FLANGE / 2),
      ),
      ...bolts.flatMap((at, i) => [
        cylinder(`lug-${i + 1}`, 'Flange lug', 24, FLANGE, add(at, from(FLANGE / 2)), 'x'),
        ...hex(`nut-${i + 1}`, 'Flange nut', 13, 7, add(at, from(FLANGE + 3.5)), 'x'),
      ]),
      rod('barrel', 'Barrel', d, from(FLANGE - 1), from(thickEnd)),
      rod('collar', 'Barrel collar', d * 1.1, from(thickEnd - 8), from(thickEnd)),
      rod('nose', 'Barrel nose', d * 0.78, from(thickEnd), from(thinEnd)),
      ...hex('plug', 'End plug', d * 0.62, 10, from(p.bodyLength - 5), 'x'),
      rod('port', 'Reservoir port', 22, add(port, [0, 0, top - 5]), add(port, [0, 0, top + 9])),
      rod('barb', 'Hose barb', 10, add(port, [0, 0, top + 9]), add(port, [0, 0, top + 32])),
      rod('barb-ring-1', 'Hose barb', 12.5, add(port, [0, 0, top + 15]), add(port, [0, 0, top + 18])),
      rod('barb-ring-2', 'Hose barb', 12.5, add(port, [0, 0, top + 24]), add(port, [0, 0, top + 27])),
      rod('outlet', 'Outlet boss', 16, out(d * 0.3), out(d * 0.39 + 5)),
      rod('boot-1', 'Boot', p.bootDiameter, [-1, 0, 0], [10, 0, 0]),
      rod('boot-2', 'Boot', (p.bootDiameter * 2 + p.rodDiameter) / 3, [10, 0, 0], [18, 0, 0]),
      rod('boot-3', 'Boot', (p.bootDiameter + p.rodDiameter * 2) / 3, [18, 0, 0], [25, 0, 0]),
      rod('rod', 'Push rod', p.rodDiameter, [20, 0, 0], [p.rodLength, 0, 0]),
    ];
    const drawOut: Motion = {
      id: 'draw-out',
      name: 'Draw out',
      use: 'service',
      steps: [{ kind: 'slide', along: [-1, 0, 0], from: 0, to: p.drawOut }],
    };
    const axis: Vec3 = [1, 0, 0];
    const holes: Hole[] = [
      ...bolts.map((at, i) => ({ id: `bolt-${i + 1}`, at, axis, diameter: 9 })),
      { id: 'rod', at: [0, 0, 0], axis, diameter: p.bootDiameter + 2 },
    ];
    return { solids, motions: [drawOut], holes };
  },
});
