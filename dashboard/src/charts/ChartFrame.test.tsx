import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, test } from 'vitest';
import { ChartFrame } from './ChartFrame';

const points = [10, 20, 30];

function show() {
  render(
    <ChartFrame
      title="Flow"
      note="m³/h against travel"
      summary="Flow rises with travel."
      fileName="FV-1 flow"
      height={() => 200}
      table={{ columns: ['Travel, %', 'Flow, m³/h'], rows: points.map((x) => [String(x), String(x * 2)]) }}
      draw={() => ({
        marks: null,
        series: [
          { name: 'Rising', readings: points.map((x) => ({ x, y: x, text: `${x} % travel` })) },
          { name: 'Falling', readings: points.slice(1).map((x) => ({ x, y: x, text: `${x} % travel` })) },
        ],
      })}
    />,
  );
  return { keys: userEvent.setup(), live: () => screen.getByRole('status').textContent };
}

describe('what every chart has', () => {
  test('a figure named by its title, and a picture named by its sentence', () => {
    show();
    expect(screen.getByRole('figure', { name: 'Flow' })).toBeInTheDocument();
    expect(screen.getByRole('img', { name: 'Flow rises with travel.' })).toBeInTheDocument();
  });

  test('arrow keys walk along the points and read each out', async () => {
    const { keys, live } = show();
    screen.getByRole('group', { name: /arrow keys/ }).focus();
    await keys.keyboard('{ArrowRight}');
    expect(live()).toBe('Rising: 10 % travel');
    await keys.keyboard('{ArrowRight}{ArrowRight}');
    expect(live()).toBe('Rising: 30 % travel');
    await keys.keyboard('{ArrowRight}');
    expect(live()).toBe('Rising: 30 % travel');
    await keys.keyboard('{Home}');
    expect(live()).toBe('Rising: 10 % travel');
  });

  test('up and down change the curve and keep the place nearest', async () => {
    const { keys, live } = show();
    screen.getByRole('group', { name: /arrow keys/ }).focus();
    await keys.keyboard('{End}{ArrowDown}');
    expect(live()).toBe('Falling: 30 % travel');
    await keys.keyboard('{Home}{ArrowUp}');
    expect(live()).toBe('Rising: 20 % travel');
  });

  test('Escape puts the cursor away', async () => {
    const { keys, live } = show();
    screen.getByRole('group', { name: /arrow keys/ }).focus();
    await keys.keyboard('{ArrowRight}{Escape}');
    expect(live()).toBe('');
  });

  test('the table shows the same numbers and the drawing comes back', async () => {
    const { keys } = show();
    const toggle = screen.getByRole('button', { name: 'Table' });
    await keys.click(toggle);
    expect(screen.getByRole('table', { name: 'Flow' })).toHaveTextContent('2040');
    expect(screen.queryByRole('button', { name: 'PNG' })).not.toBeInTheDocument();
    await keys.click(toggle);
    expect(screen.getByRole('img')).toBeInTheDocument();
  });
});
