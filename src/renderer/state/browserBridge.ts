/** The bridge in a plain browser: files come from a file input and leave as downloads, recovery lies in local storage. */

import type { Bridge, Outcome } from '../../main/bridge';

const RECOVERY_KEY = 'ohmstrata.recovery';
const TYPES = { csv: 'text/csv', json: 'application/json', svg: 'image/svg+xml', png: 'image/png' };

const done = <T>(value: T): Outcome<T> => ({ ok: true, value });

/** One file chosen by the person; null when cancelled. */
function choose(accept: string): Promise<File | null> {
  return new Promise((resolve) => {
    const input = document.createElement('input');
    input.type = 'file';
    input.accept = accept;
    input.onchange = () => resolve(input.files?.[0] ?? null);
    input.addEventListener('cancel', () => resolve(null));
    input.click();
  });
}

function download(name: string, type: string, data: string | Uint8Array): void {
  const link = document.createElement('a');
  link.href = URL.createObjectURL(new Blob([data as BlobPart], { type }));
  link.download = name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(link.href), 60_000);
}

export function browserBridge(): Bridge {
  return {
    async openStudy() {
      const file = await choose('.json');
      return done(file && { id: '', name: file.name, text: await file.text(), tables: {} });
    },
    initialStudy: async () => done(null),
    async saveStudy({ suggestedName, text }) {
      download(suggestedName, TYPES.json, text);
      return done({ id: '', name: suggestedName });
    },
    async openTable() {
      const file = await choose('.csv,.txt,.tsv,.dat');
      return done(file && { name: file.name, bytes: new Uint8Array(await file.arrayBuffer()) });
    },
    async exportFile({ kind, suggestedName, data }) {
      download(suggestedName, TYPES[kind], data);
      return done(suggestedName);
    },
    async showDocumentState({ name, unsaved }) {
      document.title = `${unsaved ? '* ' : ''}${name} - Ohmstrata`;
      return done(null);
    },
    async keepRecovery({ name, text }) {
      try {
        if (text === null) localStorage.removeItem(RECOVERY_KEY);
        else
          localStorage.setItem(
            RECOVERY_KEY,
            JSON.stringify({ name, text, savedAt: new Date().toISOString() }),
          );
        return done(null);
      } catch {
        return { ok: false, message: 'The browser has no room for a recovery copy.' };
      }
    },
    async takeRecovery() {
      const kept = localStorage.getItem(RECOVERY_KEY);
      return done(kept === null ? null : JSON.parse(kept));
    },
    setTheme: async () => done(null),
    runtimeFacts: async () =>
      done({
        program: '',
        electron: '',
        chrome: navigator.userAgent,
        node: '',
        carriedRuntime: false,
      }),
    onMenuCommand: () => () => undefined,
  };
}
