/** One table worker as long as it is needed; ending it gives up whatever it is doing. */

import * as Comlink from 'comlink';
import type { Tables } from './tableWorker';

export interface TableReader {
  readonly tables: Comlink.Remote<Tables>;
  end(): void;
}

export function startTableReader(): TableReader {
  const worker = new Worker(new URL('./tableWorker.ts', import.meta.url), { type: 'module' });
  return { tables: Comlink.wrap<Tables>(worker), end: () => worker.terminate() };
}
