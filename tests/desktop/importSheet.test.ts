/** Tables dropped on the window: what the sheet shows, asks, refuses, and what it leaves in the recipe. */

import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { embedTable, parseStudy, readTable, solve } from '../../src/core/index';
import { type Desktop, launch } from './launch';
import { Person } from './person';

let desktop: Desktop;
let person: Person;
const sheet = () => desktop.page.locator('.sheet');
const take = () => sheet().getByRole('button', { name: /^Add/ });

beforeAll(async () => {
  desktop = await launch();
  person = new Person(desktop);
});
afterAll(() => desktop?.end());
beforeEach(() => person.settled());

test('a dropped table shows how it was read, and taken it is a step with the readings of the core', async () => {
  const file = 'demo-profiles/sims-boron.csv';
  const text = readFileSync(file, 'utf8');
  await person.drops('sims-boron.csv', text);
  await sheet().locator('.profile').waitFor();
  expect(await sheet().locator('.profile').textContent()).toMatch(/321 points/);
  await desktop.screenshot('import-light');
  await person.changes(() => take().click());
  expect(await person.step(3).textContent()).toMatch(/sims-boron\.csv/);

  const study = parseStudy(readFileSync('demo-profiles/p-resistor.json', 'utf8'));
  const reading = readTable(readFileSync(file));
  study.steps.push(embedTable(reading, 0, { name: 'x', sha256: '0'.repeat(64) }));
  expect(await person.sheetResistance()).toBe(solve(study).result.layers[0].sheetResistance_ohmSq);
  await person.changes(() => person.press('Control+Z'));
  expect(await desktop.page.locator('[data-step]').count()).toBe(2);
});

test('an ambiguous decimal sign is asked and never guessed', async () => {
  await person.drops('ambiguous.csv', 'depth (nm);boron (cm-3)\n1,000;1e18\n2,000;5e17\n3,000;1e17\n');
  await sheet().locator('.sheet-question').waitFor();
  expect(await take().isDisabled()).toBe(true);
  await desktop.screenshot('import-question-light');
  await sheet().locator('.sheet-answers label').filter({ hasText: /comma/i }).locator('input').click();
  await expect.poll(() => take().isDisabled()).toBe(false);
  expect(await sheet().locator('.profile').textContent()).toMatch(/to 0\.003000 µm/);
  await person.press('Escape');
  await sheet().waitFor({ state: 'detached' });
});

test('a unit that is not stated is asked', async () => {
  await person.drops('units.csv', 'depth,boron\n1,1e18\n2,5e17\n3,1e17\n');
  await sheet().locator('.sheet-question').first().waitFor();
  expect(await take().isDisabled()).toBe(true);
  await sheet().getByRole('button', { name: 'Cancel' }).click();
});

test('a dopant that the heading does not name must be chosen', async () => {
  await person.drops('nameless.csv', 'depth (um),concentration (cm-3)\n0.1,1e18\n0.2,5e17\n0.3,1e17\n');
  await sheet().locator('.profile').waitFor();
  expect(await take().isDisabled()).toBe(true);
  await sheet().locator('.profile select').selectOption('arsenic');
  await person.changes(() => take().click());
  expect(await person.step(3).textContent()).toMatch(/As, nameless\.csv/);
  await person.changes(() => person.press('Control+Z'));
});

test.each([
  ['empty.csv', ''],
  ['prose.txt', 'This is a letter.\nIt has no table.\n'],
  ['binary.dat', '\u0000\u0001\u0002\u0003'.repeat(400)],
  ['one-row.csv', 'depth (nm),B (cm-3)\n1,1e18\n'],
])('%s is refused in the sheet, with the file named, and the study is untouched', async (name, content) => {
  const before = await person.sheetResistance();
  await person.drops(name, content);
  await sheet().locator('.sheet-problem').waitFor();
  expect(await sheet().locator('.sheet-problem').textContent()).toContain(name);
  expect(await take().isDisabled()).toBe(true);
  await sheet().getByRole('button', { name: 'Cancel' }).click();
  expect(await person.sheetResistance()).toBe(before);
});

test('what is neither study nor table is refused in words', async () => {
  await desktop.page.evaluate(() => {
    const transfer = new DataTransfer();
    transfer.items.add(new File(['x'], 'photo.png', { type: 'image/png' }));
    document.dispatchEvent(
      new DragEvent('drop', { dataTransfer: transfer, bubbles: true, cancelable: true }),
    );
  });
  await expect.poll(() => person.status()).toMatch(/photo\.png is neither a study/);
});

test('a million rows are read with the window alive, and their dose is that of every row', async () => {
  const rows = 1_000_000;
  const lines = ['depth (nm),boron (cm-3)'];
  for (let i = 0; i < rows; i++) lines.push(`${i / 1000},${(1e19 * Math.exp(-i / 1e5)).toExponential(5)}`);
  const path = join(desktop.folder, 'million.csv');
  writeFileSync(path, lines.join('\n'));
  await desktop.answerOpen(path);
  await person.press('Control+I');
  await sheet().locator('.sheet-progress').waitFor();
  // The window answers while the table is read.
  await person.press('Control+K');
  await desktop.page.getByRole('dialog').waitFor();
  await person.press('Escape');
  await sheet().locator('.profile').waitFor({ timeout: 40_000 });
  expect(await sheet().locator('.profile').textContent()).toMatch(/1,000,000 points/);
  await person.changes(() => take().click());
  // 1e19 exp(-x/0.1 um) to 1 um.
  const dose = 1e19 * 1e-5 * (1 - Math.exp(-10));
  const figures = await desktop.page.locator('.step-figures').nth(2).textContent();
  const [, mantissa, exponent] = figures?.match(/dose(\d\.\d+)×10([⁰¹²³⁴⁵⁶⁷⁸⁹]+)/) ?? [];
  const power = [...exponent].map((digit) => '⁰¹²³⁴⁵⁶⁷⁸⁹'.indexOf(digit)).join('');
  expect(Number(`${mantissa}e${power}`) / dose).toBeCloseTo(1, 3);
  await person.changes(() => person.press('Control+Z'));
  expect(desktop.errors).toEqual([]);
}, 90_000);
