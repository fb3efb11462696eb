/** The views beside the tracks: temperature and bias, with the numbers of the core. */

import { readFileSync } from 'node:fs';
import axe from 'axe-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { biasSweep, parseStudy, recipeHistory, solve, temperatureSweep } from '../../src/core/index';
import { type Desktop, launch } from './launch';
import { Person } from './person';

const STUDY = parseStudy(readFileSync('demo-profiles/p-resistor.json', 'utf8'));
let desktop: Desktop;
let person: Person;

beforeAll(async () => {
  desktop = await launch();
  person = new Person(desktop);
  await person.settled();
});
afterAll(() => desktop?.end());

async function violations(): Promise<unknown> {
  return desktop.app.evaluate(async ({ BrowserWindow }, source) => {
    const { webContents } = BrowserWindow.getAllWindows()[0];
    return webContents.executeJavaScript(`${source};
      axe.run(document, { resultTypes: ['violations'] }).then(({ violations }) =>
        violations.map((v) => v.id + ': ' + v.nodes.map((n) => n.html.slice(0, 200)).join(' | ')))`);
  }, axe.source);
}

const cells = (table: string, row: number) =>
  desktop.page
    .getByRole('region', { name: table })
    .locator('tbody tr')
    .nth(row)
    .locator('th, td')
    .allTextContents();

/** "1.417×10⁻³" and the like as numbers. */
const numberIn = (text: string): number =>
  Number(
    text
      .replace('−', '-')
      .replace(
        /×10([⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)/,
        (_, power: string) =>
          `e${[...power].map((sign) => (sign === '⁻' ? '-' : '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(sign))).join('')}`,
      ),
  );

test('the temperature view shows the coefficients of the core and follows its span', async () => {
  await person.button('Temperature').click();
  await desktop.page.getByRole('region', { name: 'Temperature coefficients' }).waitFor();
  const [layer] = temperatureSweep(STUDY, { from_C: -55, to_C: 125, points: 37 }).layers;
  const shown = (await cells('Temperature coefficients', 0)).map(numberIn);
  expect(shown[1] / layer.reference_ohmSq).toBeCloseTo(1, 3);
  expect(shown[2] / (layer.tcr1_ppmK ?? 0)).toBeCloseTo(1, 3);
  await desktop.page.waitForTimeout(400);
  await desktop.screenshot('temperature-light');
  await desktop.page.getByLabel('To', { exact: true }).fill('400 K');
  await desktop.page.keyboard.press('Enter');
  await expect.poll(async () => (await cells('Sheet resistance by temperature', 36))[0]).toBe('126.8');
});

test('a wrong span says what is allowed beside its field', async () => {
  await desktop.page.getByLabel('To', { exact: true }).fill('900');
  await desktop.page.keyboard.press('Enter');
  await expect.poll(() => person.text('.span-field .field-message')).toMatch(/226\.85 °C are allowed/);
  await desktop.page.keyboard.press('Escape');
});

test('no accessibility rule is broken in it', async () => {
  expect(await violations()).toEqual([]);
});

test('the steps view shows the wafer after every step', async () => {
  await person.button('Steps').click();
  await desktop.page.getByRole('region', { name: 'Layers after every step' }).waitFor();
  const { entries } = recipeHistory(STUDY);
  const rows = await Promise.all(entries.map((_, row) => cells('Layers after every step', row)));
  rows.forEach(([step, what, , sheets], k) => {
    expect([step, what]).toEqual([String(entries[k].step), entries[k].title]);
    expect(numberIn(sheets.split(' / ')[0]) / entries[k].layers[0].sheetResistance_ohmSq).toBeCloseTo(1, 3);
  });
  await desktop.page.waitForTimeout(400);
  await desktop.screenshot('steps-light');
  expect(await violations()).toEqual([]);
});

test('the bias view shows resistance, depletion and capacitance of the chosen layer', async () => {
  await person.button('Bias').click();
  await desktop.page.getByRole('region', { name: 'Values by reverse voltage' }).waitFor();
  const result = biasSweep(STUDY, { layer: 1, junctions: 'both', from_V: 0, to_V: 10, points: 41 });
  const last = (await cells('Values by reverse voltage', 40)).map(numberIn);
  expect(last[0]).toBe(10);
  expect(last[1] / (result.sheetResistance_ohmSq[40] ?? 0)).toBeCloseTo(1, 3);
  expect(last[3] / (result.junctions[0].capacitance_nFcm2[40] ?? 0)).toBeCloseTo(1, 3);
  await desktop.page.waitForTimeout(400);
  await desktop.screenshot('bias-light');
  expect(await violations()).toEqual([]);
});

test('a model of one temperature says so in the view', async () => {
  await person.button('Predict').click();
  await person.settled();
  await person.button(/^Models/).click();
  await person.changes(() => person.field('models.mobility').selectOption('masetti'));
  await person.button('Temperature').click();
  await expect.poll(() => person.text('.sweep-problem')).toMatch(/knows one temperature only/);
  await person.button('Predict').click();
  await person.changes(() => person.press('Control+Z'));
});

test('a surface charge and a reverse voltage act on the readings', async () => {
  await person.button(/^Surface and bias/).click();
  await person.changes(() => person.field('surface').selectOption('charge'));
  await person.changes(() => person.field('surface.charge_cm2').fill('1e12'));
  await person.press('Enter');
  expect(await person.sheetResistance()).toBe(
    solve({ ...STUDY, surface: { charge_cm2: 1e12 } }).result.layers[0].sheetResistance_ohmSq,
  );
  await person.changes(() => person.field('surface').selectOption('none'));
  await person.changes(() => person.button('Reverse voltages').click());
  await person.changes(() => person.field('reverseBias_V[0]').fill('5 V'));
  expect(await person.sheetResistance()).toBe(
    solve({ ...STUDY, reverseBias_V: [5] }).result.layers[0].sheetResistance_ohmSq,
  );
  await desktop.screenshot('surface-bias-light');
  expect(desktop.errors).toEqual([]);
});
