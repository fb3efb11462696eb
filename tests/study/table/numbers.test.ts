import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { looksNumeric, parseNumber, wordOf } from '../../../src/core/study/table/numbers';

describe('parseNumber', () => {
  test('reads every exponent sign and group sign with a decimal point', () => {
    for (const [text, value] of [
      ['1.5e18', 1.5e18],
      ['1.5E+18', 1.5e18],
      ['1.5d18', 1.5e18],
      ['1.5D-3', 1.5e-3],
      ['1.5x10^18', 1.5e18],
      ['1.5 × 10^18', 1.5e18],
      ['1.5*10**18', 1.5e18],
      ['2·10^(-3)', 2e-3],
      ['-.5', -0.5],
      ['+5.', 5],
      ['\u22125', -5],
      ['12\u00a0345.5', 12345.5],
      ['12\u202f345\u202f678', 12345678],
      ["12'345", 12345],
    ] as const)
      expect([text, parseNumber(text, '.', false)]).toEqual([text, value]);
  });

  test('reads a decimal comma, and points between thousands only where they may group', () => {
    expect(parseNumber('0,435', ',', false)).toBe(0.435);
    expect(parseNumber('1,2E+18', ',', false)).toBe(1.2e18);
    expect(parseNumber('1.234,5', ',', true)).toBe(1234.5);
    expect(parseNumber('1.234,5', ',', false)).toBeNaN();
    expect(parseNumber('1,234,567.5', '.', true)).toBe(1234567.5);
  });

  test('refuses whatever is not a number as a whole', () => {
    for (const text of [
      '',
      '.',
      '-',
      'e5',
      '1e',
      '0x1F',
      '1.2.3',
      '12 345',
      '1,23',
      '12,34',
      '5 nm',
      'NaN',
      'Infinity',
      '1e999',
      "1'23",
      '1e5.5',
    ])
      expect([text, parseNumber(text, '.', true)]).toEqual([text, Number.NaN]);
  });

  test('reads back every number under either decimal sign', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const text = String(value);
        expect(parseNumber(text, '.', false) === value).toBe(true);
        expect(parseNumber(text.replace('.', ','), ',', false) === value).toBe(true);
      }),
    );
  });
});

describe('words in place of numbers', () => {
  test('missing values and limits of detection are told apart from text', () => {
    for (const text of ['', 'NaN', 'n/a', 'NA', '-', '--', 'null']) expect(wordOf(text)).toBe('missing');
    for (const text of ['<1e14', '< 1,5E+14', '≤1e14', 'BDL', 'n.d.']) expect(wordOf(text)).toBe('below');
    for (const text of ['abc', '<', '<abc>', '1e', 'Infinity']) expect(wordOf(text)).toBe('text');
  });

  test('a limit looks like a number, a word does not', () => {
    expect(looksNumeric('<1e14')).toBe(true);
    expect(looksNumeric('1,5')).toBe(true);
    expect(looksNumeric('11B')).toBe(false);
    expect(looksNumeric('<x')).toBe(false);
  });
});
