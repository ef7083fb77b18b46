import { cellValue, qualityIsGood } from './cell-value.js';

describe('a value cell', () => {
  it.each([
    ['12.5', '.', 12.5],
    ['-0.25', '.', -0.25],
    ['1e-3', '.', 0.001],
    ['12,5', ',', 12.5],
    ['40', ',', 40],
    ['AUTO', '.', 1],
    ['Man', '.', 0],
  ] as const)('%s with mark %s is %d', (text, mark, value) => {
    expect(cellValue(text, mark)).toEqual({ kind: 'number', value });
  });

  it.each(['Bad', 'No Data', 'I/O Timeout', '#N/A', 'NaN', '[-11059] No Good Data', 'LO', 'HI'])(
    '%s is a bad sample, never a zero',
    (text) => {
      expect(cellValue(text, '.').kind).toBe('bad');
    },
  );

  it('is empty when nothing stands in it', () => {
    expect(cellValue('  ', '.').kind).toBe('empty');
  });

  it('tells a number with the other decimal mark from one that is none', () => {
    expect(cellValue('12,5', '.').kind).toBe('other mark');
    expect(cellValue('12.5', ',').kind).toBe('other mark');
    expect(cellValue('12 500.1.2', '.').kind).toBe('not a number');
  });
});

describe('a quality cell', () => {
  it.each(['Good', 'good, non-specific', '192', '216', ''])('%s vouches for its sample', (text) => {
    expect(qualityIsGood(text, false)).toBe(true);
  });

  it.each(['Bad', '0', '24', 'Bad, no communication'])('%s does not', (text) => {
    expect(qualityIsGood(text, true)).toBe(false);
  });

  it('lets an uncertain sample pass only if the plan says so', () => {
    expect(qualityIsGood('Uncertain', false)).toBe(false);
    expect(qualityIsGood('Uncertain', true)).toBe(true);
    expect(qualityIsGood('64', true)).toBe(true);
  });
});
