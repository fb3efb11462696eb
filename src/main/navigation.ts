/** Keeps every page where it is: no navigation elsewhere, no new windows, no embedded pages. */

import type { App, WebContents } from 'electron';
import { PAGE_URL, parseAddress } from './ownPage';

/** Only loading our own page again is allowed; parts after # never load anything. */
export function mayNavigate(address: string): boolean {
  const target = parseAddress(address);
  if (target === null) return false;
  target.hash = '';
  return target.href === PAGE_URL;
}

type Navigating = { preventDefault(): void; url: string };

export const stayHere = (event: Navigating) => {
  if (!mayNavigate(event.url)) event.preventDefault();
};

function guardContents(contents: WebContents): void {
  contents.on('will-navigate', stayHere);
  contents.on('will-frame-navigate', stayHere);
  contents.on('will-redirect', stayHere);
  contents.on('will-attach-webview', (event) => event.preventDefault());
  contents.setWindowOpenHandler(() => ({ action: 'deny' }));
}

export function guardNavigation(app: App): void {
  app.on('web-contents-created', (_event, contents) => guardContents(contents));
}
