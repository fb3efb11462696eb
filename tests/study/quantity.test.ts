import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { formatQuantity, parseQuantity } from '../../src/core/study/quantity';
import type { QuantityKind } from '../../src/core/study/units';

const parse = (text: string, shown: string, kind: QuantityKind) => parseQuantity(text, { shown, kind });
const value = (text: string, shown: string, kind: QuantityKind) => {
  const parsed = parse(text, shown, kind);
  return 'value' in parsed ? parsed.value : parsed.problem;
};

describe('parseQuantity', () => {
  test.each<[string, string, QuantityKind, number]>([
    ['120 nm', 'um', 'length', 0.12],
    ['0.3um', 'nm', 'length', 300],
    ['0.3 µm', 'um', 'length', 0.3],
    ['5000 A', 'um', 'length', 0.5],
    ['5000 Å', 'nm', 'length', 500],
    ['0.5 micron', 'um', 'length', 0.5],
    ['0.12', 'um', 'length', 0.12],
    ['0.1 um + 20 nm', 'um', 'length', 0.12],
    ['((3 + 4) / 2) um', 'nm', 'length', 3500],
    ['(3 + 4) um / 2', 'nm', 'length', 3500],
    ['1.2e13', 'cm-2', 'dose', 1.2e13],
    ['1.2e13*2', 'cm-2', 'dose', 2.4e13],
    ['1,2e13', 'cm-2', 'dose', 1.2e13],
    ['1.2×10^13 cm⁻²', 'cm-2', 'dose', 1.2e13],
    ['1.2 x 10^13', 'cm-2', 'dose', 1.2e13],
    ['1e17 m-2', 'cm-2', 'dose', 1e13],
    ['1e13 /cm2', 'cm-2', 'dose', 1e13],
    ['1e21 m-3', 'cm-3', 'concentration', 1e15],
    ['1.3E15 1/cm3', 'cm-3', 'concentration', 1.3e15],
    ['1e15 atoms/cc', 'cm-3', 'concentration', 1e15],
    ['1e15 cm^-3 + 2e15 cm^-3', 'cm-3', 'concentration', 3e15],
    ['30 min', 's', 'time', 1800],
    ['1 h', 'min', 'time', 60],
    ['2 h 30 min', 'min', 'time', 150],
    ['1h30min', 'h', 'time', 1.5],
    ['90 s', 'min', 'time', 1.5],
    ['25 C', 'K', 'temperature', 298.15],
    ['300 K', 'C', 'temperature', 26.85],
    ['-40 °C', 'C', 'temperature', -40],
    ['(900 + 50) C', 'C', 'temperature', 950],
    ['1.2 ohm cm', 'ohm cm', 'resistivity', 1.2],
    ['1.2 Ω·cm', 'ohm cm', 'resistivity', 1.2],
    ['0.012 ohm m', 'ohm cm', 'resistivity', 1.2],
    ['0.06 MeV', 'keV', 'energy', 60],
    ['1480 ohm/sq', 'ohm/sq', 'sheetResistance', 1480],
    ['2*-3', '', 'plain', -6],
    ['-(2+3)*2', '', 'plain', -10],
    ['7 - 2 - 1', '', 'plain', 4],
    ['8/4/2', '', 'plain', 1],
    ['1 + 2 * 3', '', 'plain', 7],
    ['0,435', '', 'plain', 0.435],
  ])('"%s" in %s', (text, shown, kind, expected) => {
    expect(value(text, shown, kind)).toBe(expected);
  });

  test('says which unit was typed, and that none was', () => {
    expect(parse('120 nm', 'um', 'length')).toEqual({ value: 0.12, unitTyped: 'nm' });
    expect(parse('120', 'um', 'length')).toEqual({ value: 120 });
  });

  test.each<[string, string, QuantityKind, RegExp]>([
    [
      '',
      'um',
      'length',
      /a value is missing; type a number in um, or with one of the units um, nm, A, cm, mm/,
    ],
    ['5 keV', 'um', 'length', /keV is no unit of this field; .*um, nm/],
    ['5 cm-2', 'cm-3', 'concentration', /cm-2 is no unit of this field; .*cm-3, m-3/],
    ['5 nm', '', 'plain', /nm is no unit of this field; type a number/],
    ['1,234', 'um', 'length', /"1,234" can mean 1\.234 or 1234/],
    ['1.234.567', 'um', 'length', /2 decimal signs/],
    ['1,234.5', 'um', 'length', /2 decimal signs/],
    ['1 2', 'um', 'length', /"2" is not understood/],
    ['5 parsec', 'um', 'length', /"parsec" is not understood/],
    ['2 +', 'um', 'length', /a number is missing at the end/],
    ['(2', 'um', 'length', /closing bracket is missing/],
    ['1/0', '', 'plain', /not a finite number/],
    ['1e999', '', 'plain', /not a finite number/],
    ['2 um + 3', 'um', 'length', /unit of every part of a sum/],
    ['2 um * 3 um', 'um', 'length', /only one part of a product/],
    ['2 / 3 um', 'um', 'length', /none may stand below a division/],
    ['20 C + 5 C', 'C', 'temperature', /stands alone/],
    ['(2 um) nm', 'um', 'length', /give one/],
    ['abc', 'um', 'length', /a number is expected where "abc" stands/],
    ['__proto__', 'um', 'length', /a number is expected/],
    [`${'('.repeat(150)}1`, 'um', 'length', /closing bracket is missing/],
    ['9'.repeat(300), 'um', 'length', /too long/],
  ])('refuses "%s"', (text, shown, kind, expected) => {
    expect(value(text, shown, kind)).toMatch(expected);
  });

  test('never throws, and any value it gives is finite', () => {
    const pieces = fc.constantFrom(
      ...'0123456789.,+-*/() eE',
      'nm',
      'um',
      'cm-3',
      ' C',
      'h',
      '/cm3',
      '×',
      'ohm',
      '\u0000',
    );
    fc.assert(
      fc.property(
        fc.array(pieces, { maxLength: 20 }),
        fc.constantFrom<[string, QuantityKind]>(
          ['um', 'length'],
          ['cm-3', 'concentration'],
          ['C', 'temperature'],
          ['min', 'time'],
          ['', 'plain'],
        ),
        (parts, [shown, kind]) => {
          const parsed = parse(parts.join(''), shown, kind);
          if ('value' in parsed) expect(Number.isFinite(parsed.value)).toBe(true);
          else expect(parsed.problem.length).toBeGreaterThan(5);
        },
      ),
      { numRuns: 3000 },
    );
  });
});

