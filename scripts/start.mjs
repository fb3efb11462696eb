/** npm start: sets up what is missing and opens the window; without a display, solves the demo study in the terminal. */

import { displayWorks } from './setup/display.mjs';
import { ROOT, say } from './setup/say.mjs';

async function openWindow(args) {
  const { alone } = await import('./setup/lock.mjs');
  const { ensureModules } = await import('./setup/modules.mjs');
  const { DESKTOP, ensureBuild } = await import('./setup/build.mjs');
  const { ensureRuntime, sandboxFlags } = await import('./setup/runtime.mjs');
  const { ensureLibraries } = await import('./setup/libraries.mjs');
  const { spawn } = await import('node:child_process');

  const executable = await alone(async () => {
    await ensureModules();
    await ensureBuild(DESKTOP);
    const runtime = await ensureRuntime();
    await ensureLibraries(runtime);
    return runtime;
  });
  const program = spawn(executable, [...sandboxFlags(executable), ROOT, ...args], { stdio: 'inherit' });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => program.kill(signal));
  program.on('close', (code) => process.exit(code ?? 1));
}

async function solveDemo() {
  const { DISPLAY } = process.env;
  say(
    `no display to open a window on: DISPLAY is ${DISPLAY ? `${DISPLAY}, which does not answer` : 'not set'}.`,
  );
  say('For the window: start from a graphical session, or on a virtual display with xvfb-run -a npm start.');
  say('Here instead is the demo study, as ohmstrata solve demo-profiles/p-resistor.json prints it:');
  process.chdir(ROOT);
  const { runCli } = await import('./setup/cli.mjs');
  await runCli(['solve', 'demo-profiles/p-resistor.json']);
}

if (await displayWorks()) await openWindow(process.argv.slice(2));
else await solveDemo();
