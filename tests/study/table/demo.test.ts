import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { readTable } from '../../../src/core/study/table/read';
import { logLinearDose } from '../../../src/core/study/table/thin';

const DEMO = join(__dirname, '../../../demo-profiles');
const open = (name: string) => readTable(readFileSync(join(DEMO, name)), {}, name);

describe('the demo tables', () => {
  let folder: string;
  beforeAll(() => {
    folder = mkdtempSync(join(tmpdir(), 'demo-tables-'));
  });
  afterAll(() => rmSync(folder, { recursive: true }));

  test('are what their script writes', () => {
    execFileSync(process.execPath, [join(__dirname, '../../../scripts/demo-tables.mjs'), folder]);
    for (const name of ['sims-boron.csv', 'sims-arsenic-boron.txt'])
      expect(readFileSync(join(folder, name), 'utf8')).toBe(readFileSync(join(DEMO, name), 'utf8'));
  });

  test('say that they are invented and are read without a question', () => {
    for (const name of ['sims-boron.csv', 'sims-arsenic-boron.txt']) {
      const reading = open(name);
      expect(reading.metadata[0]).toMatch(/^Invented data/);
      expect(reading.questions).toEqual([]);
    }
  });

  test('the boron table holds the dose of the curve it was drawn from', () => {
    const { profiles, warnings } = open('sims-boron.csv');
    expect(warnings).toEqual([]);
    expect(profiles.map((p) => p.dopant)).toEqual(['boron']);
    const dose = 1e-4 * logLinearDose(profiles[0].depth_um, profiles[0].concentration_cm3);
    // Integral of the Gaussian from the surface plus the floor: 4.2e17 * 155e-7 * sqrt(pi)/2 * (1 + erf(195/155)) + 4e14 * 1.6e-4.
    const erf = 0.9248; // erf(1.2581), tables
    const expected = 4.2e17 * 155e-7 * (Math.sqrt(Math.PI) / 2) * (1 + erf) + 4e14 * 1.6e-4;
    expect(Math.abs(dose / expected - 1)).toBeLessThan(0.01); // noise of some 3 % averaged over about 80 points
  });

  test('the arsenic and boron table tells of its limits of detection and of the resumed crater', () => {
    const { profiles, warnings, choice } = open('sims-arsenic-boron.txt');
    expect(profiles.map((p) => [p.dopant, p.depthColumn])).toEqual([
      ['arsenic', 1],
      ['boron', 3],
    ]);
    expect(choice).toMatchObject({
      delimiter: 'tab',
      decimal: ',',
      depthUnit: 'um',
      concentrationUnit: 'cm-3',
    });
    expect(profiles[0].belowDetection).toBeGreaterThan(50);
    expect(new Set(warnings.map((w) => w.code))).toEqual(new Set(['table-below-detection', 'table-order']));
    expect(Math.max(...profiles[0].concentration_cm3)).toBeLessThan(2.1e20);
  });
});
