// @vitest-environment happy-dom
import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { Gap, Length } from '../../../src/components/fraction';

afterEach(cleanup);

describe('a length in print', () => {
  it('is read out in words, and its drawn fraction is not read twice', () => {
    render(<Length mm={136.525} display="in" />);
    expect(screen.getByText('5 3/8 inches').className).toBe('sr-only');
    const drawn = document.querySelector('[aria-hidden="true"]');
    expect(drawn?.textContent).toBe('53⁄8"');
  });

  it('has a true minus', () => {
    render(<Length mm={-10} display="mm" />);
    expect(document.querySelector('[aria-hidden="true"]')?.textContent).toBe('\u221210 mm');
  });

  it('never shows a gap wider than it is', () => {
    // 4.74 mm lie just under 3/16 inch = 4.7625 mm
    render(<Gap mm={4.74} display="in" options={{ denominator: 16 }} />);
    expect(screen.getByText('1/8 inches')).toBeDefined();
  });
});
