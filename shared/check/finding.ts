// One finding: the gap of one pair in one configuration, its verdict, where on the stroke, and how to free it.
import {
  CONTACT,
  displacementAt,
  roundingOf,
  STILL,
  type Gap,
  type GapMeter,
  type Placed,
  type Settled,
  type Side,
} from '#shared/geometry';
import { composeRigid } from '#shared/units';
import { insideSheet } from './inside-sheet';
import type { Task, TaskSide } from './plan';
import type { Prepared } from './prepare';
import { findPushOut, type PushOut } from './push-out';
import type { Finding, Overlap, Span, Verdict } from './report';
import { spansBelow } from './spans';

/** A joint with this much room between its parts is loose, mm. */
const LOOSE = 0.5;

function sideOf(side: TaskSide): Side {
  return {
    solids: side.solids.map((i) => side.component.solids[i]!),
    path: side.motion === null ? STILL : side.motion.path,
  };
}

/**
 * Tells when the bounds are close enough: within the accuracy, and within a twentieth of `touch` as long as a gap that
 * decides the verdict lies between them or hardly above. Below `touch` it goes on to tell contact from a hair's breadth.
 */
function settledFor(accuracy: number, touch: number, deciding: readonly number[], rounding: number): Settled {
  let patience = 4000;
  return (lowerBound, upper) => {
    if (upper <= CONTACT) return true;
    const lower = Math.max(0, lowerBound - rounding);
    const width = upper - lower;
    if (width > accuracy) return false;
    if (upper < touch && lower === 0) {
      patience -= 1;
      return patience < 0;
    }
    // half of what is allowed, so that a gap which is exactly the required one, give or take its rounding, clears
    return width <= touch / 20 || !deciding.some((t) => lower <= t && t <= upper + touch / 10);
  };
}

interface Measured {
  readonly gap: number;
  readonly gapAtLeast: number;
  readonly at: Gap;
}

function measure(meter: GapMeter, a: Side, b: Side, settled: Settled, rounding: number): Measured {
  const at = meter.measure(a, b, settled);
  if (at.upper <= CONTACT) return { gap: 0, gapAtLeast: 0, at };
  const gapAtLeast = Math.max(0, Math.min(at.lower, at.upper) - rounding);
  return { gap: at.upper, gapAtLeast: gapAtLeast < CONTACT ? 0 : gapAtLeast, at };
}

/** The solids of a side where they are at a position of its motion. */
function placedAt(side: Side, position: number): Placed[] {
  const move = displacementAt(side.path, position);
  return side.solids.map((s) => ({ shape: s.shape, pose: composeRigid(move, s.pose) }));
}

type Positions = readonly [number, number];

/** Positions at which a hit is looked at for its longest push-out. */
function positionsToTry(at: Gap, a: Side, b: Side, spans: readonly Span[] | null): Positions[] {
  const tries: Positions[] = [at.positions];
  const movesA = a.path.steps.length > 0;
  const movesB = b.path.steps.length > 0;
  if (movesA && movesB) {
    for (const s of [0, 0.5, 1]) for (const t of [0, 0.5, 1]) tries.push([s, t]);
  } else {
    for (const [from, to] of spans ?? []) {
      // where a hit begins or ends within the stroke there is hardly any overlap
      const ends = [from, to].filter((p) => p === 0 || p === 1);
      for (const p of [from + (to - from) / 2, ...ends]) tries.push(movesA ? [p, 0] : [0, p]);
    }
  }
  return tries;
}

interface Freed {
  readonly pushOut: PushOut;
  readonly at: Gap;
}

/** The push-out of a hit, at the position where the longest was found. */
function freed(
  meter: GapMeter,
  a: Side,
  b: Side,
  m: Measured,
  spans: readonly Span[] | null,
  prepared: Prepared,
): Freed {
  const { touch } = prepared.scene.rules;
  let best: Freed | null = null;
  for (const positions of positionsToTry(m.at, a, b, spans)) {
    const still = [placedAt(a, positions[0]), placedAt(b, positions[1])] as const;
    const here: Gap =
      best === null
        ? m.at
        : meter.measure(
            { solids: still[0], path: STILL },
            { solids: still[1], path: STILL },
            (lower, upper) => upper <= CONTACT || lower > CONTACT,
          );
    // with real overlap somewhere, a position of mere closeness is no place to show it from
    if (best !== null && here.upper > CONTACT) continue;
    const apart = here.points[0].map((x, k) => x - here.points[1][k]!) as [number, number, number];
    const length = Math.sqrt(apart[0] * apart[0] + apart[1] * apart[1] + apart[2] * apart[2]);
    const contact = length > 0 ? ([apart[0] / length, apart[1] / length, apart[2] / length] as const) : null;
    const pushOut = findPushOut(meter, still[0], still[1], touch, prepared.largest, contact);
    if (best === null || pushOut.length > best.pushOut.length) best = { pushOut, at: { ...here, positions } };
    if (m.gap > 0) break;
  }
  return best!;
}

