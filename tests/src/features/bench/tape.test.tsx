// @vitest-environment happy-dom
import { act, cleanup, fireEvent, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { worldPose } from '#shared/scene';
import { PlacePanel } from '../../../../src/features/bench/tape/place-panel';
import { ShapePanel } from '../../../../src/features/bench/tape/shape-panel';
import { FactsPanel } from '../../../../src/features/bench/tape/facts-panel';
import { MotionPanel } from '../../../../src/features/bench/tape/motion-panel';
import { NeighboursPanel } from '../../../../src/features/bench/tape/neighbours-panel';
import { parsePlain } from '../../../../src/features/bench/tape/parse-plain';
import { UnitSwitch } from '../../../../src/features/bench/top-bar/unit-switch';
import { mount, smallScene, testBench, type TestBench } from './support';

afterEach(cleanup);

const INCH = 25.4;

function placeOf(bench: TestBench, id: string): readonly number[] {
  const { scene } = bench.open.getState();
  const m = worldPose(
    scene,
    scene.components.find((c) => c.id === id)!,
  );
  return [m[3]!, m[7]!, m[11]!];
}

function openAt(id: string, canEdit = true): TestBench {
  const bench = testBench({ canEdit });
  bench.session.getState().select([id]);
  return bench;
}

function typeIn(label: string | RegExp, text: string): HTMLInputElement {
  const field = screen.getByLabelText<HTMLInputElement>(label);
  fireEvent.focus(field);
  fireEvent.change(field, { target: { value: text } });
  fireEvent.keyDown(field, { key: 'Enter' });
  return field;
}

describe('the tape', () => {
  it('reads a part in the shop’s own terms', () => {
    const bench = openAt('brake-pedal');
    mount(bench, <PlacePanel />);
    // at 100, 440, 480: 140 right of the laser, 99 behind the firewall's rear face, 430 above the floor's top
    expect(screen.getByLabelText<HTMLInputElement>('right of column line').value).toBe('5 33/64');
    expect(screen.getByLabelText('behind firewall')).toBeDefined();
    expect(screen.getByLabelText('above floor')).toBeDefined();
  });

  it('says on which side, by word instead of sign', () => {
    mount(openAt('wiper'), <PlacePanel />);
    expect(screen.getByLabelText('left of column line')).toBeDefined();
    expect(screen.getByLabelText('ahead of firewall')).toBeDefined();
  });

  it.each([
    ['5 3/8', 300 + 5.375 * INCH],
    ['5-3/8"', 300 + 5.375 * INCH],
    ['5.375in', 300 + 5.375 * INCH],
    ['136.5 mm', 436.5],
    ['136,5 mm', 436.5],
    ['+1/8', 440 + INCH / 8],
    ['-1/8', 440 - INCH / 8],
  ])('takes %s', (text, y) => {
    const bench = openAt('brake-pedal');
    mount(bench, <PlacePanel />);
    typeIn('right of column line', text);
    expect(placeOf(bench, 'brake-pedal')[1]).toBeCloseTo(y, 4);
    expect(placeOf(bench, 'brake-pedal')[0]).toBeCloseTo(100, 4);
    expect(bench.open.getState().undoLabel).toBe('Move Brake pedal');
  });

  it.each(['1,250', 'five', '5 3/0', ''])('refuses %j, keeps it to be corrected and moves nothing', (text) => {
    const bench = openAt('brake-pedal');
    mount(bench, <PlacePanel />);
    const field = typeIn('right of column line', text);
    expect(field.getAttribute('aria-invalid')).toBe('true');
    const alert = screen.getAllByRole('alert').find((a) => a.textContent !== '');
    expect(alert?.textContent?.length).toBeGreaterThan(10);
    expect(bench.open.getState().undoLabel).toBeNull();
    expect(field.value).toBe(text);
  });

  it('moves the whole group when the group is meant', () => {
    const bench = openAt('brake-pedal');
    bench.session.getState().set({ reach: 'group' });
    mount(bench, <PlacePanel />);
    typeIn('right of column line', '4 in');
    expect(bench.open.getState().scene.groups[0]!.pose.at?.[1]).toBeCloseTo(300 + 4 * INCH);
    expect(bench.open.getState().undoLabel).toBe('Move Pedal box');
  });

  it('nudges by its step, whichever side the part is on', () => {
    const bench = openAt('wiper');
    mount(bench, <PlacePanel />);
    fireEvent.click(screen.getByRole('button', { name: '1/16" to the right' }));
    expect(placeOf(bench, 'wiper')[1]).toBeCloseTo(INCH / 16);
    fireEvent.click(screen.getByRole('button', { name: '1/16" forward' }));
    expect(placeOf(bench, 'wiper')[0]).toBeCloseTo(-200 - INCH / 16);
  });

  it('shows a dragged part where the hand has it, before it lets go', () => {
    const bench = openAt('brake-pedal');
    mount(bench, <PlacePanel />);
    act(() =>
      bench.open.getState().setPreview((s) => ({
        ...s,
        groups: [{ ...s.groups[0]!, pose: { at: [100, 400 + INCH, 600] } }],
      })),
    );
    expect(screen.getByLabelText<HTMLInputElement>('right of column line').value).toBe('6 33/64');
  });

  it('changes its figures with the unit', () => {
    const bench = openAt('brake-pedal');
    mount(
      bench,
      <>
        <UnitSwitch />
        <PlacePanel />
      </>,
    );
    fireEvent.keyDown(screen.getByRole('button', { name: /^Unit/ }), { key: 'Enter' });
    fireEvent.click(screen.getByRole('menuitem', { name: /Millimetres/ }));
    expect(screen.getByLabelText<HTMLInputElement>('right of column line').value).toBe('140');
  });

  it('turns by angles in the car', () => {
    const bench = openAt('wiper');
    mount(bench, <PlacePanel />);
    typeIn('plan', '30');
    expect(bench.open.getState().scene.components.find((c) => c.id === 'wiper')?.pose.turn).toEqual([0, 0, 30]);
  });

  it('is only read by those who may not change the scene', () => {
    mount(openAt('brake-pedal', false), <PlacePanel />);
    expect(screen.getByLabelText<HTMLInputElement>('right of column line').disabled).toBe(true);
    expect(screen.queryByRole('button', { name: /to the right/ })).toBeNull();
  });
});

describe('the other pages of the tape', () => {
  it('change a size, and refuse one that is nothing', () => {
    const bench = openAt('wiper');
    mount(bench, <ShapePanel />);
    typeIn('wide', '4 1/2');
    const shape = () => bench.open.getState().scene.components.find((c) => c.id === 'wiper')!.solids[0]!.shape;
    expect(shape()).toMatchObject({ size: [100, 114.3, 100] });
    typeIn('wide', '0');
    expect(shape()).toMatchObject({ size: [100, 114.3, 100] });
    expect(screen.getAllByRole('alert').some((a) => /at least/.test(a.textContent ?? ''))).toBe(true);
  });

  it('give a tolerance by where the measures come from', () => {
    const bench = openAt('wiper');
    mount(bench, <FactsPanel />);
    const wiper = () => bench.open.getState().scene.components.find((c) => c.id === 'wiper')!;
    fireEvent.change(screen.getByLabelText('Its measures are'), { target: { value: 'guess' } });
    expect(wiper()).toMatchObject({ source: 'guess', tolerance: 12 });
    fireEvent.change(screen.getByLabelText('Its measures are'), { target: { value: 'sheet' } });
    expect(wiper()).toMatchObject({ source: 'sheet', tolerance: 1 });
    fireEvent.change(screen.getByLabelText('Kind of part'), { target: { value: 'heater' } });
    expect(wiper().category).toBe('heater');
  });

  it('give a part its stroke, run along it, and take it away', () => {
    const bench = openAt('clutch-pedal');
    mount(bench, <MotionPanel />);
    fireEvent.click(screen.getByRole('button', { name: 'Add a stroke' }));
    const pedal = () => bench.open.getState().scene.components.find((c) => c.id === 'clutch-pedal')!;
    expect(pedal().motions[0]).toMatchObject({ use: 'operating', steps: [{ kind: 'swing', to: 20 }] });
    expect(screen.getByRole<HTMLButtonElement>('button', { name: 'Add a stroke' }).disabled).toBe(true);
    typeIn('to', '31');
    expect(pedal().motions[0]!.steps[0]).toMatchObject({ to: 31 });
    const strip = screen.getByRole<HTMLInputElement>('slider');
    expect(strip.getAttribute('aria-valuetext')).toBe('at rest');
    fireEvent.change(strip, { target: { value: '250' } });
    expect(Object.values(bench.session.getState().positions)).toEqual([0.5]);
    fireEvent.click(screen.getByRole('button', { name: 'back to rest' }));
    expect(bench.session.getState().positions).toEqual({});
    fireEvent.click(screen.getByRole('button', { name: 'Take the motion away' }));
    expect(pedal().motions).toEqual([]);
  });

  it('joint two parts and part them', () => {
    const bench = openAt('brake-pedal');
    mount(bench, <NeighboursPanel />);
    fireEvent.change(screen.getByLabelText('Joint it to'), { target: { value: 'firewall' } });
    fireEvent.click(screen.getByRole('button', { name: 'Add the joint' }));
    const joints = () => bench.open.getState().scene.rules.pairs.filter((p) => p.joint !== undefined);
    expect(joints()).toHaveLength(1);
    expect(joints()[0]).toMatchObject({ joint: { allow: 1 } });
    typeIn('Overlap allowed with Firewall', '2 mm');
    expect(joints()[0]).toMatchObject({ joint: { allow: 2 } });
    expect(within(screen.getByLabelText('Joint it to')).queryByText('Firewall')).toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'Take the joint with Firewall away' }));
    expect(joints()).toEqual([]);
  });
});

describe('a plain number', () => {
  it('takes a point or a comma, and refuses what could be a thousand', () => {
    expect(parsePlain('0.5')).toBe(0.5);
    expect(parsePlain(' -,25 ')).toBe(-0.25);
    expect(parsePlain('\u22121')).toBe(-1);
    expect(parsePlain('1,250')).toBeNull();
    expect(parsePlain('one')).toBeNull();
    expect(parsePlain('')).toBeNull();
  });
});

it('starts from a scene that loads', () => {
  expect(smallScene().components).toHaveLength(6);
});
