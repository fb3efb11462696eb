/** How the window looks and answers: sizes, themes, accessibility, long words, and how long things take. */

import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import axe from 'axe-core';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { type Desktop, launch } from './launch';
import { Person } from './person';

const SIZES = [
  [1280, 800],
  [1920, 1080],
  [960, 600],
] as const;

let desktop: Desktop;
let person: Person;

beforeAll(async () => {
  desktop = await launch();
  person = new Person(desktop);
});
afterAll(() => desktop?.end());
beforeEach(() => person.settled());

async function resize(width: number, height: number): Promise<void> {
  await desktop.app.evaluate(
    ({ BrowserWindow }, [w, h]) => BrowserWindow.getAllWindows()[0].setContentSize(w, h),
    [width, height],
  );
  await desktop.page.waitForFunction((w) => window.innerWidth === w, width);
  await desktop.page.waitForTimeout(300);
}

async function chooseTheme(theme: 'Light' | 'Dark'): Promise<void> {
  await person.button('Theme').click();
  await desktop.page.getByRole('menuitemradio', { name: theme }).click();
  await desktop.page.waitForFunction(
    (t) => document.documentElement.dataset.theme === t,
    theme.toLowerCase(),
  );
  await desktop.page.waitForTimeout(300);
}

/** Runs the checker in the page's own world, past the page's policy, as a developer's tool would. */
async function violations(): Promise<string[]> {
  return (await desktop.app.evaluate(async ({ BrowserWindow }, source) => {
    const { webContents } = BrowserWindow.getAllWindows()[0];
    return webContents.executeJavaScript(`${source};
      axe.run(document, { resultTypes: ['violations'] }).then(({ violations }) =>
        violations.map((v) => v.id + ': ' + v.nodes.map((n) => n.html.slice(0, 200)).join(' | ')))`);
  }, axe.source)) as string[];
}

describe.each(['Light', 'Dark'] as const)('%s', (theme) => {
  beforeAll(() => chooseTheme(theme));

  test.each(SIZES)('at %i x %i nothing leaves the window', async (width, height) => {
    await resize(width, height);
    const over = await desktop.page.evaluate(() => ({
      x: document.documentElement.scrollWidth - window.innerWidth,
      y: document.documentElement.scrollHeight - window.innerHeight,
      bar: (document.querySelector('.top-bar')?.scrollWidth ?? 0) - window.innerWidth,
    }));
    expect(over).toEqual({ x: 0, y: 0, bar: 0 });
    await desktop.screenshot(`main-${theme.toLowerCase()}-${width}x${height}`);
  });

  test('no accessibility rule is broken, with a step, the models and the wafer open', async () => {
    await resize(1280, 800);
    await person.openStep(1);
    for (const name of [/^Models/, /^Wafer/, /^Measured/])
      if ((await person.button(name).getAttribute('aria-expanded')) === 'false')
        await person.button(name).click();
    expect(await violations()).toEqual([]);
    await desktop.screenshot(`open-${theme.toLowerCase()}`);
  });

  test('nor in the dialogs, the menus and the import sheet', async () => {
    await person.press('Control+K');
    expect(await violations()).toEqual([]);
    await desktop.screenshot(`commands-${theme.toLowerCase()}`);
    await person.press('Escape');
    await person.button('Add a step').click();
    expect(await violations()).toEqual([]);
    await desktop.screenshot(`add-step-${theme.toLowerCase()}`);
    await person.press('Escape');
    await desktop.menu('about');
    await desktop.page.getByRole('dialog').waitFor();
    expect(await violations()).toEqual([]);
    await person.press('Escape');
    await person.drops('pair.txt', readFileSync('demo-profiles/sims-arsenic-boron.txt', 'utf8'));
    await desktop.page.locator('.profile').first().waitFor();
    expect(await violations()).toEqual([]);
    await desktop.screenshot(`import-pair-${theme.toLowerCase()}`);
    await person.press('Escape');
  });
});

test('very long names are cut where they stand, and whole in their tooltip', async () => {
  await resize(960, 600);
  const long = `${'a very long name '.repeat(11)}end`;
  const study = JSON.parse(readFileSync('demo-profiles/npn-stack.json', 'utf8'));
  study.name = long;
  study.steps[0].label = long;
  study.steps[3].label = 'Wort'.repeat(40);
  const path = join(desktop.folder, 'long.json');
  writeFileSync(path, JSON.stringify(study));
  await person.opens(path);
  expect(await desktop.page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBe(0);
  expect(await person.step(1).locator('.card-title').getAttribute('title')).toBe(long);
  await desktop.screenshot('long-names');
});

test('how long things take is measured and written to out/window-timings.json', async () => {
  await resize(1280, 800);
  const path = join(desktop.folder, 'p.json');
  writeFileSync(path, readFileSync('demo-profiles/p-resistor.json'));
  await person.opens(path);
  await person.openStep(1);
  await person.field('steps[0].energy_keV').click();
  const edits: { readings: number; tracks: number }[] = [];
  for (let i = 0; i < 15; i++) {
    await desktop.page.evaluate(() => performance.clearMarks());
    await person.changes(() => person.press('ArrowUp'));
    edits.push(
      await desktop.page.evaluate(() => {
        const at = (name: string) => performance.getEntriesByName(name).at(-1)?.startTime ?? Number.NaN;
        const start = at('ohmstrata:edit');
        return { readings: at('ohmstrata:readings') - start, tracks: at('ohmstrata:tracks') - start };
      }),
    );
  }
  await person.press('Escape');
  const fresh = await launch();
  await new Person(fresh).settled();
  const first = await fresh.page.evaluate(() => ({
    readings: performance.getEntriesByName('ohmstrata:readings')[0].startTime,
    tracks: performance.getEntriesByName('ohmstrata:tracks')[0].startTime,
  }));
  await fresh.end();
  const median = (values: number[]) => values.sort((a, b) => a - b)[Math.floor(values.length / 2)];
  const timings = {
    fromNavigationToReadings_ms: first.readings,
    fromNavigationToTracks_ms: first.tracks,
    fromEditToReadings_ms: median(edits.map(({ readings }) => readings)),
    fromEditToTracks_ms: median(edits.map(({ tracks }) => tracks)),
  };
  mkdirSync('out', { recursive: true });
  writeFileSync('out/window-timings.json', `${JSON.stringify(timings, null, 2)}\n`);
  for (const value of Object.values(timings)) expect(value).toBeGreaterThan(0);
});
