// The demo: its files are what its numbers make, and its three scenes show what they are there to show.
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, test } from 'vitest';
import { checkScene, planCheck, type Finding, type Prepared, type Report } from '#shared/check';
import { displacementAt, GapMeter, STILL } from '#shared/geometry';
import { looseBoxes, missingFrom, rollCall, type RollCallKey } from '#shared/review';
import { composeRigid } from '#shared/units';
import { demoFiles } from '../../server/cli/demo/files';
import { DEMO_PROJECT } from '../../server/cli/demo/scenes';
import { readyScene } from '../bench/demo-scene';

const FOLDER = path.resolve(import.meta.dirname, '../../assets/demo');
const [CLEAR = '', CONFLICTS = '', UNDER_WAY = ''] = DEMO_PROJECT.scenes;
const ABSENT = DEMO_PROJECT.notOnThisCar as unknown as readonly RollCallKey[];

const checked = (file: string): { prepared: Prepared; report: Report } => {
  const scene = readyScene(file);
  return { prepared: scene.prepared, report: checkScene(scene.prepared, scene.sha256) };
};
const named = (f: Finding): string =>
  `${f.between.join(' + ')}: ${f.motions.map((m) => m.motion).join(', ') || 'rest'}`;
const trouble = (report: Report): Finding[] =>
  report.findings.filter((f) => f.verdict === 'hits' || f.verdict === 'tight' || f.verdict === 'loose');

test('the files of the demo are what `npm run assets` makes', () => {
  for (const [name, bytes] of demoFiles()) {
    expect(Buffer.from(bytes).equals(readFileSync(path.join(FOLDER, name))), name).toBe(true);
  }
});

describe('the clear scene', () => {
  const { prepared, report } = checked(CLEAR);

  test('has nothing that hits, is tight or loose', () => {
    expect(trouble(report).map(named)).toEqual([]);
    expect(report.totals.seated).toBeGreaterThan(10);
  });

  test('has its roll-call complete and its pedal box on both planes', () => {
    expect(missingFrom(rollCall(prepared.scene, ABSENT))).toEqual([]);
    expect(looseBoxes(prepared.scene)).toEqual([]);
  });
});

describe('the scene with conflicts', () => {
  const { prepared, report } = checked(CONFLICTS);
  const of = (name: string): Finding => report.findings.find((f) => named(f) === name)!;

  test('has the five conflicts and no other', () => {
    expect(trouble(report).map(named).sort()).toEqual([
      'brake-pedal + column: stroke',
      'brake-reservoir + liner-right: cap-off',
      'clutch-cylinder + engine: draw-out',
      'clutch-cylinder + engine: rest',
      'clutch-pedal + harness-clip: stroke',
      'cowl-brace + wiper: turn',
    ]);
    expect(report.totals.tight + report.totals.loose).toBe(0);
  });

  test('the brake arm meets the steering joint in mid-stroke, free at both ends', () => {
    const spans = of('brake-pedal + column: stroke').hitSpans!;
    expect(spans).toHaveLength(1);
    expect(spans[0]![0]).toBeGreaterThan(0.1);
    expect(spans[0]![1]).toBeLessThan(0.9);
  });

  test('samples every 5 degrees miss the thin clip that the clutch pedal meets', () => {
    const found = of('clutch-pedal + harness-clip: stroke');
    expect(found.verdict).toBe('hits');
    const task = planCheck(prepared).tasks.find(
      (t) =>
        t.a.component.component.id === 'clutch-pedal' &&
        t.b.component.component.id === 'harness-clip' &&
        t.a.motion !== null,
    )!;
    const { path: way, motion } = task.a.motion!;
    const step = motion.steps[0]!;
    const degrees = step.kind === 'swing' ? step.to : 0;
    const meter = new GapMeter();
    for (let at = 0; at <= degrees; at += 5) {
      const move = displacementAt(way, at / degrees);
      const solids = task.a.component.solids.map((s) => ({ shape: s.shape, pose: composeRigid(move, s.pose) }));
      const gap = meter.measure(
        { solids, path: STILL },
        { solids: task.b.component.solids, path: STILL },
        (lower, upper) => upper - lower < 0.01,
      );
      expect(gap.upper, `at ${at} degrees`).toBeGreaterThan(0.5);
    }
    const [[from, to] = [0, 0]] = found.hitSpans!;
    expect((to - from) * degrees).toBeLessThan(5);
  });
});

test('the scene under way misses heater, hood and exhaust, and its box hangs on the firewall alone', () => {
  const { prepared } = checked(UNDER_WAY);
  expect(missingFrom(rollCall(prepared.scene, ABSENT)).map((e) => e.key)).toEqual(['heater', 'hood', 'exhaust']);
  expect(looseBoxes(prepared.scene).map((box) => box.lacks)).toEqual([['cowl']]);
});
