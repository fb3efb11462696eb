/** The window as a person uses it: what is edited on the left is read on the right, and nothing is lost. */

import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { parseStudy, solve } from '../../src/core/index';
import { type Desktop, launch } from './launch';
import { Person } from './person';

const RESISTOR = 'demo-profiles/p-resistor.json';
let desktop: Desktop;
let person: Person;
const place = (name: string) => join(desktop.folder, name);

beforeAll(async () => {
  desktop = await launch();
  person = new Person(desktop);
});
afterAll(() => desktop?.end());
beforeEach(() => person.settled());

const predicted = (change: (study: ReturnType<typeof parseStudy>) => void = () => {}): number => {
  const study = parseStudy(readFileSync(RESISTOR, 'utf8'));
  change(study);
  return solve(study).result.layers[0].sheetResistance_ohmSq;
};

describe('the first screen', () => {
  test('is the demo resistor, solved and drawn, with the numbers of the command line', async () => {
    expect(await person.field('name').inputValue()).toBe('p-type resistor, lot LB-07');
    expect(await person.sheetResistance()).toBe(predicted());
    expect(await desktop.page.locator('.plot .main-svg').count()).toBeGreaterThan(0);
    expect(await person.text('.measured-line')).toMatch(/2390/);
    expect(desktop.errors).toEqual([]);
    expect(desktop.requests.filter((url) => !/^(app|data|blob):/.test(url))).toEqual([]);
  });
});

