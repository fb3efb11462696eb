import { describe, expect, test } from 'vitest';
import { splitHeading } from '../../../src/core/study/table/heading';

const split = (text: string) => {
  const { name, unit, unknownUnit } = splitHeading(text);
  return [name, unit?.name, unknownUnit];
};

describe('splitHeading', () => {
  test('separates name and unit in every listed form', () => {
    expect(split('Depth (nm)')).toEqual(['Depth', 'nm', undefined]);
    expect(split('Depth [µm]')).toEqual(['Depth', 'um', undefined]);
    expect(split('Depth / nm')).toEqual(['Depth', 'nm', undefined]);
    expect(split('Depth, A')).toEqual(['Depth', 'A', undefined]);
    expect(split('Depth nm')).toEqual(['Depth', 'nm', undefined]);
    expect(split('depth_um')).toEqual(['depth', 'um', undefined]);
    expect(split('boron_cm3')).toEqual(['boron', 'cm-3', undefined]);
    expect(split('As (atoms/cc)')).toEqual(['As', 'cm-3', undefined]);
    expect(split('11B / cm-3')).toEqual(['11B', 'cm-3', undefined]);
    expect(split('B 1/cm3')).toEqual(['B', 'cm-3', undefined]);
    expect(split('Concentration (11B) [at/cm3]')).toEqual(['Concentration (11B)', 'cm-3', undefined]);
  });

  test('keeps a unit in brackets that it does not know, and does not take a lone letter for one', () => {
    expect(split('Depth (furlong)')).toEqual(['Depth', undefined, 'furlong']);
    expect(split('A')).toEqual(['A', undefined, undefined]);
    expect(split('Depth')).toEqual(['Depth', undefined, undefined]);
    expect(split('nm')).toEqual(['', 'nm', undefined]);
  });
});
