import { describe, expect, test } from 'vitest';
import { MAX_TABLE_POINTS } from '../../../src/core/study/schema';
import { embedTable } from '../../../src/core/study/table/embed';
import { readTable } from '../../../src/core/study/table/read';
import { validateStudy } from '../../../src/core/study/validate';

const source = { name: 't.csv', sha256: 'a'.repeat(64) };
const read = (text: string) => readTable(new TextEncoder().encode(text));
const TABLE = 'Depth (nm),B (cm-3),C (cm-3)\n1,1e18,1e16\n2,2e18,1e16\n3,3e18,1e16\n';

describe('embedTable', () => {
  test('gives a step that a study accepts', () => {
    const step = embedTable(read(TABLE), 0, source);
    expect(step).toEqual({
      step: 'table',
      dopant: 'boron',
      depth_um: [0.001, 0.002, 0.003],
      concentration_cm3: [1e18, 2e18, 3e18],
      source,
    });
    const study = {
      format: 'ohmstrata-study/1',
      wafer: { dopant: 'phosphorus', concentration_cm3: 1e15 },
      steps: [step],
    };
    expect(validateStudy(study).steps[0]).toEqual(step);
  });

  test('needs to be told a dopant that the heading does not name', () => {
    expect(() => embedTable(read(TABLE), 1, source)).toThrow('"C (cm-3)" names no dopant');
    expect(embedTable(read(TABLE), 1, source, 'gallium').dopant).toBe('gallium');
  });

  test('thins a long table to what a study may hold', () => {
    const rows = Array.from({ length: MAX_TABLE_POINTS + 500 }, (_, i) => `${i},${1e18 + i}`);
    const step = embedTable(read(`Depth (A),As (cm-3)\n${rows.join('\n')}`), 0, source);
    expect(step.depth_um?.length).toBeLessThanOrEqual(MAX_TABLE_POINTS);
    expect(step.depth_um?.length).toBeGreaterThan(MAX_TABLE_POINTS / 2);
  });

  test('refuses open questions, absent profiles and values no study may hold', () => {
    expect(() => embedTable(read('1,1e18\n2,2e18\n3,1e18\n'), 0, source)).toThrow('state depthUnit');
    expect(() => embedTable(read(TABLE), 2, source)).toThrow('there is no profile 3; the table holds 2');
    expect(() => embedTable(read('Depth (cm),B (cm-3)\n1,1\n2,1\n3,1\n'), 0, source)).toThrow(
      'is the depth unit right?',
    );
    expect(() => embedTable(read('Depth (nm),B (cm-3)\n1,1e24\n2,1\n3,1\n'), 0, source)).toThrow(
      'is the concentration unit right?',
    );
  });
});
