// A header: four primaries from the head down into a collector.
import type { Solid, Vec3 } from '#shared/scene';
import { BY_EYE, choice, defineRecipe, length } from './define';
import { bent, box, pipe, rod } from './solids';

const PRIMARIES = 4;

export const exhaustHeader = defineRecipe({
  kind: 'exhaust-header',
  name: 'Exhaust header',
  ukName: 'Exhaust manifold',
  category: 'exhaust',
  about: 'Flange, four primary tubes and the collector, with the pipe leading rearward under the floor.',
  frame: 'Origin in the middle of the flange’s face on the head. The tubes leave to one side and fall rearward (+X).',
  params: {
    side: choice('Leaves', { left: 'to the left', right: 'to the right' }, 'right', ''),
    portSpacing: length('Port spacing', [70, 110, 150], '', BY_EYE),
    tubeDiameter: length('Tube diameter', [30, 42, 60], '', BY_EYE),
    reach: length('Reach', [50, 95, 250], 'How far the tubes come out from the head.', BY_EYE),
    drop: length('Drop', [120, 330, 600], 'Flange down to the collector.', BY_EYE),
    collectorBehind: length('Collector behind middle', [-100, 240, 700], '', BY_EYE),
    collectorDiameter: length('Collector diameter', [50, 80, 110], '', BY_EYE),
    tail: length('Pipe behind collector', [0, 300, 1200], '', BY_EYE),
  },
  build: (p) => {
    const way = p.side === 'left' ? -1 : 1;
    const out = (x: number, y: number, z: number): Vec3 => [x, way * y, z];
    const end = p.collectorBehind;
    const solids: Solid[] = [
      box('flange', 'Flange', [p.portSpacing * PRIMARIES, 10, p.tubeDiameter + 30], out(0, 5, 0)),
    ];
    for (let i = 0; i < PRIMARIES; i += 1) {
      const x = (i - (PRIMARIES - 1) / 2) * p.portSpacing;
      const up = i % 2 === 0 ? 1 : -1;
      const line = bent(
        [
          out(x, 8, 0),
          out(x, p.reach, 0),
          out(end - 120, p.reach + up * 8, -p.drop * 0.75),
          out(end, p.reach, -p.drop + up * p.collectorDiameter * 0.2),
        ],
        p.tubeDiameter * 0.9,
        2,
      );
      solids.push(...pipe(`primary-${i + 1}`, 'Primary tube', p.tubeDiameter, line));
    }
    solids.push(
      rod(
        'collector',
        'Collector',
        p.collectorDiameter,
        out(end - 20, p.reach, -p.drop),
        out(end + 120, p.reach, -p.drop),
      ),
    );
    if (p.tail >= 1) {
      solids.push(
        rod(
          'tail',
          'Exhaust pipe',
          p.collectorDiameter * 0.75,
          out(end + 120, p.reach, -p.drop),
          out(end + 120 + p.tail, p.reach, -p.drop),
        ),
      );
    }
    return { solids, motions: [], holes: [] };
  },
});
