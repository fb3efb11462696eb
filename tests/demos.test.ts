import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { parseStudy, resolveTables, type Solution, solve, writeStudy } from '../src/core/index';

const FOLDER = join(import.meta.dirname, '../demo-profiles');
const STUDIES = readdirSync(FOLDER).filter((name) => name.endsWith('.json'));

const read = (name: string) =>
  resolveTables(parseStudy(readFileSync(join(FOLDER, name), 'utf8'), name), (table) =>
    readFileSync(join(FOLDER, table)),
  );

function numbersIn(value: unknown, path = ''): [string, number][] {
  if (typeof value === 'number') return [[path, value]];
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([key, inner]) => numbersIn(inner, `${path}.${key}`));
}

describe.each(STUDIES)('the demo study %s', (name) => {
  const study = read(name);
  const solution: Solution = solve(study);

  test('says that its data are invented', () => {
    expect(study.note).toMatch(/\bInvented\b/);
  });

  test('gives a finite number for every reading', () => {
    for (const [path, value] of numbersIn(solution.result)) expect(value, path).toSatisfy(Number.isFinite);
  });

  test('finds the peak of every layer inside it', () => {
    for (const layer of solution.result.layers) {
      expect(layer.peakDepth_um).toBeGreaterThanOrEqual(layer.top_um);
      expect(layer.peakDepth_um).toBeLessThanOrEqual(layer.bottom_um);
    }
  });

  test('is the same study after being written and read', () => {
    expect(parseStudy(writeStudy(study))).toEqual(study);
  });
});

test('the demos are the resistor, the n+ layer, the stack, the table pair and the film', () => {
  const layers = (name: string) =>
    solve(read(name))
      .result.layers.map(({ type }) => type)
      .join('');
  expect(layers('p-resistor.json')).toBe('pn');
  expect(layers('n-plus.json')).toBe('np');
  expect(layers('npn-stack.json')).toBe('npn');
  expect(layers('sims-pair.json')).toBe('npn');
  expect(layers('film-on-insulator.json')).toBe('n');
});
