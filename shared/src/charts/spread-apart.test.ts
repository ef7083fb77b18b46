import { describe, expect, test } from 'vitest';
import { spreadApart } from './spread-apart.js';

describe('moving labels apart', () => {
  test('leaves those that have room where they are', () => {
    expect(spreadApart([10, 80, 150], 50, 0, 200)).toEqual([10, 80, 150]);
  });

  test('keeps order and gap at the ends of the axis', () => {
    expect(spreadApart([195, 197, 199], 50, 0, 200)).toEqual([100, 150, 200]);
    expect(spreadApart([1, 2, 3], 50, 20, 200)).toEqual([20, 70, 120]);
  });
});
