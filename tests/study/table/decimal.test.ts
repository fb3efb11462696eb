import { describe, expect, test } from 'vitest';
import { weighDecimal } from '../../../src/core/study/table/decimal';

const weigh = (...fields: string[]) => weighDecimal(fields.map((field, i) => ({ field, line: i + 1 })));

describe('weighDecimal', () => {
  test('takes a point as the decimal sign, also without any sign at all', () => {
    expect(weigh('1.5', '2.25').decimal).toBe('.');
    expect(weigh('1.234', '5.678').decimal).toBe('.');
    expect(weigh('100', '1e18').decimal).toBe('.');
  });

  test('takes a comma that cannot group thousands as the decimal sign', () => {
    for (const field of ['0,435', '1,2', '1,2345', '1234,567', '1,234E+18', '-0,5', '<1,5e14'])
      expect([field, weigh('5', field).decimal]).toEqual([field, ',']);
  });

  test('leaves one comma before exactly three digits open, with its line, unless another field decides', () => {
    expect(weigh('5', '1,234', '12,345')).toEqual({ otherGroups: false, open: { field: '1,234', line: 2 } });
    expect(weigh('1,234', '0,500').decimal).toBe(',');
  });

  test('learns the group sign from a number that shows two signs, or the same sign twice', () => {
    expect(weigh('1,234', '1,234.5')).toEqual({ decimal: '.', otherGroups: true });
    expect(weigh('1.234', '1.234,5')).toEqual({ decimal: ',', otherGroups: true });
    expect(weigh('1,234,567', '5,000')).toEqual({ decimal: '.', otherGroups: true });
  });

  test('leaves a sign open that may group while the other one is decimal', () => {
    expect(weigh('0.5', '1,234')).toEqual({ otherGroups: false, open: { field: '1,234', line: 2 } });
    expect(weigh('0,5', '1.234')).toEqual({ otherGroups: false, open: { field: '1.234', line: 2 } });
  });

  test('reports two fields that contradict each other', () => {
    expect(weigh('1.5', '1,5').conflict).toEqual([
      { field: '1.5', line: 1 },
      { field: '1,5', line: 2 },
    ]);
  });
});
