// The gap ladder: every pair that matters on one steel rule, by how much more room it has than it needs.
import { useCallback, useMemo, useRef } from 'react';
import { useBench, useFacts, useLive, useOpen, useSession } from '../bench-model';
import { pairName } from '../../../lib/finding-words';
import { openFinding } from '../open-finding';
import { useElementSize } from '../use-element-size';
import { QuietLine } from './quiet-line';
import { RungLabel } from './rung-label';
import { LABEL_HEIGHT, labelForm, type LabelForm } from './label-form';
import { isJoint, labelledOf, pairRungs, type Rung } from './rungs';
import { spreadLabels } from './spread';
import { RULE_WIDTH, SteelRule } from './steel-rule';
import { useLadder } from './use-ladder';

const LEADER = 30;

export function GapLadder() {
  const box = useRef<HTMLDivElement>(null);
  const { width, height } = useElementSize(box);
  return (
    <div className="ladder-rule" ref={box}>
      {height > 0 && <Rungs width={width} height={height} />}
    </div>
  );
}

/** Another finding of the same pair may be the open one. */
const isOfPair = (open: string | null, { finding }: Rung): boolean =>
  open?.startsWith(`${finding.between.join('|')}|`) === true;

interface RungsProps {
  readonly width: number;
  readonly height: number;
}

function Rungs({ width, height }: RungsProps) {
  const bench = useBench();
  const { display } = useFacts();
  const scene = useOpen((o) => o.scene);
  const open = useSession((s) => s.finding);
  const hovered = useSession((s) => s.hoveredFinding);
  const phase = useLive((live) => live.phase);
  const findings = useLive((live) => live.findings);
  const room = width - RULE_WIDTH - LEADER;
  const all = useMemo(() => pairRungs(findings), [findings]);
  const roomy = useCallback(
    (rung: Rung): LabelForm => labelForm(pairName(scene, rung.finding), rung.finding, display, room),
    [scene, display, room],
  );
  const isDense = useMemo(() => {
    const bad = all.filter((r) => r.finding.verdict !== 'clears' && !isJoint(r));
    return bad.reduce((sum, r) => sum + LABEL_HEIGHT[roomy(r)], 0) > height;
  }, [all, roomy, height]);
  const formOf = useCallback((rung: Rung): LabelForm => (isDense ? 'dense' : roomy(rung)), [isDense, roomy]);
  const heightOf = useCallback((rung: Rung): number => LABEL_HEIGHT[formOf(rung)], [formOf]);
  const fits = useCallback(
    (shown: readonly Rung[]): boolean => shown.reduce((sum, r) => sum + heightOf(r), 0) <= height,
    [heightOf, height],
  );
  const { ladder, span } = useLadder(all, fits);
  const rungs = ladder.rungs;
  const list = useRef<HTMLUListElement>(null);
  const perMm = height / (span.top - span.bottom);
  const y = (mm: number): number => (span.top - Math.max(span.bottom, Math.min(span.top, mm))) * perMm;
  const labelled = labelledOf(rungs, heightOf, height).reverse();
  const unlabelled = rungs.filter((r) => !labelled.includes(r));
  const heights = labelled.map(heightOf);
  const middles = spreadLabels(
    labelled.map((r, i) => ({ at: y(r.height), height: heights[i]! })),
    height,
  );
  const step = (by: number): void => {
    const buttons = [...(list.current?.querySelectorAll<HTMLButtonElement>('button') ?? [])];
    const at = buttons.findIndex((b) => b === document.activeElement);
    buttons[Math.max(0, Math.min(buttons.length - 1, at + by))]?.focus();
  };
  return (
    <>
      <div className="ladder-above">
        <QuietLine ladder={ladder} span={span} unlabelled={unlabelled.length} />
      </div>
      <SteelRule span={span} height={height} display={display} />
      <svg className="ladder-leaders" width={width} height={height} aria-hidden="true">
        <path d={`M0 ${y(0)}H${RULE_WIDTH + LEADER - 10}`} className="ladder-zero" />
        {unlabelled.map((r) => (
          <path
            key={r.key}
            d={`M${RULE_WIDTH - 6} ${y(r.height)}h10`}
            stroke={`var(--${r.finding.verdict})`}
            strokeWidth={2}
          />
        ))}
        {labelled.map((r, i) => {
          const from = y(r.height);
          const isLit = isOfPair(open, r) || r.key === hovered;
          return (
            <path
              key={r.key}
              d={`M${RULE_WIDTH - 12} ${from}h18L${RULE_WIDTH + LEADER - 8} ${middles[i]}h6`}
              fill="none"
              stroke={`var(--${r.finding.verdict})`}
              strokeWidth={isLit ? 3 : 2}
              opacity={isLit ? 1 : 0.8}
            />
          );
        })}
      </svg>
      <ul
        className="ladder-labels"
        ref={list}
        aria-label="Gaps, from the roomiest to the worst"
        aria-busy={phase !== 'done'}
        onKeyDown={(event) => {
          if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
          event.preventDefault();
          event.stopPropagation();
          step(event.key === 'ArrowDown' ? 1 : -1);
        }}
      >
        {labelled.map((r, i) => (
          <li key={r.key} style={{ transform: `translateY(${(middles[i]! - heights[i]! / 2).toFixed(1)}px)` }}>
            <RungLabel
              rung={r}
              scene={scene}
              isOpen={isOfPair(open, r)}
              isPinned={r.height < span.bottom}
              form={formOf(r)}
              onOpen={() => openFinding(bench, r.finding)}
              onPoint={(isOver) => bench.session.getState().set({ hoveredFinding: isOver ? r.key : null })}
            />
          </li>
        ))}
      </ul>
    </>
  );
}
