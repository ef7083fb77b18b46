import { columnHeader } from './column-header.js';

describe('a column name', () => {
  it.each([
    ['FT-101', 'FT-101', null],
    ['FT-101 [m3/h]', 'FT-101', 'm3/h'],
    ['FT-101 (m3/h)', 'FT-101', 'm3/h'],
    ['FT-101(m3/h)', 'FT-101', 'm3/h'],
    [' PT 7 (bar(g)) ', 'PT 7', 'bar(g)'],
    ['ZT-4[%]', 'ZT-4', '%'],
    ['CV101.POS', 'CV101.POS', null],
    ['FT-101 []', 'FT-101', null],
  ])('%s is tag %s in unit %s', (name, tag, unit) => {
    expect(columnHeader(name)).toEqual({ tag, unit });
  });
});
