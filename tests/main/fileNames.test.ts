import { expect, test } from 'vitest';
import { fileNameFrom, isSafeName } from '../../src/main/fileNames';

test.each(['profile.csv', 'SIMS boron #2 (wafer 7).txt', 'Tiefe_µm.csv', '.hidden', 'a..b', 'comet.csv'])(
  '"%s" is a safe name',
  (name) => {
    expect(isSafeName(name)).toBe(true);
  },
);

test.each([
  '',
  '.',
  '..',
  '../x.csv',
  'sub/x.csv',
  'sub\\x.csv',
  '/etc/passwd',
  'C:x.csv',
  'C:\\x.csv',
  '\\\\host\\share',
  'a\0.csv',
  'a\n.csv',
  'x.csv ',
  'x.',
  'CON',
  'nul.csv',
  'lpt1',
  'x'.repeat(256),
])('%j is not a safe name', (name) => {
  expect(isSafeName(name)).toBe(false);
});

test('a name to show becomes a file name with one ending', () => {
  expect(fileNameFrom('p-well resistor, first lot', '.json')).toBe('p-well resistor, first lot.json');
  expect(fileNameFrom('study.JSON', '.json')).toBe('study.json');
  expect(fileNameFrom('a/b\\c:d', '.csv')).toBe('a-b-c-d.csv');
  expect(fileNameFrom('../../x', '.csv')).toBe('..-..-x.csv');
});

test('what cannot become a file name becomes "untitled"', () => {
  expect(fileNameFrom('', '.json')).toBe('untitled.json');
  expect(fileNameFrom(' ... ', '.json')).toBe('untitled.json');
  expect(fileNameFrom('con', '.json')).toBe('untitled.json');
});

test('a long name is cut', () => {
  expect(fileNameFrom('x'.repeat(500), '.json')).toHaveLength(105);
});
