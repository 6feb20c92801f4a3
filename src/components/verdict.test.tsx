import '@testing-library/jest-dom/vitest';
import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { verdictIds, verdictWords } from '#shared/findings/finding.ts';
import { VerdictChip, VerdictMark } from './verdict.tsx';

describe('verdicts', () => {
  it('have a shape of their own each, so that none is told by colour alone', () => {
    const shapes = [...verdictIds, 'waiting' as const].map((verdict) => {
      const { container, unmount } = render(<VerdictMark verdict={verdict} />);
      const paths = [...container.querySelectorAll('path, circle')].map(
        (node) => node.getAttribute('d') ?? `${node.getAttribute('r')} ${node.getAttribute('stroke-dasharray')}`,
      );
      unmount();
      return paths.join('|');
    });
    expect(new Set(shapes).size).toBe(verdictIds.length + 1);
  });
  it('say word, comma, figure', () => {
    render(
      <VerdictChip
        verdict={{ id: 'motor-stalls', word: verdictWords['motor-stalls'], figure: { value: 2.1, quantity: 'time', digits: 1 } }}
      />,
    );
    expect(screen.getByText(/^Motor stalls, 2\.1\ss$/)).toBeVisible();
  });
  it('never show an old verdict for a case that was not run', () => {
    render(<VerdictChip verdict={{ id: 'within-limits', word: 'Within limits' }} state="refused" />);
    expect(screen.queryByText(/Within limits/)).toBeNull();
    expect(screen.getByText(/Not run/)).toBeVisible();
  });
});
