import { describe, expect, test } from 'vitest';
import { sha256Hex } from '../../src/core/study/hash';
import { InputProblem } from '../../src/core/study/problem';
import { resolveTables, safeTableName } from '../../src/core/study/resolveTables';
import type { TableWarning } from '../../src/core/study/table/reading';
import { toRecipe } from '../../src/core/study/toRecipe';
import { validateStudy } from '../../src/core/study/validate';

const bytes = (text: string) => new TextEncoder().encode(text);
const TABLE = bytes('Depth (nm),B (cm-3),As (cm-3)\n10,1e18,1e20\n20,2e18,0\n30,3e18,1e18\n40,4e18,1e17\n');

const study = (...steps: object[]) =>
  validateStudy({
    format: 'ohmstrata-study/1',
    wafer: { dopant: 'phosphorus', concentration_cm3: 1e15 },
    steps,
  });
const step = (more: object = {}) => ({ step: 'table', dopant: 'boron', file: 'a.csv', ...more });

function problem(run: () => unknown): string {
  try {
    run();
  } catch (error) {
    if (error instanceof InputProblem) return error.oneLine;
    throw error;
  }
  throw new Error('no problem was found');
}

describe('resolveTables', () => {
  test('embeds the column of the step and leaves a study that validates and can be solved', () => {
    const before = study(step({ label: 'well' }), { step: 'anneal', temperature_C: 900, time_min: 5 });
    const after = resolveTables(before, () => TABLE);
    expect(after.steps[0]).toEqual({
      step: 'table',
      dopant: 'boron',
      label: 'well',
      depth_um: [0.01, 0.02, 0.03, 0.04],
      concentration_cm3: [1e18, 2e18, 3e18, 4e18],
      source: { name: 'a.csv', sha256: sha256Hex(TABLE) },
    });
    expect(validateStudy(after)).toEqual(after);
    expect(toRecipe(after).steps).toHaveLength(2);
    expect(before.steps[0]).toHaveProperty('file', 'a.csv');
  });

  test('follows stated columns, dialect and units, and passes on every remark with the step', () => {
    const told: [TableWarning, string][] = [];
    const chosen = step({
      dopant: 'arsenic',
      columns: { depth: 'Depth (nm)', concentration: 3 },
      reading: { depthUnit: 'um', delimiter: 'comma' },
    });
    const after = resolveTables(
      study(chosen),
      () => TABLE,
      (warning, file) => told.push([warning, file]),
    );
    expect(after.steps[0]).toMatchObject({ depth_um: [10, 30, 40], concentration_cm3: [1e20, 1e18, 1e17] });
    expect(told.map(([{ code, step: at }, file]) => [code, at, file])).toEqual([
      ['table-zero', 1, 'a.csv'],
      ['table-unit', 1, 'a.csv'],
    ]);
  });

  test('leaves embedded and disabled tables alone, and reads nothing then', () => {
    const before = study(step({ disabled: true }), {
      step: 'table',
      dopant: 'boron',
      depth_um: [0, 1],
      concentration_cm3: [1e18, 1e17],
    });
    const read = () => {
      throw new Error('must not read');
    };
    expect(resolveTables(before, read)).toEqual(before);
  });

  test('names file, key and line of what is wrong', () => {
    const resolve = (table: Uint8Array, more: object = {}) =>
      problem(() => resolveTables(study({ step: 'etch', thickness_um: 1 }, step(more)), () => table));
    expect(resolve(bytes('Depth (nm);B (cm-3)\n1.5;1e18\n2,5;1e18\n3;1e18\n'))).toMatch(
      /^a\.csv: line 3: steps\[1\]\.file: found "2,5"/,
    );
    expect(resolve(bytes('Depth;B (cm-3)\n1;1e18\n2;1e18\n3;1e18\n'))).toMatch(
      /^a\.csv: steps\[1\]\.reading\.depthUnit: /,
    );
    expect(resolve(bytes('Depth (nm);B (cm-3)\n1,234;1000\n2,345;1000\n3,456;1000\n'))).toMatch(
      /^a\.csv: line 2: steps\[1\]\.reading\.decimal: /,
    );
    expect(resolve(TABLE, { columns: { depth: 'Tiefe' } })).toMatch(
      /^a\.csv: steps\[1\]\.columns: no column is headed "Tiefe"/,
    );
    expect(resolve(TABLE, { dopant: 'antimony' })).toMatch(
      /steps\[1\]\.columns\.concentration: no column is recognised as antimony.*2 "B \(cm-3\)"/,
    );
    expect(resolve(bytes('Depth (nm),B (cm-3),B (cm-3)\n1,2,3\n2,2,3\n3,2,3\n'))).toContain(
      '2 columns are recognised as boron',
    );
    expect(
      problem(() =>
        resolveTables(study(step()), () => {
          throw new Error('ENOENT: no such file');
        }),
      ),
    ).toBe('a.csv: steps[0].file: the table cannot be read: ENOENT: no such file');
  });

  test('takes the only column when its heading names no dopant, and none that names another one', () => {
    const single = (heading: string) => bytes(`Depth (nm),${heading}\n1,1e18\n2,1e18\n3,1e18\n`);
    expect(resolveTables(study(step()), () => single('Conc. (cm-3)')).steps[0]).toHaveProperty(
      'dopant',
      'boron',
    );
    expect(problem(() => resolveTables(study(step()), () => single('As (cm-3)')))).toContain(
      'recognised as boron',
    );
  });

  test('never asks for a file outside the study folder', () => {
    for (const file of ['../a.csv', '/etc/passwd', 'C:\\a.csv', 'sub/a.csv', '..']) {
      const asked: string[] = [];
      const read = (name: string) => {
        asked.push(name);
        return TABLE;
      };
      expect(problem(() => resolveTables(study(step({ file })), read))).toContain('without any path');
      expect(asked).toEqual([]);
    }
  });
});

describe('safeTableName', () => {
  test('accepts plain file names in any script', () => {
    for (const name of [
      'a.csv',
      'SIMS 11B (crater 2).txt',
      '.hidden',
      'profil-µ.tsv',
      'console.csv',
      '表.csv',
      'a..b',
    ])
      expect([name, safeTableName(name)]).toEqual([name, true]);
  });

  test('refuses paths, drives, devices, control signs and names that some systems rewrite', () => {
    for (const name of [
      '',
      '.',
      '..',
      'a/b',
      'a\\b',
      '/a',
      'C:a',
      'a\0b',
      'a\nb',
      'con',
      'NUL.csv',
      'com1.txt',
      'LPT9',
      ' a',
      'a ',
      'a.',
      'a:b',
      'a*',
      'x'.repeat(256),
    ])
      expect([name, safeTableName(name)]).toEqual([name, false]);
  });
});
