import { describe, expect, test } from 'vitest';
import { figureColumn, figureText } from './figure-text.js';

describe('figures on a chart', () => {
  test.each([
    [12345.6, '12\u202f346'],
    [-0.01234, '−0.0123'],
    [1234, '1234'],
    [9.999, '10'],
    [0, '0'],
    [-0.0, '0'],
    [2.5, '2.5'],
    [NaN, '–'],
    [Infinity, '–'],
  ])('%d reads %s', (value, text) => {
    expect(figureText(value)).toBe(text);
  });

  test('a column keeps its points under each other', () => {
    expect(figureColumn([9.24, 14, 5.587, NaN, -0.001])).toEqual(['9.24', '14.00', '5.59', '–', '0.00']);
  });
});
