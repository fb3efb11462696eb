/** The requests the window may make of the main process: the closed list both sides of the border go by. */

import type { Bridge, Outcome } from './bridge';

export type Channel = Exclude<keyof Bridge, 'onMenuCommand'>;

export const CHANNELS = [
  'openStudy',
  'initialStudy',
  'saveStudy',
  'openTable',
  'exportFile',
  'showDocumentState',
  'keepRecovery',
  'takeRecovery',
  'setTheme',
  'runtimeFacts',
] as const satisfies readonly Channel[];

/** The one message that goes the other way. */
export const MENU_COMMAND = 'menuCommand';

type Answer<C extends Channel> = Extract<Awaited<ReturnType<Bridge[C]>>, { ok: true }>['value'];

/** What the main process does for each request. A failure is thrown here and becomes an `Outcome` at the border. */
export type Handlers = { [C in Channel]: (...request: Parameters<Bridge[C]>) => Promise<Answer<C>> };

export type AnyOutcome = Outcome<unknown>;
