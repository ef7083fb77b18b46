import { describe, expect, test } from 'vitest';
import { moveStem, type Stem } from './stick.js';

const atRest = (): Stem => ({ position: 50, residual: 0, demand: 50 });

describe('the two-parameter stick model', () => {
  test('a ramp moves the stem first once it exceeds fS, to fD short of it (methods.md §12.5)', () => {
    const stem = atRest();
    let demand = 50;
    do demand += 0.5;
    while (!moveStem(stem, demand, 3, 1));
    expect(demand).toBe(53.5);
    expect(stem.position).toBe(52.5);
  });

  test('equal parameters are a dead band: nothing happens until it is crossed after a reversal', () => {
    const stem = atRest();
    for (let demand = 50; demand <= 60; demand += 0.25) moveStem(stem, demand, 1, 1);
    const top = stem.position;
    let back = 60;
    do back -= 0.25;
    while (!moveStem(stem, back, 1, 1));
    expect(top).toBe(59);
    expect(60 - back).toBe(2.25);
  });
});
