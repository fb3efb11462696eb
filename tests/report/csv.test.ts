import fc from 'fast-check';
import Papa from 'papaparse';
import { describe, expect, test } from 'vitest';
import { csvText } from '../../src/core/report/csv';
import { readTable } from '../../src/core/study/table/read';

describe('csvText', () => {
  test('writes provenance, header and rows with LF', () => {
    const text = csvText(
      ['depth_um', 'layer'],
      [Float64Array.of(0, 0.1), ['p', 'n']],
      ['Ohmstrata 0.1.0', 'study: a'],
    );
    expect(text).toBe('# Ohmstrata 0.1.0\n# study: a\ndepth_um,layer\n0,p\n0.1,n\n');
  });

  test('every number reads back to the last bit; what is not finite is blank', () => {
    fc.assert(
      fc.property(fc.float64Array({ minLength: 1 }), (numbers) => {
        const lines = csvText(['x', 'y'], [numbers, numbers], []).split('\n').slice(1, -1);
        const back = lines.map((line) => line.split(',')[0]);
        for (const [i, text] of back.entries())
          if (Number.isFinite(numbers[i])) expect(Number(text) === numbers[i]).toBe(true);
          else expect(text).toBe('');
      }),
    );
  });

  test('no text cell can start a formula, numbers stay numbers', () => {
    const nasty = [
      '=1+1',
      '+1+1',
      '-1+1',
      '@SUM(A1)',
      '\t=1',
      '\r=1',
      'a;=1',
      'a, =1',
      '-5',
      '+1e3',
      'plain',
      'a "b"',
    ];
    const text = csvText(['=h'], [nasty], ['by =cmd, =1+1']);
    const rows = Papa.parse<string[]>(text, { newline: '\n' }).data.flat();
    expect(rows.slice(2, -1)).toEqual([
      "'=h",
      "'=1+1",
      "'+1+1",
      "'-1+1",
      "'@SUM(A1)",
      "'\t=1",
      "'\r=1",
      "a;'=1",
      "a, '=1",
      '-5',
      '+1e3',
      'plain',
      'a "b"',
    ]);
    expect(text.startsWith("# by =cmd, '=1+1\n")).toBe(true);
  });

  test('a provenance line cannot break into the table', () => {
    expect(csvText(['a'], [['x']], ['one\n=two\r\nthree'])).toBe('# one =two three\na\nx\n');
  });

  test('the table reader reads what is written here', () => {
    const depth = Float64Array.of(0, 0.1, 0.2, 1 / 3);
    const boron = Float64Array.of(1e18, 2.5e18, 1e17, 7.123456789012345e16);
    const text = csvText(['depth_um', 'boron_cm3'], [depth, boron], ['Ohmstrata']);
    const [profile] = readTable(new TextEncoder().encode(text)).profiles;
    expect(profile).toMatchObject({ dopant: 'boron', depth_um: depth, concentration_cm3: boron });
  });

  test('refuses columns that do not match', () => {
    expect(() => csvText(['a', 'b'], [['x']], [])).toThrow('2 headings');
    expect(() => csvText(['a', 'b'], [['x'], ['y', 'z']], [])).toThrow('1, 2 rows');
  });
});
