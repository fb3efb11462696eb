/** The guards as they stand in the real window: what a hostile file's content could at most try from the page. */

import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { POLICY_HEADER } from '../../src/main/contentSecurityPolicy';
import { type Desktop, launch } from './launch';

const PAGE = 'app://bundle/index.html';
let desktop: Desktop;

beforeAll(async () => {
  desktop = await launch();
});
afterAll(() => desktop?.end());

test('the page is isolated: neither Node nor Electron is in it', async () => {
  const kinds = await desktop.page.evaluate(() =>
    ['require', 'process', 'module', 'Buffer', 'ipcRenderer', 'electron'].map(
      (name) => typeof Reflect.get(window, name),
    ),
  );
  expect(kinds).toEqual(Array(6).fill('undefined'));
});

test('the window’s own settings are those written down', async () => {
  const settings = await desktop.app.evaluate(({ BrowserWindow }) => {
    const contents = BrowserWindow.getAllWindows()[0].webContents as unknown as {
      getLastWebPreferences(): Record<string, unknown>;
    };
    const { contextIsolation, sandbox, nodeIntegration, webSecurity } = contents.getLastWebPreferences();
    return { contextIsolation, sandbox, nodeIntegration, webSecurity };
  });
  expect(settings).toEqual({
    contextIsolation: true,
    sandbox: true,
    nodeIntegration: false,
    webSecurity: true,
  });
});

test('the bridge cannot be replaced or extended', async () => {
  const after = await desktop.page.evaluate(() => {
    const before = window.ohmstrata;
    try {
      (window as { ohmstrata: unknown }).ohmstrata = {};
    } catch {
      // Assigning to it throws in strict code.
    }
    return before === window.ohmstrata;
  });
  expect(after).toBe(true);
});

test('every request so far went to our own files', () => {
  expect(
    desktop.requests.filter((address) => !/^(app:\/\/bundle\/|data:|blob:app:\/\/bundle\/)/.test(address)),
  ).toEqual([]);
});

test('the page comes with the policy as a header', async () => {
  const policy = await desktop.page.evaluate(async (address) => {
    const response = await fetch(address);
    return response.headers.get('content-security-policy');
  }, PAGE);
  expect(policy).toBe(POLICY_HEADER);
});

test('an inline script, an inline handler and evaluation are blocked', async () => {
  const ran = await desktop.page.evaluate(async () => {
    const marks = window as unknown as Record<string, unknown>;
    const script = document.createElement('script');
    script.textContent = 'window.ranInline = true';
    document.head.append(script);
    const holder = document.createElement('div');
    holder.innerHTML = '<img src="x" onerror="window.ranHandler = true">';
    document.body.append(holder);
    // In a task of its own: within the test's own call the driver lifts the ban on evaluation.
    const evaluated = await new Promise((done) =>
      setTimeout(() => {
        try {
          // biome-ignore lint/security/noGlobalEval: the test is that it cannot run.
          window.eval('1');
          done(true);
        } catch {
          done(false);
        }
      }),
    );
    await new Promise((done) => setTimeout(done, 300));
    holder.remove();
    script.remove();
    return [marks.ranInline, marks.ranHandler, evaluated];
  });
  expect(ran).toEqual([undefined, undefined, false]);
});

test('no file of the machine and no other host can be fetched', async () => {
  const secret = join(desktop.folder, 'secret.txt');
  writeFileSync(secret, 'secret');
  const results = await desktop.page.evaluate(
    (addresses) =>
      Promise.all(
        addresses.map((address) =>
          fetch(address)
            .then(async (response) => (response.ok ? response.text() : `status ${response.status}`))
            .catch(() => 'failed'),
        ),
      ),
    [
      `file://${secret}`,
      'https://example.com/',
      'app://elsewhere/index.html',
      'app://bundle/%2e%2e%2fmain%2findex.cjs',
    ],
  );
  expect(results).toEqual(['failed', 'failed', 'failed', 'status 400']);
});

test('the page stays where it is', async () => {
  for (const address of ['https://example.com/', 'file:///etc/hostname', 'app://bundle/other.html']) {
    await desktop.page.evaluate((target) => {
      location.href = target;
    }, address);
    await desktop.page.waitForTimeout(200);
    expect(desktop.page.url()).toBe(PAGE);
  }
});

test('no second window opens', async () => {
  expect(await desktop.page.evaluate(() => window.open('app://bundle/index.html'))).toBeNull();
  expect(await desktop.app.evaluate(({ BrowserWindow }) => BrowserWindow.getAllWindows().length)).toBe(1);
});

test('permissions are denied, but for writing to the clipboard', async () => {
  const answers = await desktop.page.evaluate(async () => {
    const state = async (name: string) =>
      (await navigator.permissions.query({ name: name as PermissionName })).state;
    const position = await new Promise((done) =>
      navigator.geolocation.getCurrentPosition(
        () => done('given'),
        (error) => done(error.code),
      ),
    );
    return {
      notifications: await state('notifications'),
      reading: await state('clipboard-read'),
      microphone: await state('microphone'),
      position,
    };
  });
  expect(answers).toEqual({
    notifications: 'denied',
    reading: 'denied',
    microphone: 'denied',
    position: 1,
  });
});

test('a text can be copied to the clipboard', async () => {
  await desktop.page.evaluate(() => navigator.clipboard.writeText('1473.2 ohm/sq'));
  expect(await desktop.app.evaluate(async ({ clipboard }) => await clipboard.readText())).toBe(
    '1473.2 ohm/sq',
  );
});

test('arguments other than agreed are refused with a message, never an exception', async () => {
  const outcome = await desktop.page.evaluate(() => window.ohmstrata!.setTheme('pink' as 'dark'));
  expect(outcome).toEqual({ ok: false, message: expect.stringContaining('refused') });
});