describe('editing the recipe', () => {
  test('a dose that is typed is followed while it is typed, and one undo takes all of it back', async () => {
    await person.openStep(1);
    await person.field('steps[0].dose_cm2').click();
    await person.changes(() => desktop.page.keyboard.type('2.4e13', { delay: 15 }));
    await expect
      .poll(() => person.sheetResistance())
      .toBe(predicted((study) => Object.assign(study.steps[0], { dose_cm2: 2.4e13 })));
    await person.press('Enter');
    expect(await person.button(/^Undo/).getAttribute('aria-label')).toContain('Undo dose of step 1');
    await person.changes(() => person.press('Control+Z'));
    expect(await person.sheetResistance()).toBe(predicted());
    await person.changes(() => person.press('Control+Y'));
    await person.changes(() => person.press('Control+Z'));
    expect(await person.field('steps[0].dose_cm2').inputValue()).toBe('1.2e13');
  });

  test('a typed unit wins over the one shown', async () => {
    await person.openStep(2);
    await person.field('steps[1].time_min').click();
    await person.changes(() => person.field('steps[1].time_min').fill('0.5 h'));
    expect(await person.sheetResistance()).toBe(
      predicted((study) => Object.assign(study.steps[1], { time_min: 30 })),
    );
    await person.changes(() => person.press('Escape'));
    expect(await person.sheetResistance()).toBe(predicted());
  });

  test('what cannot be used says why beside the field, and the study stays as it was', async () => {
    await person.openStep(1);
    for (const [typed, message] of [
      ['10 kg', /keV/],
      ['-5', /0\.1/],
      ['1e400', /finite/],
      ['', /missing/],
      ['abc', /keV/],
    ] as const) {
      await person.field('steps[0].energy_keV').fill(typed);
      await expect.poll(() => person.text('[data-step="1"] .field-message')).toMatch(message);
      expect(await person.field('steps[0].energy_keV').getAttribute('aria-invalid')).toBe('true');
      expect(await person.sheetResistance()).toBe(predicted());
    }
    await desktop.screenshot('error-light');
    await person.field('steps[0].energy_keV').press('Escape');
    expect(await person.field('steps[0].energy_keV').inputValue()).toBe('60');
  });

  test('arrow keys step a value, and Shift steps along 1, 2, 5', async () => {
    await person.openStep(1);
    await person.field('steps[0].energy_keV').click();
    await person.changes(() => person.press('ArrowUp'));
    expect(await person.field('steps[0].energy_keV').inputValue()).toBe('61');
    await person.changes(() => person.press('Shift+ArrowUp'));
    expect(await person.field('steps[0].energy_keV').inputValue()).toBe('100');
    await person.changes(() => person.press('Escape'));
    expect(await person.field('steps[0].energy_keV').inputValue()).toBe('60');
  });

  test('what stands in for channelling and implant damage is chosen on a step, and goes with what it is for', async () => {
    await person.openStep(1);
    await person.openStep(2);
    const [tail, transient] = [person.field('steps[0].tail'), person.field('steps[1].transient')];
    await person.changes(() => tail.selectOption('exponential'));
    await person.changes(() => transient.selectOption('plusOne'));
    expect(await person.sheetResistance()).toBe(
      predicted(({ steps }) => {
        Object.assign(steps[0], { tail: 'exponential' });
        Object.assign(steps[1], { transient: 'plusOne' });
      }),
    );
    await person.changes(() => person.field('steps[0].dopant').selectOption('phosphorus'));
    expect(await tail.count()).toBe(0);
    for (let i = 0; i < 3; i++) await person.changes(() => person.press('Control+Z'));
    expect(await person.sheetResistance()).toBe(predicted());
  });

  test('steps are added, moved, switched off, duplicated and removed, each undone by one Ctrl+Z', async () => {
    await person.button('Add a step').click();
    await person.changes(() => desktop.page.getByRole('menuitem', { name: /^Etch/ }).click());
    expect(await desktop.page.locator('[data-step]').count()).toBe(3);
    await person.step(3).focus();
    await person.changes(() => person.press('Alt+ArrowUp'));
    expect(await person.step(2).textContent()).toMatch(/Etch/);
    await person.changes(() => person.tool(2, 'Switch off').click());
    expect(await person.step(2).textContent()).toMatch(/off/);
    expect(await person.sheetResistance()).toBe(predicted());
    await person.changes(() => person.tool(2, 'Duplicate').click());
    await person.step(3).focus();
    await person.changes(() => person.press('Delete'));
    expect(await desktop.page.locator('[data-step]').count()).toBe(3);
    for (let i = 0; i < 5; i++) await person.changes(() => person.press('Control+Z'));
    expect(await desktop.page.locator('[data-step]').count()).toBe(2);
    expect(await person.sheetResistance()).toBe(predicted());
  });

  test('a step is dragged to another place', async () => {
    await desktop.page.evaluate(async () => {
      // A real drag is the system's; these are the events it sends to the page.
      const dataTransfer = new DataTransfer();
      const [first, grip] = ['[data-step="1"]', '[data-step="2"] .grip'].map((selector) =>
        document.querySelector(selector),
      ) as [Element, Element];
      const at = {
        clientX: first.getBoundingClientRect().x + 60,
        clientY: first.getBoundingClientRect().y + 5,
      };
      for (const [type, target] of [
        ['dragstart', grip],
        ['dragover', first],
        ['drop', first],
        ['dragend', grip],
      ] as const) {
        target.dispatchEvent(new DragEvent(type, { dataTransfer, bubbles: true, cancelable: true, ...at }));
        await new Promise(requestAnimationFrame);
      }
    });
    await expect.poll(() => person.step(1).textContent()).toMatch(/drive-in/);
    await person.settled();
    await person.changes(() => person.press('Control+Z'));
    expect(await person.step(1).textContent()).toMatch(/resistor implant/);
  });

  test('another mobility model is another number', async () => {
    await person.button(/^Models/).click();
    await person.changes(() => person.field('models.mobility').selectOption('masetti'));
    expect(await person.sheetResistance()).toBe(
      predicted((study) => Object.assign(study.models, { mobility: 'masetti' })),
    );
    await person.changes(() => person.press('Control+Z'));
  });
});

