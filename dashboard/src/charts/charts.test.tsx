import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { type ReactElement } from 'react';
import { describe, expect, test } from 'vitest';
import {
  sampleDeviation,
  sampleDrift,
  sampleGain,
  sampleMovement,
  sampleRange,
  sampleSplit,
} from './chart-samples';
import { DeviationChart } from './DeviationChart';
import { DriftChart } from './DriftChart';
import { GainChart } from './GainChart';
import { MovementBars } from './MovementBars';
import { SplitChart } from './SplitChart';
import { TravelChart } from './TravelChart';

interface Case {
  chart: ReactElement;
  title: string;
  /** part of the sentence it is told in */
  sentence: string;
  rows: number;
  /** what the first point says */
  first: string;
}

const zone = 'Europe/Zurich';
const cases: Case[] = [
  {
    chart: <TravelChart tag="FV-1" ridge={{ ...sampleRange, shares: sampleRange.ridge }} />,
    title: 'Travel',
    sentence: 'specified to work from 20 to 60 %',
    rows: 10,
    first: '0 to 1 % travel: ',
  },
  {
    chart: <DeviationChart tag="FV-1" bins={sampleDeviation.byTravel} />,
    title: 'Deviation from the data sheet',
    sentence: '3 beyond the tolerance',
    rows: 22,
    first: '27 % travel: 0 %, tolerance ±17.7 %',
  },
  {
    chart: <GainChart tag="FV-1" gain={sampleGain} />,
    title: 'Installed gain',
    sentence: 'largest to smallest over 5 to 1',
    rows: 35,
    first: '31 % travel: gain 0.35',
  },
  {
    chart: <DriftChart tag="FV-1" drift={sampleDrift} zone={zone} />,
    title: 'Capacity by month',
    sentence: 'Trend over the record: −11.3 % (−13.9 % to −8.6 %), confirmed.',
    rows: 12,
    first: '21 Sept 2025: ',
  },
  {
    chart: <MovementBars tag="FV-1" movement={sampleMovement} zone={zone} />,
    title: 'Movement',
    sentence: '27 days in service',
    rows: 27,
    first: 'Travel: 1 Sept 2026: ',
  },
  {
    chart: (
      <SplitChart
        tag="FV-1"
        title="Demand to position"
        reference="Demand, %"
        response="Position, %"
        split={sampleSplit}
      />
    ),
    title: 'Demand to position',
    sentence: 'Dead band 2.4 ± 0.2 % travel, from 12 travel bins',
    rows: 13,
    first: 'Rising: Demand, % 34: Position, % ',
  },
];

describe.each(cases)('$title', ({ chart, title, sentence, rows, first }) => {
  test('is told in a sentence with its figures', () => {
    render(chart);
    expect(screen.getByRole('img').getAttribute('aria-label')).toContain(sentence);
  });

  test('is read point by point with the keys', async () => {
    const keys = userEvent.setup();
    render(chart);
    screen.getByRole('group', { name: `${title}: arrow keys read the points` }).focus();
    await keys.keyboard('{ArrowRight}');
    expect(screen.getByRole('status').textContent).toContain(first);
  });

  test('has a table of the same numbers', async () => {
    render(chart);
    await userEvent.click(screen.getByRole('button', { name: 'Table' }));
    expect(within(screen.getByRole('table', { name: title })).getAllByRole('row')).toHaveLength(rows + 1);
  });
});

describe('honesty of the sentences', () => {
  test('a trend that could not be judged says why instead of a figure', () => {
    const trend = { judged: false as const, reason: 'Only five months are known.' };
    render(<DriftChart tag="FV-1" drift={{ ...sampleDrift, trend }} zone={zone} />);
    expect(screen.getByText('Trend: cannot judge. Only five months are known.')).toBeInTheDocument();
  });

  test('a gain ratio whose lower bound is not above 4 is given with its interval', () => {
    render(<GainChart tag="FV-1" gain={{ ...sampleGain, ratio: { value: 2.1, low: 1.8, high: 2.6 } }} />);
    expect(screen.getByText(/2\.1 to 1 \(1\.8 to 2\.6\)/)).toBeInTheDocument();
  });

  test('a gain known in shape only shows no wanted gain', () => {
    render(<GainChart tag="FV-1" gain={{ ...sampleGain, absolute: false }} />);
    expect(screen.queryByText(/^wanted/)).not.toBeInTheDocument();
  });
});
