import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { MAX_LINE_LENGTH, MAX_TABLE_ROWS, splitLines } from '../../../src/core/study/table/lines';

const all = (text: string) => {
  const lines = splitLines(text);
  return Array.from({ length: lines.count }, (_, i) => lines.at(i));
};

describe('splitLines', () => {
  test('cuts at every line end, in any mixture, and needs none at the end', () => {
    expect(all('a\r\nb\nc\rd')).toEqual(['a', 'b', 'c', 'd']);
    expect(all('a\n\n\nb\n')).toEqual(['a', '', '', 'b']);
    expect(all('a\r\n\x1a')).toEqual(['a']);
  });

  test('agrees with a split by pattern for any text', () => {
    fc.assert(
      fc.property(fc.string({ unit: fc.constantFrom('a', '\r', '\n', ',') }), (text) => {
        expect([...all(`${text}x`)]).toEqual(`${text}x`.split(/\r\n|\r|\n/));
      }),
    );
  });

  test('refuses an endless line by its number', () => {
    expect(() => splitLines(`a\n${'9'.repeat(MAX_LINE_LENGTH + 1)}\n`, 't.csv')).toThrow('at most 10000');
    try {
      splitLines(`a\n${'9'.repeat(MAX_LINE_LENGTH + 1)}`, 't.csv');
    } catch (error) {
      expect((error as { oneLine: string }).oneLine).toMatch(/^t\.csv: line 2: /);
    }
  });

  test('refuses more lines than can be a profile', () => {
    expect(splitLines('\n'.repeat(MAX_TABLE_ROWS)).count).toBe(MAX_TABLE_ROWS);
    expect(() => splitLines('\n'.repeat(MAX_TABLE_ROWS + 1))).toThrow('at most 5000000 lines');
  });
});
