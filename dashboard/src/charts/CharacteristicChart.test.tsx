import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, test } from 'vitest';
import { sampleCharacteristic, sampleDeviation, sampleInstalled, sampleRange } from './chart-samples';
import { CharacteristicChart } from './CharacteristicChart';

const show = (characteristic = sampleCharacteristic) =>
  render(
    <CharacteristicChart
      tag="FV-1"
      characteristic={characteristic}
      range={sampleRange}
      deviation={characteristic === sampleCharacteristic ? sampleDeviation : null}
    />,
  );

describe('the characteristic chart', () => {
  test('says in one sentence what was found, how, and how far from the sheet', () => {
    show();
    const name = screen.getByRole('img').getAttribute('aria-label');
    expect(name).toContain('inherent, pressure drop measured');
    expect(name).toContain('22 points over 27 to 69 % travel: equal percentage');
    expect(name).toContain('capacity 0.81 of the specified (0.77 to 0.85)');
  });

  test('names the curves beside them and the unit and basis on the axis', () => {
    show();
    expect(screen.getByText('as found')).toBeInTheDocument();
    expect(screen.getByText('specified ± tolerance')).toBeInTheDocument();
    expect(screen.getByText('Flow coefficient, Kv, inherent, pressure drop measured')).toBeInTheDocument();
  });

  test('an installed one says so and shows no specified curve', () => {
    show(sampleInstalled);
    expect(screen.getByText('Flow, m³/h, installed: no pressure drop known')).toBeInTheDocument();
    expect(screen.queryByText(/^specified/)).not.toBeInTheDocument();
  });

  test('the log axis is a choice that shows itself as pressed', async () => {
    show();
    const choice = screen.getByRole('button', { name: 'Log axis' });
    const curve = () => screen.getByRole('img').innerHTML;
    const linear = curve();
    await userEvent.click(choice);
    expect(choice).toHaveAttribute('aria-pressed', 'true');
    expect(curve()).not.toBe(linear);
  });

  test('points whose shape is outside the tolerance are filled', () => {
    show();
    const filled = screen.getByRole('img').querySelectorAll('circle[fill="var(--tr-rust)"]');
    const beyond = sampleDeviation.byTravel.filter((bin) => Math.abs(bin.percent) > bin.tolerance);
    expect(filled).toHaveLength(beyond.length);
    expect(beyond.length).toBeGreaterThan(0);
  });

  test('the table holds the same points, with the specified value beside each', async () => {
    show();
    await userEvent.click(screen.getByRole('button', { name: 'Table' }));
    const rows = within(screen.getByRole('table', { name: 'Effective characteristic' })).getAllByRole('row');
    expect(rows).toHaveLength(1 + sampleCharacteristic.points.length);
    expect(
      within(rows[1] as HTMLElement)
        .getAllByRole('cell')
        .map((cell) => cell.textContent),
    ).toEqual(['27.0', '5.59', '19', '5.59', '7.3']);
    expect(screen.queryByRole('img')).not.toBeInTheDocument();
  });
});
