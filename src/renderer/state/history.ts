/** Undo and redo as named snapshots of one immutable value; edits that share a key become one step. */

export interface Entry<T> {
  /** What the change did, as the menu names it: "dose of step 1". */
  readonly label: string;
  /** The value before the change. */
  readonly before: T;
}

export interface History<T> {
  readonly past: readonly Entry<T>[];
  readonly present: T;
  readonly future: readonly { readonly label: string; readonly after: T }[];
  /** Edits with this key still join the newest entry; null when the next edit starts a new one. */
  readonly openKey: string | null;
  /** The redo list as it was before the open entry began, for giving that entry up. */
  readonly heldFuture: History<T>['future'];
}

const LIMIT = 300;

export const startHistory = <T>(present: T): History<T> => ({
  past: [],
  present,
  future: [],
  openKey: null,
  heldFuture: [],
});

/** A change. With a `key` it stays open: further changes with that key replace it instead of adding to the list. */
export function change<T>(
  history: History<T>,
  after: T,
  label: string,
  key: string | null = null,
): History<T> {
  if (key !== null && key === history.openKey) return { ...history, present: after };
  return {
    past: [...history.past, { label, before: history.present }].slice(-LIMIT),
    present: after,
    future: [],
    openKey: key,
    heldFuture: history.future,
  };
}

/** Ends the open entry: what was typed so far is one undo step. */
export const seal = <T>(history: History<T>): History<T> =>
  history.openKey === null ? history : { ...history, openKey: null, heldFuture: [] };

/** Gives the open entry up, as if it had never begun. Does nothing when `key` is not the open one. */
export function giveUp<T>(history: History<T>, key: string): History<T> {
  const last = history.past.at(-1);
  if (history.openKey !== key || !last) return history;
  return {
    past: history.past.slice(0, -1),
    present: last.before,
    future: history.heldFuture,
    openKey: null,
    heldFuture: [],
  };
}

export function undo<T>(history: History<T>): History<T> {
  const last = history.past.at(-1);
  if (!last) return history;
  return {
    past: history.past.slice(0, -1),
    present: last.before,
    future: [{ label: last.label, after: history.present }, ...history.future],
    openKey: null,
    heldFuture: [],
  };
}

export function redo<T>(history: History<T>): History<T> {
  const [next, ...rest] = history.future;
  if (!next) return history;
  return {
    past: [...history.past, { label: next.label, before: history.present }],
    present: next.after,
    future: rest,
    openKey: null,
    heldFuture: [],
  };
}

export const undoLabel = <T>(history: History<T>): string | null => history.past.at(-1)?.label ?? null;
export const redoLabel = <T>(history: History<T>): string | null => history.future[0]?.label ?? null;
