/** Files through the real bridge, the dialogs answered for the person. */

import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { type Desktop, launch } from './launch';

const STUDY = JSON.stringify({
  format: 'ohmstrata-study/1',
  wafer: { dopant: 'phosphorus', concentration_cm3: 1e15 },
  steps: [
    { step: 'table', dopant: 'boron', file: 'a.csv' },
    { step: 'table', dopant: 'boron', file: '../a.csv' },
  ],
});
let desktop: Desktop;
const place = (name: string) => join(desktop.folder, name);

beforeAll(async () => {
  desktop = await launch();
  writeFileSync(place('s.json'), STUDY);
  writeFileSync(place('a.csv'), '0,1e18\n1,1e15\n');
});
afterAll(() => desktop?.end());

test('a study opens with its table, and the table outside its folder is refused', async () => {
  await desktop.answerOpen(place('s.json'));
  const opened = await desktop.page.evaluate(async () => {
    const outcome = await window.ohmstrata!.openStudy();
    if (!outcome.ok || outcome.value === null) return null;
    const { name, text, tables } = outcome.value;
    const inside = tables['a.csv'];
    return {
      name,
      text,
      inside: inside.ok && new TextDecoder().decode(inside.value),
      outside: tables['../a.csv'],
    };
  });
  expect(opened).toEqual({
    name: 's.json',
    text: STUDY,
    inside: '0,1e18\n1,1e15\n',
    outside: { ok: false, message: expect.stringContaining('own folder') },
  });
});

test('a cancelled dialog gives null', async () => {
  await desktop.answerOpen(null);
  await desktop.answerSave(null);
  const answers = await desktop.page.evaluate(async () => [
    await window.ohmstrata!.openStudy(),
    await window.ohmstrata!.openTable(),
    await window.ohmstrata!.saveStudy({ id: null, suggestedName: 'x', text: '{}', as: false }),
    await window.ohmstrata!.exportFile({ kind: 'csv', suggestedName: 'x', data: '' }),
  ]);
  expect(answers).toEqual(Array(4).fill({ ok: true, value: null }));
});

test('a table opens as its bytes', async () => {
  await desktop.answerOpen(place('a.csv'));
  const table = await desktop.page.evaluate(async () => {
    const outcome = await window.ohmstrata!.openTable();
    return outcome.ok && outcome.value && { name: outcome.value.name, length: outcome.value.bytes.length };
  });
  expect(table).toEqual({ name: 'a.csv', length: 14 });
});

test('a study is saved where the dialog says, then again without a dialog', async () => {
  await desktop.answerSave(place('new'));
  const names = await desktop.page.evaluate(async () => {
    const first = await window.ohmstrata!.saveStudy({
      id: null,
      suggestedName: 'x',
      text: '{"a":1}',
      as: false,
    });
    const id = first.ok && first.value ? first.value.id : null;
    const again = await window.ohmstrata!.saveStudy({ id, suggestedName: 'x', text: '{"a":2}', as: false });
    return [first, again].map((outcome) => outcome.ok && outcome.value?.name);
  });
  expect(names).toEqual(['new.json', 'new.json']);
  expect(readFileSync(place('new.json'), 'utf8')).toBe('{"a":2}');
});

test('a place that cannot be written to gives a message, and nothing is lost', async () => {
  await desktop.answerSave(join(desktop.folder, 'none', 'x.json'));
  const outcome = await desktop.page.evaluate(() =>
    window.ohmstrata!.saveStudy({ id: null, suggestedName: 'x', text: '{}', as: false }),
  );
  expect(outcome).toEqual({ ok: false, message: expect.stringContaining('"x.json" could not be saved') });
});

test('pictures and tables are exported as they are', async () => {
  await desktop.answerSave(place('x.png'));
  await desktop.page.evaluate(() =>
    window.ohmstrata!.exportFile({
      kind: 'png',
      suggestedName: 'x',
      data: new Uint8Array([137, 80, 78, 71]),
    }),
  );
  expect([...readFileSync(place('x.png'))]).toEqual([137, 80, 78, 71]);
  await desktop.answerSave(place('x.csv'));
  await desktop.page.evaluate(() =>
    window.ohmstrata!.exportFile({ kind: 'csv', suggestedName: 'x', data: 'depth_um,µ\n' }),
  );
  expect(readFileSync(place('x.csv'), 'utf8')).toBe('depth_um,µ\n');
});

test('a chosen theme reaches the page and the window’s ground, and is remembered', async () => {
  for (const theme of ['dark', 'light'] as const) {
    await desktop.page.evaluate((chosen) => window.ohmstrata!.setTheme(chosen), theme);
    await desktop.page.waitForFunction(
      (dark) => matchMedia('(prefers-color-scheme: dark)').matches === dark,
      theme === 'dark',
    );
    const ground = await desktop.app.evaluate(({ BrowserWindow }) =>
      BrowserWindow.getAllWindows()[0].getBackgroundColor(),
    );
    expect(ground.toLowerCase()).toBe(theme === 'dark' ? '#14171b' : '#f6f7f9');
    expect(JSON.parse(readFileSync(join(desktop.folder, 'user-data', 'settings.json'), 'utf8'))).toEqual({
      theme,
    });
  }
});

test('the runtime is told as it is', async () => {
  const facts = await desktop.page.evaluate(() => window.ohmstrata!.runtimeFacts());
  const versions = await desktop.app.evaluate(() => process.versions as Record<string, string>);
  expect(facts).toMatchObject({
    ok: true,
    value: { program: '0.1.0', electron: versions.electron, chrome: versions.chrome, node: versions.node },
  });
});

test('a menu command reaches the page', async () => {
  const heard = desktop.page.evaluate(
    () =>
      new Promise((done) => {
        const stop = window.ohmstrata!.onMenuCommand((command) => {
          stop();
          done(command);
        });
      }),
  );
  await desktop.page.waitForTimeout(100);
  await desktop.menu('commands');
  expect(await heard).toBe('commands');
});
