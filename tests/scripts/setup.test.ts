/** The parts of the set-up that decide something: how tests are counted, and whether there is a display. */

import { writeFileSync } from 'node:fs';
import { type AddressInfo, createServer } from 'node:net';
import { join } from 'node:path';
import { expect } from 'vitest';
import { filesIn, ROOT, read } from '../house/files';
import { test } from '../main/folder';

const part = (name: string) => join(ROOT, 'scripts', 'setup', name);

const { countTests } = (await import(part('countTests.mjs'))) as {
  countTests(report: string, exitCode: number): { passed: number; failed: number };
};
const { displayWorks } = (await import(part('display.mjs'))) as {
  displayWorks(environment: Record<string, string>): Promise<boolean>;
};

const file = (status: string, ...tests: string[]) => ({
  status,
  assertionResults: tests.map((each) => ({ status: each })),
});
function report(folder: string, testResults: ReturnType<typeof file>[]): string {
  const count = (status: string) =>
    testResults.flatMap((each) => each.assertionResults).filter((each) => each.status === status).length;
  const path = join(folder, 'report.json');
  writeFileSync(
    path,
    JSON.stringify({ numPassedTests: count('passed'), numFailedTests: count('failed'), testResults }),
  );
  return path;
}

test('tests are summed over the files', ({ folder }) => {
  const path = report(folder, [file('passed', 'passed', 'passed'), file('failed', 'passed', 'failed')]);
  expect(countTests(path, 1)).toEqual({ passed: 3, failed: 1 });
});

test('a file that breaks before its tests counts as a failure', ({ folder }) => {
  const path = report(folder, [file('passed', 'passed'), file('failed'), file('failed', 'passed')]);
  expect(countTests(path, 1)).toEqual({ passed: 2, failed: 2 });
});

test('a run that ends badly without a failed test counts as a failure, and so does one without a report', ({
  folder,
}) => {
  expect(countTests(report(folder, [file('passed', 'passed')]), 1)).toEqual({ passed: 1, failed: 1 });
  expect(countTests(join(folder, 'none.json'), 137)).toEqual({ passed: 0, failed: 1 });
});

test.runIf(process.platform === 'linux')('a display counts only when it answers', async () => {
  expect(await displayWorks({})).toBe(false);
  expect(await displayWorks({ DISPLAY: 'words' })).toBe(false);
  expect(await displayWorks({ DISPLAY: ':987654' })).toBe(false);
  expect(await displayWorks({ WAYLAND_DISPLAY: 'none', XDG_RUNTIME_DIR: '/nowhere' })).toBe(false);
  const server = createServer().listen(0, '127.0.0.1');
  await new Promise((done) => server.once('listening', done));
  const number = (server.address() as AddressInfo).port - 6000;
  expect(await displayWorks({ DISPLAY: `127.0.0.1:${number}.0` })).toBe(true);
  server.close();
});

test('the set-up starts on Node alone: none of its parts imports a package', () => {
  const parts = filesIn('scripts', /\.mjs$/);
  const imported = parts.flatMap((path) =>
    [...read(path).matchAll(/(?:from|import\()\s*'([^']+)'/g)].map(([, specifier]) => specifier),
  );
  expect(imported.length).toBeGreaterThan(30);
  expect(imported.filter((specifier) => !/^(node:|\.\.?\/)/.test(specifier))).toEqual([]);
});
