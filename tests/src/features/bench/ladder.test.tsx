// @vitest-environment happy-dom
import { act, cleanup, fireEvent, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { Finding } from '#shared/check';
import { worldPose } from '#shared/scene';
import { Ladder } from '../../../../src/features/bench/ladder/ladder';
import { GapList } from '../../../../src/features/bench/ladder/gap-list';
import { CheckPhase } from '../../../../src/features/bench/ladder/check-phase';
import { finding, mount, testBench, type TestBench } from './support';

const setFindings = (bench: TestBench, findings: readonly Finding[]): void =>
  act(() => (bench.live as unknown as { setState: (s: object) => void }).setState({ findings }));

beforeEach(() => {
  // a page that is not laid out has no sizes
  vi.spyOn(HTMLElement.prototype, 'clientHeight', 'get').mockReturnValue(600);
  vi.spyOn(HTMLElement.prototype, 'clientWidth', 'get').mockReturnValue(340);
});
afterEach(() => {
  cleanup();
  vi.restoreAllMocks();
});

const STROKE = { component: 'brake-pedal', motion: 'stroke' };
const arm = finding('brake-pedal', 'column', 'hits', {
  motions: [STROKE],
  hitSpans: [[0.41, 0.43]],
  tightSpans: [[0.3, 0.6]],
  at: {
    positions: [0.42],
    points: [
      [0, 0, 0],
      [0, 0, 0],
    ],
    solids: ['body', 'body'],
  },
  overlap: { volume: null, pushOut: { vector: [6, 0, 0], length: 6 } },
});
const wiper = finding('firewall', 'wiper', 'tight', { gap: 6, margin: -4 });
const roomy = finding('floor', 'wiper', 'clears', { gap: 500, margin: 490 });
const joint = finding('floor', 'column', 'seated', { gap: 0, required: 0 });

describe('the gap ladder', () => {
  it('names each pair with its reading, mark and word; joints and what has room stand apart', () => {
    mount(testBench({ findings: [arm, wiper, roomy, joint] }), <Ladder />);
    const rungs = screen.getAllByRole('button', { expanded: false }).map((b) => b.textContent);
    expect(rungs).toHaveLength(2);
    expect(rungs[0]).toContain('Firewall, Wiper');
    expect(rungs[0]).toContain('tight');
    expect(rungs[0]).toContain('7/32');
    expect(rungs[1]).toContain('Brake pedal, Column');
    expect(rungs[1]).toContain('overlaps');
    expect(rungs[1]).toContain('1/4');
    expect(screen.getByText(/1 more with over/)).toBeDefined();
    expect(screen.getByText(/Geometry only/)).toBeDefined();
  });

  it('opens a finding: the stroke goes to where it is, its stretches stand on the strip', () => {
    const bench = testBench({ findings: [arm, wiper] });
    mount(bench, <Ladder />);
    fireEvent.click(screen.getByRole('button', { name: /Brake pedal, Column/ }));
    expect(bench.session.getState().positions).toEqual({ 'brake-pedal.stroke': 0.42 });
    const strip = screen.getByRole<HTMLInputElement>('slider', { name: 'Brake stroke' });
    expect(strip.value).toBe('210');
    expect(document.querySelectorAll('.strip-hits')).toHaveLength(1);
    expect(document.querySelectorAll('.strip-tight')).toHaveLength(1);
    expect(screen.getByText('hits from 41 % to 43 %, tight from 30 % to 60 %')).toBeDefined();
    fireEvent.click(screen.getByRole('button', { name: 'Close the finding' }));
    expect(bench.session.getState().positions).toEqual({});
  });

  it('moves on with the live check while a finding is open', () => {
    const bench = testBench({ findings: [wiper] });
    mount(bench, <Ladder />);
    fireEvent.click(screen.getByRole('button', { name: /Firewall, Wiper/ }));
    setFindings(bench, [{ ...wiper, verdict: 'clears', gap: 30, gapAtLeast: 30, margin: 20 }]);
    expect(screen.getByRole('region', { name: 'Finding: Firewall, Wiper' }).textContent).toContain('to spare');
  });

  it('goes by arrow keys from rung to rung', () => {
    mount(testBench({ findings: [arm, wiper] }), <Ladder />);
    const [first, second] = screen.getAllByRole('button', { expanded: false });
    first!.focus();
    fireEvent.keyDown(first!, { key: 'ArrowDown' });
    expect(document.activeElement).toBe(second);
    fireEvent.keyDown(second!, { key: 'ArrowUp' });
    expect(document.activeElement).toBe(first);
  });

  it('stays whole with forty that are wrong: small labels, none lost without a word', () => {
    const many = Array.from({ length: 40 }, (_, i) =>
      finding(`arm-${String(i).padStart(2, '0')}`, 'column', 'tight', { gap: 4, margin: -6 - i / 10 }),
    );
    mount(testBench({ findings: many }), <Ladder />);
    const rungs = document.querySelectorAll('.rung');
    expect(rungs.length).toBe(33);
    expect([...rungs].every((r) => r.classList.contains('rung-dense'))).toBe(true);
    expect(screen.getByText('7 unlabelled')).toBeDefined();
  });

  it('says that there is nothing to compare yet', () => {
    mount(testBench(), <Ladder />);
    expect(screen.getByText(/No two parts to compare yet/)).toBeDefined();
  });
});

describe('what would change it', () => {
  function openArm() {
    const bench = testBench({ findings: [arm] });
    mount(bench, <Ladder />);
    fireEvent.click(screen.getByRole('button', { name: /Brake pedal, Column/ }));
    return bench;
  }
  const groupX = (bench: TestBench): number => bench.open.getState().scene.groups[0]!.pose.at![0];

  it('is tried on the bench before it is made, and stays to be taken back though it frees the pair', () => {
    const bench = openArm();
    fireEvent.click(screen.getByRole('button', { name: 'Try it' }));
    expect(bench.open.getState().preview?.groups[0]!.pose.at?.[0]).toBeCloseTo(106);
    expect(bench.open.getState().undoLabel).toBeNull();
    setFindings(bench, [{ ...arm, verdict: 'clears', overlap: null, gap: 12, gapAtLeast: 12, margin: 2 }]);
    fireEvent.click(screen.getByRole('button', { name: 'Put it back' }));
    expect(bench.open.getState().preview).toBeNull();
    expect(groupX(bench)).toBe(100);
  });

  it('moves once, the whole group, under one name', () => {
    const bench = openArm();
    fireEvent.click(screen.getByRole('button', { name: 'Try it' }));
    fireEvent.click(screen.getByRole('button', { name: 'Move it there' }));
    expect(bench.open.getState().preview).toBeNull();
    expect(groupX(bench)).toBeCloseTo(106);
    expect(bench.open.getState().undoLabel).toBe('Move Pedal box');
    const { scene } = bench.open.getState();
    expect(
      worldPose(
        scene,
        scene.components.find((c) => c.id === 'brake-pedal')!,
      )[3],
    ).toBeCloseTo(106);
  });

  it('leaves no trial behind when the finding is closed', () => {
    const bench = openArm();
    fireEvent.click(screen.getByRole('button', { name: 'Try it' }));
    fireEvent.click(screen.getByRole('button', { name: 'Close the finding' }));
    expect(bench.open.getState().preview).toBeNull();
  });
});

describe('the list of all gaps', () => {
  it('shows everything, or one verdict, and opens what is chosen', () => {
    const bench = testBench({ findings: [arm, wiper, roomy, joint] });
    bench.session.getState().set({ sheet: 'gaps' });
    mount(bench, <GapList />);
    expect(screen.getAllByRole('listitem')).toHaveLength(4);
    fireEvent.click(screen.getByRole('button', { name: /1 ?tight/ }));
    expect(screen.getAllByRole('listitem')).toHaveLength(1);
    fireEvent.click(screen.getByRole('button', { name: /Firewall, Wiper/ }));
    expect(bench.session.getState()).toMatchObject({ sheet: null, finding: 'firewall|wiper|' });
  });
});

describe('the check', () => {
  it.each([
    [{ phase: 'reading-meshes' }, 'reading meshes'],
    [{ phase: 'checking', done: 12, total: 40 }, 'checking 12 of 40'],
    [{ phase: 'done' }, 'live'],
    [{ phase: 'failed', problem: 'The check ran out of memory.' }, 'The check ran out of memory.'],
  ])('says what it is doing: %o', (state, text) => {
    const bench = testBench();
    (bench.live as unknown as { setState: (s: object) => void }).setState(state);
    mount(bench, <CheckPhase />);
    expect(screen.getByText(text)).toBeDefined();
  });
});