describe('formatQuantity', () => {
  test('writes powers for concentrations and doses, plain digits otherwise', () => {
    expect(formatQuantity(1.2e13, 'dose')).toBe('1.2e13');
    expect(formatQuantity(1.3e15, 'concentration')).toBe('1.3e15');
    expect(formatQuantity(0.512, 'length')).toBe('0.512');
    expect(formatQuantity(1473.2)).toBe('1473.2');
    expect(formatQuantity(6.8e-8)).toBe('6.8e-8');
    expect(formatQuantity(0, 'dose')).toBe('0');
  });

  test('keeps as many significant digits as asked, trailing zeros too', () => {
    expect(formatQuantity(12, 'length', 4)).toBe('12.00');
    expect(formatQuantity(0.00012345, 'plain', 3)).toBe('0.000123');
    expect(formatQuantity(1e18, 'concentration', 3)).toBe('1.00e18');
    expect(formatQuantity(123456, 'plain', 3)).toBe('123000');
    expect(formatQuantity(999999.9, 'plain', 3)).toBe('1000000');
  });

  test('what it writes is read back as the same number, in every kind', () => {
    const kinds: [string, QuantityKind][] = [
      ['um', 'length'],
      ['cm-3', 'concentration'],
      ['cm-2', 'dose'],
      ['keV', 'energy'],
      ['C', 'temperature'],
      ['min', 'time'],
      ['ohm cm', 'resistivity'],
      ['', 'plain'],
    ];
    fc.assert(
      fc.property(
        fc.double({ noNaN: true, noDefaultInfinity: true }),
        fc.constantFrom(...kinds),
        (x, [shown, kind]) => {
          const back = value(`${formatQuantity(x, kind)} ${shown}`, shown, kind);
          expect(back === x).toBe(true);
        },
      ),
      { numRuns: 1000 },
    );
  });
});