describe('reading', () => {
  test('the arrow keys move the crosshair, and the line above reads every curve there', async () => {
    await desktop.page.locator('.plot-box').focus();
    const depth = async () => Number.parseFloat(await person.text('.reading-depth'));
    await person.press('Shift+ArrowRight');
    const first = await depth();
    for (let i = 0; i < 2; i++) await person.press('Shift+ArrowRight');
    expect((await depth()) / first).toBeCloseTo(3, 2);
    const line = await person.text('.depth-reading');
    expect(line).toMatch(/cm²\/Vs/);
    await person.press('Escape');
    expect(await person.text('.reading-depth')).toBe('point at a depth');
  });

  test('the tracks are a table too', async () => {
    await desktop.page.locator('.plot-box').focus();
    await person.press('t');
    const table = desktop.page.getByRole('dialog').getByRole('table');
    expect(await table.locator('tbody tr').count()).toBeGreaterThan(20);
    expect(await table.locator('th').first().textContent()).toBe('depth (µm)');
    await person.press('Escape');
  });

  test('every command is found by part of its name', async () => {
    await person.press('Control+K');
    await desktop.page.keyboard.type('nm');
    await person.press('Enter');
    await expect.poll(() => person.button('nm').getAttribute('aria-pressed')).toBe('true');
    await person.button('µm').click();
  });
});

describe('files', () => {
  test('a study is saved, changed, opened again, and is the same', async () => {
    await desktop.answerSave(place('kept.json'));
    await person.changes(() => person.field('name').fill('kept study = "ünïcode"'));
    await person.press('Control+S');
    await expect.poll(() => person.status()).toBe('Saved kept.json');
    expect(await person.text('.unsaved')).toBe('saved');
    const saved = parseStudy(readFileSync(place('kept.json'), 'utf8'));
    expect(saved).toEqual({
      ...parseStudy(readFileSync(RESISTOR, 'utf8')),
      name: 'kept study = "ünïcode"',
    });
    await person.openStep(1);
    await person.changes(() => person.field('steps[0].dose_cm2').fill('5e13'));
    await person.press('Enter');
    expect(await person.text('.unsaved')).toBe('unsaved');
    writeFileSync(place('fresh.json'), readFileSync(RESISTOR));
    await person.opens(place('fresh.json'));
    expect(await person.status()).toBe('Opened fresh.json');
    expect(await person.field('name').inputValue()).toBe('p-type resistor, lot LB-07');
  });

  test('a bad study is refused in words, and the open one stays', async () => {
    writeFileSync(place('bad.json'), '{"format":"ohmstrata-study/1","wafer":{"dopant":"neon"}}');
    await desktop.answerOpen(place('bad.json'));
    await person.press('Control+O');
    await expect.poll(() => person.status()).toMatch(/^Not opened: bad\.json: wafer\.dopant: .*boron/);
    expect(await person.sheetResistance()).toBe(predicted());
  });

  test('readings, columns and pictures are exported', async () => {
    await desktop.answerSave(place('readings.csv'));
    await person.press('Control+E');
    await expect.poll(() => person.status()).toBe('Exported readings.csv');
    const readings = readFileSync(place('readings.csv'), 'utf8');
    expect(readings).toMatch(
      /^# Ohmstrata 0\.1\.0\n# study: p-type resistor, lot LB-07\n# study SHA-256: [0-9a-f]{64}/,
    );
    expect(readings).toContain(String(predicted()));

    await desktop.answerSave(place('columns.csv'));
    await person.press('Control+Shift+E');
    await expect.poll(() => person.status()).toBe('Exported columns.csv');
    expect(readFileSync(place('columns.csv'), 'utf8')).toMatch(/\ndepth_um,/);

    for (const format of ['svg', 'png'] as const) {
      await desktop.answerSave(place(`tracks.${format}`));
      await desktop.menu(format === 'svg' ? 'exportSvg' : 'exportPng');
      await desktop.page.getByRole('dialog').getByRole('button', { name: 'Export' }).click();
      await expect.poll(() => person.status(), { timeout: 10_000 }).toBe(`Exported tracks.${format}`);
    }
    const svg = readFileSync(place('tracks.svg'), 'utf8');
    expect(svg).toMatch(/^<svg /);
    expect(svg).toContain('p-type resistor, lot LB-07');
    expect(svg).not.toMatch(/<script|javascript:|https?:\/\/(?!www\.w3\.org)/);
    expect([...readFileSync(place('tracks.png')).subarray(0, 4)]).toEqual([137, 80, 78, 71]);
  });
});