function verdictOf(m: Measured, margin: number, touch: number): Verdict {
  if (m.gapAtLeast < touch) return 'hits';
  return margin < -touch / 10 ? 'tight' : 'clears';
}

function jointVerdict(m: Measured, pushOut: PushOut | null, allow: number, touch: number): Verdict {
  if (pushOut !== null) return pushOut.length <= allow + 2 * touch ? 'seated' : 'hits';
  return m.gap < LOOSE - CONTACT ? 'seated' : 'loose';
}

/** Works out one finding. Depends on nothing but the task and the scene it belongs to. */
export function computeFinding(prepared: Prepared, task: Task, meter: GapMeter): Finding {
  const { rules, accuracy } = prepared.scene;
  const { touch } = rules;
  const { decision } = task;
  const rounding = roundingOf(4 * prepared.largest + 40_000);
  const a = sideOf(task.a);
  const b = sideOf(task.b);
  const tolerances = task.a.component.component.tolerance + task.b.component.component.tolerance;
  const joint = decision.allow !== null;
  const deciding = joint ? [LOOSE] : [touch, decision.required + tolerances];
  const m = measure(meter, a, b, settledFor(accuracy, touch, deciding, rounding), rounding);
  const margin = m.gapAtLeast - tolerances - decision.required;
  let verdict = verdictOf(m, margin, touch);
  const motions = [task.a, task.b].flatMap((s) =>
    s.motion === null ? [] : [{ component: s.motion.component, motion: s.motion.motion.id }],
  );
  let hitSpans: Span[] | null = [];
  let tightSpans: Span[] | null = [];
  if (motions.length === 2) {
    hitSpans = verdict === 'hits' ? null : [];
    tightSpans = verdict === 'hits' || verdict === 'tight' ? null : [];
  } else if (motions.length === 1) {
    const moving = task.a.motion !== null ? 'a' : 'b';
    const ask = (limit: number): Span[] => {
      const spans = spansBelow({ meter, a, b, moving, limit, slack: touch / 10, accuracy, largest: prepared.largest });
      if (spans.length > 0 || m.gapAtLeast >= limit) return spans;
      // so little below the limit that no stretch was: the place itself
      const p = m.at.positions[moving === 'a' ? 0 : 1];
      return [[p, p]];
    };
    if (verdict === 'hits') hitSpans = ask(touch);
    if (verdict === 'hits' || verdict === 'tight') tightSpans = ask(decision.required + tolerances);
  }
  let overlap: Overlap | null = null;
  let at = m.at;
  if (joint ? m.gap === 0 : verdict === 'hits') {
    const free = freed(meter, a, b, m, hitSpans, prepared);
    overlap = { volume: null, pushOut: free.pushOut };
    at = free.at;
  }
  if (joint) verdict = jointVerdict(m, overlap?.pushOut ?? null, decision.allow ?? 0, touch);
  const positions = [task.a, task.b].flatMap((s, i) => (s.motion === null ? [] : [at.positions[i as 0 | 1]]));
  const sheet = insideSheet(placedAt(a, at.positions[0]), placedAt(b, at.positions[1]));
  return {
    between: [task.a.component.component.id, task.b.component.component.id],
    motions,
    verdict,
    required: decision.required,
    rule: decision.kind,
    gap: m.gap,
    gapAtLeast: m.gapAtLeast,
    margin,
    at: {
      positions,
      points: at.points,
      solids: [idOf(task.a, at.solids[0]), idOf(task.b, at.solids[1])],
    },
    ...(sheet ? { insideSheet: true as const } : {}),
    hitSpans,
    tightSpans,
    overlap,
  };
}

function idOf(side: TaskSide, index: number): string {
  return side.component.solidIds[side.solids[index]!]!;
}
