/** The one object the preload script exposes to the window, and nothing else: types only, shared with the renderer. */

/** Answers cross the border as data: errors never travel as exceptions. */
export type Outcome<T> = { ok: true; value: T } | { ok: false; message: string };

/** A document the main process holds a path for; the window knows only an opaque id and a name to show. */
export interface OpenedDocument {
  id: string;
  name: string;
  text: string;
  /** The tables the study names in its own folder: bytes by the name used in the study, or why it could not be read. */
  tables: Record<string, Outcome<Uint8Array>>;
}

export interface SavedDocument {
  id: string;
  name: string;
}

export type ExportKind = 'csv' | 'json' | 'svg' | 'png';

export type MenuCommand =
  | 'newStudy'
  | 'open'
  /** A study was given to a second start of the program: ask for it with `initialStudy`, after the question about unsaved work. */
  | 'openGiven'
  | 'save'
  | 'saveAs'
  | 'importTable'
  | 'exportReadings'
  | 'exportColumns'
  | 'exportSvg'
  | 'exportPng'
  | 'undo'
  | 'redo'
  | 'commands'
  | 'about';

export type ThemeChoice = 'system' | 'light' | 'dark';

export interface RuntimeFacts {
  program: string;
  electron: string;
  chrome: string;
  node: string;
  /** True when the runtime is the registry-carried stand-in and not an official download. */
  carriedRuntime: boolean;
}

export interface Bridge {
  /** Open dialog for a study; null when the user cancels. */
  openStudy(): Promise<Outcome<OpenedDocument | null>>;
  /** A study given on the program's command line or to a second start, if any; each is given once. */
  initialStudy(): Promise<Outcome<OpenedDocument | null>>;
  /** Saves to the document's own file, or asks for a place when `id` is null or `as` is set; null when cancelled. */
  saveStudy(request: {
    id: string | null;
    suggestedName: string;
    text: string;
    as: boolean;
  }): Promise<Outcome<SavedDocument | null>>;
  /** Open dialog for a table. */
  openTable(): Promise<Outcome<{ name: string; bytes: Uint8Array } | null>>;
  /** Save dialog for anything exported; the name saved under, or null when cancelled. */
  exportFile(request: {
    kind: ExportKind;
    suggestedName: string;
    data: string | Uint8Array;
  }): Promise<Outcome<string | null>>;
  /** Title, unsaved mark and close question follow this. */
  showDocumentState(state: {
    name: string;
    unsaved: boolean;
    undo: string | null;
    redo: string | null;
  }): Promise<Outcome<null>>;
  /** Keeps a recovery copy of unsaved work outside the user's file; null text drops it. */
  keepRecovery(request: { name: string; text: string | null }): Promise<Outcome<null>>;
  /** Unsaved work of a session that ended without saving, if any. */
  takeRecovery(): Promise<Outcome<{ name: string; text: string; savedAt: string } | null>>;
  setTheme(theme: ThemeChoice): Promise<Outcome<null>>;
  runtimeFacts(): Promise<Outcome<RuntimeFacts>>;
  /** Menu items and their keys; returns the function that stops listening. */
  onMenuCommand(listener: (command: MenuCommand) => void): () => void;
}
