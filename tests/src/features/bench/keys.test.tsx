// @vitest-environment happy-dom
import { cleanup, fireEvent, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { KEYS, keyName, nudgeDirection } from '../../../../src/features/bench/keys/key-map';
import { useKeys } from '../../../../src/features/bench/keys/use-keys';
import { KeysSheet } from '../../../../src/features/bench/keys/keys-sheet';
import type { CameraHand } from '../../../../src/features/bench/viewport/view-control';
import type { View } from '../../../../src/features/bench/viewport/view';
import { finding, mount, testBench, type TestBench } from './support';

afterEach(cleanup);

function Keyed() {
  useKeys();
  return (
    <>
      <input aria-label="a field" />
      <input aria-label="a slider" type="range" />
      <button type="button">a button</button>
    </>
  );
}

function standIn(bench: TestBench, view: Partial<View>) {
  const whole: View = { target: [0, 0, 500], around: 180, above: 20, span: 900, isSquare: false, ...view };
  const hand = {
    standAt: vi.fn(),
    fit: vi.fn(),
    lookAt: vi.fn(),
    turn: vi.fn(),
    pan: vi.fn(),
    glide: vi.fn(),
    zoom: vi.fn(),
    hold: vi.fn(),
    view: () => whole,
    captureView: vi.fn(),
    captureFinding: vi.fn(),
  } satisfies Record<keyof CameraHand, unknown>;
  bench.view.attach(hand);
  return hand;
}

const press = (key: string, more: Partial<KeyboardEventInit> = {}, target: Element = document.body): void => {
  fireEvent.keyDown(target, { key, ...more });
};

const wiperAt = (bench: TestBench) => bench.open.getState().scene.components.find((c) => c.id === 'wiper')!.pose.at!;

describe('the table of keys', () => {
  it('names each press once', () => {
    const all = KEYS.flatMap((k) => k.keys);
    expect(new Set(all).size).toBe(all.length);
  });

  it('knows letters by case only where Shift is held, and Command as Ctrl', () => {
    const plain = { ctrlKey: false, metaKey: false, shiftKey: false, altKey: false };
    expect(keyName({ ...plain, key: 'H' })).toBe('h');
    expect(keyName({ ...plain, key: 'H', shiftKey: true })).toBe('Shift+H');
    expect(keyName({ ...plain, key: '?', shiftKey: true })).toBe('?');
    expect(keyName({ ...plain, key: 'z', metaKey: true })).toBe('Ctrl+z');
    expect(keyName({ ...plain, key: 'ArrowUp', shiftKey: true })).toBe('Shift+ArrowUp');
  });

  it('shows every key, and to those who only look none that changes anything', () => {
    const bench = testBench();
    bench.session.getState().set({ sheet: 'keys' });
    mount(bench, <KeysSheet />);
    for (const { what } of KEYS) expect(screen.getByText(what)).toBeDefined();
    cleanup();
    const reader = testBench({ canEdit: false });
    reader.session.getState().set({ sheet: 'keys' });
    mount(reader, <KeysSheet />);
    expect(screen.queryByText('duplicate')).toBeNull();
    expect(screen.getByText('fit all')).toBeDefined();
  });
});

describe('an arrow', () => {
  it('moves to where it points on the screen, from wherever one stands', () => {
    const bench = testBench();
    // from the front: the car's right is at the left hand
    standIn(bench, { around: 180, above: 20 });
    expect(nudgeDirection(bench, 'ArrowRight')).toEqual([0, -1, 0]);
    expect(nudgeDirection(bench, 'ArrowUp')).toEqual([1, 0, 0]);
    expect(nudgeDirection(bench, 'PageUp')).toEqual([0, 0, 1]);
    // from the driver's seat
    standIn(bench, { around: 0, above: 20 });
    expect(nudgeDirection(bench, 'ArrowRight')).toEqual([0, 1, 0]);
    expect(nudgeDirection(bench, 'ArrowUp')).toEqual([-1, 0, 0]);
    // square-on from the right side: up is up
    standIn(bench, { around: 90, above: 0, isSquare: true });
    expect(nudgeDirection(bench, 'ArrowUp')).toEqual([0, 0, 1]);
    expect(nudgeDirection(bench, 'ArrowRight')).toEqual([-1, 0, 0]);
    // from above: up the sheet is forward
    standIn(bench, { around: 0, above: 90, isSquare: true });
    expect(nudgeDirection(bench, 'ArrowUp')).toEqual([-1, 0, 0]);
    expect(nudgeDirection(bench, 'PageDown')).toEqual([0, 0, -1]);
  });

  it('nudges by the step, with Shift by four', () => {
    const bench = testBench();
    standIn(bench, { around: 0 });
    mount(bench, <Keyed />);
    bench.session.getState().select(['wiper']);
    press('ArrowRight');
    expect(wiperAt(bench)[1]).toBeCloseTo(25.4 / 16);
    press('ArrowLeft', { shiftKey: true });
    expect(wiperAt(bench)[1]).toBeCloseTo((-3 * 25.4) / 16);
    press('PageUp');
    expect(wiperAt(bench)[2]).toBeCloseTo(700 + 25.4 / 16);
    press('z', { ctrlKey: true });
    expect(wiperAt(bench)[2]).toBe(700);
  });

  it('walks around where nothing is selected, and shifts the sheet in a square-on look', () => {
    const bench = testBench();
    const hand = standIn(bench, {});
    mount(bench, <Keyed />);
    press('ArrowRight');
    expect(hand.turn).toHaveBeenCalledOnce();
    const square = standIn(bench, { isSquare: true });
    press('ArrowRight');
    expect(square.pan).toHaveBeenCalledOnce();
  });
});

describe('keys', () => {
  it('leave fields and sliders what is theirs', () => {
    const bench = testBench();
    standIn(bench, {});
    mount(bench, <Keyed />);
    bench.session.getState().select(['wiper']);
    press('ArrowRight', {}, screen.getByLabelText('a field'));
    press('Delete', {}, screen.getByLabelText('a field'));
    press('ArrowRight', {}, screen.getByLabelText('a slider'));
    expect(bench.open.getState().undoLabel).toBeNull();
    press('h', {}, screen.getByText('a button'));
    expect(bench.session.getState().presence).toEqual({ wiper: 'faded' });
  });

  it('go to the standpoints by number', () => {
    const bench = testBench();
    const hand = standIn(bench, {});
    mount(bench, <Keyed />);
    press('2');
    press('8');
    expect(hand.standAt.mock.calls.map((c) => c[0] as string)).toEqual(['footwell', 'plan']);
  });

  it('fade, take off the bench, and bring back', () => {
    const bench = testBench();
    mount(bench, <Keyed />);
    bench.session.getState().select(['wiper']);
    press('h');
    press('H', { shiftKey: true });
    expect(bench.session.getState().presence).toEqual({ wiper: 'off' });
    press('u');
    expect(bench.session.getState().presence).toEqual({});
  });

  it('step through the findings, worst first, and close them before they let go of the part', () => {
    const findings = [
      finding('wiper', 'firewall', 'tight', { margin: -2 }),
      finding('wiper', 'column', 'hits', {
        overlap: { volume: null, pushOut: { vector: [0, 6, 0], length: 6 } },
      }),
      finding('floor', 'column', 'seated', { gap: 0 }),
    ];
    const bench = testBench({ findings });
    mount(bench, <Keyed />);
    bench.session.getState().select(['wiper']);
    press('n');
    expect(bench.session.getState().finding).toMatch(/^column\|wiper/);
    press('n');
    expect(bench.session.getState().finding).toMatch(/^firewall\|wiper/);
    press('n');
    expect(bench.session.getState().finding).toMatch(/^column\|wiper/);
    press('Escape');
    expect(bench.session.getState()).toMatchObject({ finding: null, selected: ['wiper'] });
    press('Escape');
    expect(bench.session.getState().selected).toEqual([]);
  });

  it('change nothing for those who only look', () => {
    const bench = testBench({ canEdit: false });
    standIn(bench, {});
    mount(bench, <Keyed />);
    bench.session.getState().select(['wiper']);
    for (const key of ['Delete', ',', 'ArrowRight', 'p', 't']) press(key);
    press('d', { ctrlKey: true });
    expect(bench.open.getState().undoLabel).toBeNull();
    expect(bench.session.getState()).toMatchObject({ sheet: null, handles: 'move' });
    press('h');
    expect(bench.session.getState().presence).toEqual({ wiper: 'faded' });
  });
});
