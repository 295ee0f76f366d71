// @vitest-environment happy-dom
import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { VERDICT_WORDS, VerdictMark, VerdictTotals } from '../../../src/components/verdict-mark';

afterEach(cleanup);

describe('a verdict', () => {
  it.each(VERDICT_WORDS)('%s has a mark of its own and its word', (verdict) => {
    render(<VerdictMark verdict={verdict} />);
    expect(screen.getByText(verdict)).toBeDefined();
    expect(document.querySelector('svg')).not.toBeNull();
  });

  it('has five marks that differ in shape, not in colour alone', () => {
    const shapes = VERDICT_WORDS.map((verdict) => {
      const { container, unmount } = render(<VerdictMark verdict={verdict} />);
      const shape = [...container.querySelectorAll('path')].map((path) => path.getAttribute('d')).join('|');
      unmount();
      return shape;
    });
    expect(new Set(shapes).size).toBe(VERDICT_WORDS.length);
  });

  it('keeps the word for readers where it is not shown', () => {
    render(<VerdictMark verdict="tight" wordHidden />);
    expect(screen.getByText('tight').className).toBe('sr-only');
  });

  it('counts in the order of harm and leaves out what was not found', () => {
    const { container } = render(<VerdictTotals totals={{ clears: 44, hits: 1, tight: 2, loose: 0 }} />);
    expect(container.textContent).toBe('1hits2tight44clears');
  });
});
