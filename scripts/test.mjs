/**
 * npm test: sets up what is missing, checks style, types and unused code, then runs every test, with those of the
 * window on a virtual display where there is none. Arguments go to Vitest. The last line counts tests that passed and
 * failed; a check or a test file that breaks before it can count its tests counts as one failure.
 */

import { spawn } from 'node:child_process';
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { CLI, DESKTOP, ensureBuild } from './setup/build.mjs';
import { countTests } from './setup/countTests.mjs';
import { displayWorks } from './setup/display.mjs';
import { ensureLibraries, ensureVirtualDisplay } from './setup/libraries.mjs';
import { alone } from './setup/lock.mjs';
import { ensureModules } from './setup/modules.mjs';
import { ensureRuntime, sandboxFlags } from './setup/runtime.mjs';
import { ROOT, say, stage } from './setup/say.mjs';

const LIMIT_MS = 15 * 60_000;
const REPORT = join(ROOT, 'out', 'test-report.json');
const node = (script, ...args) => [process.execPath, join(ROOT, 'node_modules', script), ...args];

/** Exit code of a command; whatever it started is ended with it when the time for all of them is up. */
function run(command, environment = process.env) {
  return new Promise((done) => {
    const child = spawn(command[0], command.slice(1), {
      cwd: ROOT,
      stdio: ['ignore', 'inherit', 'inherit'],
      env: environment,
      detached: process.platform !== 'win32',
    });
    const end = () => {
      try {
        process.kill(process.platform === 'win32' ? child.pid : -child.pid, 'SIGKILL');
      } catch {
        // It has ended by itself.
      }
    };
    const timer = setTimeout(
      () => {
        say(`no end after ${LIMIT_MS / 60_000} minutes: stopped`);
        end();
      },
      Math.max(0, LIMIT_MS - performance.now()),
    );
    const stop = () => {
      end();
      process.exit(130);
    };
    process.on('SIGINT', stop).on('SIGTERM', stop);
    child.on('error', (error) => say(error.message));
    child.on('close', (code) => {
      clearTimeout(timer);
      process.off('SIGINT', stop).off('SIGTERM', stop);
      done(code ?? 1);
    });
  });
}

const { executable, hasDisplay } = await alone(async () => {
  await ensureModules();
  await ensureBuild(CLI);
  await ensureBuild(DESKTOP);
  const runtime = await ensureRuntime();
  await ensureLibraries(runtime);
  const display = await displayWorks();
  if (!display) await ensureVirtualDisplay();
  return { executable: runtime, hasDisplay: display };
});

const checks = {
  'style (biome)': node('@biomejs/biome/bin/biome', 'check'),
  'types (tsc)': node('typescript/bin/tsc', '--noEmit'),
  'unused code (knip)': node('knip/bin/knip.js'),
};
const broken = [];
for (const [name, command] of Object.entries(checks))
  if ((await stage(name, () => run(command))) !== 0) broken.push(name);

rmSync(REPORT, { force: true });
const vitest = node(
  'vitest/vitest.mjs',
  'run',
  '--reporter=default',
  '--reporter=json',
  `--outputFile.json=${REPORT}`,
  ...process.argv.slice(2),
);
const code = await stage('tests (vitest)', () =>
  run(hasDisplay ? vitest : ['xvfb-run', '-a', '-s', '-screen 0 1440x900x24', ...vitest], {
    ...process.env,
    OHMSTRATA_ELECTRON: executable,
    OHMSTRATA_ELECTRON_FLAGS: sandboxFlags(executable).join(' '),
  }),
);

const { passed, failed } = countTests(REPORT, code);
for (const name of broken) say(`${name} found faults: see above`);
console.log(`${passed} passed, ${failed + broken.length} failed`);
process.exit(failed + broken.length === 0 ? 0 : 1);
