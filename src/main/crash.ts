/** What happens when the main process itself fails: a test run ends at once; a person keeps the work. */

import { app, dialog } from 'electron';

function tell(error: unknown): void {
  const text = error instanceof Error ? (error.stack ?? error.message) : String(error);
  console.error(text);
  // Under test nobody could answer the question, and the run would hang.
  if (process.env.OHMSTRATA_TEST) {
    app.exit(1);
    return;
  }
  const chosen = dialog.showMessageBoxSync({
    type: 'error',
    message: 'Ohmstrata has met a defect of its own.',
    detail: `Your work is still open: save it now. Unsaved work was also kept and is offered at the next start.\n\n${text}`,
    buttons: ['Go on', 'Close Ohmstrata'],
    defaultId: 0,
    cancelId: 0,
    noLink: true,
  });
  if (chosen === 1) app.exit(1);
}

export function handleCrashes(): void {
  process.on('uncaughtException', tell);
  process.on('unhandledRejection', tell);
}
