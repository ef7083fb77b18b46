import { expect, test } from 'vitest';
import { asEntered, fileSize, percentage, significant, unitText } from './numbers';

test('a found figure shows three digits, never an exponent', () => {
  expect([104.27, 0.012345, 12.3456, 1e-9, 0].map((value) => significant(value))).toEqual([
    '104',
    '0.0123',
    '12.3',
    'under 0.000001',
    '0',
  ]);
});

test('a figure that is not known shows as a dash', () => {
  expect([null, undefined, NaN, Infinity].map((value) => significant(value))).toEqual(['–', '–', '–', '–']);
});

test('an entered figure stands as it was entered', () => {
  expect([40, 0.9, 1.25, 12_500].map(asEntered)).toEqual(['40', '0.9', '1.25', '12\u202f500']);
});

test('units are written with their powers raised, whatever the register holds', () => {
  expect(['m3/h', 'Nm3/h', 'mm2/s', 'kg/m^3', 'm3h', 'bar(a)'].map(unitText)).toEqual([
    'm³/h',
    'Nm³/h',
    'mm²/s',
    'kg/m³',
    'm³h',
    'bar(a)',
  ]);
});

test('small shares keep a decimal so that they do not read as nothing', () => {
  expect([0.0042, 0, 0.31, null].map(percentage)).toEqual(['0.4', '0', '31', '–']);
});

test('a file’s size is given in the unit a person would choose', () => {
  expect([812, 665_000, 3_300_000, 2.1e9].map(fileSize)).toEqual(['812 B', '665 kB', '3.3 MB', '2.10 GB']);
});
