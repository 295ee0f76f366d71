// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { LengthField, type LengthFieldProps } from '../../../src/components/length-field';

afterEach(cleanup);

function mount(more: Partial<LengthFieldProps> = {}) {
  const onCommit = vi.fn<(mm: number) => void>();
  render(<LengthField label="behind firewall" value={136.525} display="in" onCommit={onCommit} {...more} />);
  const field = screen.getByLabelText<HTMLInputElement>('behind firewall');
  const type = (text: string): void => {
    fireEvent.focus(field);
    fireEvent.change(field, { target: { value: text } });
  };
  return { field, type, onCommit };
}

describe('a length field', () => {
  it('shows the value in the display’s terms and says it to readers', () => {
    const { field } = mount();
    expect(field.value).toBe('5 3/8');
  });

  it.each([
    ['6 1/4', 158.75],
    ['5.375in', 136.525],
    ['140 mm', 140],
    ['140,5 mm', 140.5],
    ['+1/8', 139.7],
    ['-1/8', 133.35],
  ])('commits %s on Enter', (text, mm) => {
    const { field, type, onCommit } = mount();
    type(text);
    expect(onCommit).not.toHaveBeenCalled();
    fireEvent.keyDown(field, { key: 'Enter' });
    expect(onCommit).toHaveBeenCalledOnce();
    expect(onCommit.mock.calls[0]![0]).toBeCloseTo(mm, 9);
  });

  it('commits when it is left', () => {
    const { field, type, onCommit } = mount();
    type('6');
    fireEvent.blur(field);
    expect(onCommit.mock.calls[0]![0]).toBeCloseTo(152.4, 9);
  });

  it('does not round the value when it is only looked at', () => {
    const { field, onCommit } = mount({ value: 136.5 });
    fireEvent.focus(field);
    fireEvent.blur(field);
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('keeps wrong input, says why, and changes nothing', () => {
    const { field, type, onCommit } = mount();
    type('1,250');
    fireEvent.keyDown(field, { key: 'Enter' });
    expect(onCommit).not.toHaveBeenCalled();
    expect(field.value).toBe('1,250');
    expect(field.getAttribute('aria-invalid')).toBe('true');
    const fault = screen.getByRole('alert');
    expect(fault.textContent).toMatch(/1,250/);
    expect(field.getAttribute('aria-describedby')).toContain(fault.id);
  });

  it('restores on Esc without closing what is around it', () => {
    const { field, type, onCommit } = mount();
    type('99');
    const around = vi.fn();
    document.body.addEventListener('keydown', around);
    fireEvent.keyDown(field, { key: 'Escape' });
    expect(field.value).toBe('5 3/8');
    expect(around).not.toHaveBeenCalled();
    expect(onCommit).not.toHaveBeenCalled();
    fireEvent.keyDown(field, { key: 'Escape' });
    expect(around).toHaveBeenCalledOnce();
    document.body.removeEventListener('keydown', around);
  });

  it('nudges by a step with the arrow keys, by eight with Shift', () => {
    const { field, onCommit } = mount({ value: 25.4 });
    fireEvent.keyDown(field, { key: 'ArrowUp' });
    expect(onCommit).toHaveBeenLastCalledWith(25.4 + 25.4 / 16);
    fireEvent.keyDown(field, { key: 'ArrowDown', shiftKey: true });
    expect(onCommit).toHaveBeenLastCalledWith(25.4 - 25.4 / 2);
  });

  it('nudges by 1 mm where millimetres are shown', () => {
    const { field, onCommit } = mount({ display: 'mm', value: 10 });
    fireEvent.keyDown(field, { key: 'ArrowUp' });
    expect(onCommit).toHaveBeenLastCalledWith(11);
  });

  it('refuses what is beyond its limits, typed or nudged', () => {
    const { field, type, onCommit } = mount({ value: 0.5, display: 'mm', least: 0 });
    fireEvent.keyDown(field, { key: 'ArrowDown' });
    type('=-3');
    fireEvent.keyDown(field, { key: 'Enter' });
    expect(onCommit).not.toHaveBeenCalled();
    expect(screen.getByRole('alert').textContent).toBe('Must be at least 0 mm.');
  });

  it('takes a minus as a place beyond the datum where it is told to', () => {
    const { field, type, onCommit } = mount({ signed: 'absolute' });
    type('-1/8');
    fireEvent.keyDown(field, { key: 'Enter' });
    expect(onCommit).toHaveBeenCalledWith(-3.175);
  });
});
