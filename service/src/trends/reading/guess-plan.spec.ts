import { guessPlan } from './guess-plan.js';

const rows = (cells: (i: number) => string) =>
  Array.from({ length: 20 }, (_, i) => `2026-03-01T00:${String(i).padStart(2, '0')}:00Z,${cells(i)}`);
const planOf = (head: string, cells: (i: number) => string) =>
  guessPlan([head, ...rows(cells)].join('\n'), 'UTC').plan;

describe('the guessed plan', () => {
  it.each(['Bad', 'No Data', 'I/O Timeout', '[-11059] No Good Data', '#N/A', '---', 'NaN'])(
    'takes a column of nothing but “%s” for a dead signal of a wide file',
    (word) => {
      expect(planOf('time,ZT-1,FT-1,PT-1', (i) => `${i},${2 * i},${word}`).form).toBe('wide');
    },
  );

  it('takes a column of words among several of figures for a signal like the others', () => {
    expect(planOf('time,ZT-1,FT-1,State', (i) => `${i},${2 * i},Running`).form).toBe('wide');
  });

  it('takes a column of tag names for the long form, whatever it is called', () => {
    expect(planOf('time,source,figure', (i) => `${i % 2 ? 'FT-1' : 'PT-1'},${i}`)).toMatchObject({
      form: 'long',
      long: { tagColumn: 'source', valueColumn: 'figure' },
    });
    expect(planOf('time,source,figure', (i) => `Badger pump flow,${i}`).form).toBe('long');
  });

  it.each(['Good', '"Good, non-specific"', 'Uncertain'])('takes no column of “%s” for tag names', (word) => {
    expect(planOf('time,FT-1,FT-1 quality', (i) => `${i},${word}`).form).toBe('wide');
  });

  it('doubts times that hold no time of day', () => {
    const doubtsOf = (time: string) => guessPlan(`Date,FT-1\n${time},1\n${time},2\n`, 'UTC').doubts;
    expect(doubtsOf('2026-03-01').join()).toContain('no time of day');
    expect(doubtsOf('2026-03-01 06:00').join()).not.toContain('no time of day');
  });
});
