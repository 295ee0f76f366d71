// @vitest-environment happy-dom
import { act, renderHook } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { useHeld } from '../../../src/components/use-held';

const mount = () => renderHook(({ kept }) => useHeld(kept), { initialProps: { kept: 'reviewer' } });

describe('a choice on its way', () => {
  it('shows at once and stays when it is kept', () => {
    const { result, rerender } = mount();
    act(() => result.current[1]('designer'));
    expect(result.current[0]).toBe('designer');
    rerender({ kept: 'designer' });
    expect(result.current[0]).toBe('designer');
  });

  it('goes back when it could not be kept', () => {
    const { result } = mount();
    act(() => result.current[1]('designer'));
    act(() => result.current[2]());
    expect(result.current[0]).toBe('reviewer');
  });

  it('does not come back when the kept value is undone to what it was', () => {
    const { result, rerender } = mount();
    act(() => result.current[1]('designer'));
    rerender({ kept: 'designer' });
    rerender({ kept: 'reviewer' });
    expect(result.current[0]).toBe('reviewer');
  });
});
