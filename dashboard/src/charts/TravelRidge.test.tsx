import { render, screen } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { aRidge } from './chart-samples';
import { TravelRidge } from './TravelRidge';

describe('the travel ridge in a row', () => {
  test('says in words what it shows, with the time beyond the band', () => {
    const shares = Array.from({ length: 100 }, (_, i) => (i >= 80 ? 0.05 : 0));
    render(
      <TravelRidge label="FV-1" ridge={{ shares, band: { low: 10, high: 90 }, p5: 81, p50: 90, p95: 99 }} />,
    );
    const name = screen.getByRole('img').getAttribute('aria-label');
    expect(name).toContain(
      'FV-1, travel: 5 % of the time below 81 %, half of it below 90 %, 95 % below 99 %',
    );
    expect(name).toContain('specified to work from 10 to 90 %');
    expect(name).toContain('0 % of the time below that and 50 % above');
  });

  test('tells the part beyond the band by strokes as well as by colour', () => {
    const inside = aRidge([{ centre: 50, width: 4, weight: 1 }]);
    const { container, rerender } = render(<TravelRidge label="FV-1" ridge={inside} />);
    const strokes = () => container.querySelector('path[stroke="var(--tr-paper)"]')?.getAttribute('d');
    expect(strokes()).toBe('');
    rerender(<TravelRidge label="FV-1" ridge={aRidge([{ centre: 92, width: 4, weight: 1 }])} />);
    expect(strokes()).not.toBe('');
  });

  test('a valve never assessed has its axis and says so', () => {
    render(<TravelRidge label="FV-1" ridge={null} />);
    expect(screen.getByRole('img', { name: 'FV-1, no travel recorded yet' })).toBeInTheDocument();
  });
});
