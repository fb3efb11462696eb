/** Closing a window that holds unsaved work: asks, saves through the window, and closes only when the work is safe. */

export type CloseAnswer = 'save' | 'discard' | 'cancel';

export interface ClosingActions {
  ask(): Promise<CloseAnswer>;
  /** Has the window save, as its own Save does. */
  requestSave(): void;
  discard(): Promise<void>;
  close(): void;
  /** Milliseconds of a clock that only runs forward. */
  now(): number;
}

const REQUEST_LAPSES_MS = 5_000;

export class Closing {
  readonly #actions: ClosingActions;
  #unsaved = false;
  #asking = false;
  #stage: 'open' | 'requested' | 'saving' | 'saved' | 'closing' = 'open';
  #requestedAt = 0;

  constructor(actions: ClosingActions) {
    this.#actions = actions;
  }

  /** The window has told whether it holds unsaved work. */
  noteState(unsaved: boolean): void {
    this.#unsaved = unsaved;
    if (this.#stage !== 'saved') return;
    if (unsaved) this.#stage = 'open';
    else this.#closeNow();
  }

  /** A save has begun. One long after the request is another, and must not close the window. */
  noteSaveStart(): void {
    if (this.#stage === 'requested')
      this.#stage = this.#actions.now() - this.#requestedAt < REQUEST_LAPSES_MS ? 'saving' : 'open';
  }

  /** A save has ended: done, or cancelled or failed. */
  noteSave(done: boolean): void {
    if (this.#stage === 'saving') this.#stage = done ? 'saved' : 'open';
  }

  /** The window is about to close; holds it back while there is something to lose. */
  onClose(event: { preventDefault(): void }): void {
    if (this.#stage === 'closing' || !this.#unsaved) return;
    event.preventDefault();
    if (!this.#asking) void this.#decide();
  }

  async #decide(): Promise<void> {
    this.#asking = true;
    const answer = await this.#actions.ask();
    this.#asking = false;
    if (answer === 'save') {
      this.#stage = 'requested';
      this.#requestedAt = this.#actions.now();
      this.#actions.requestSave();
    } else if (answer === 'discard') {
      await this.#actions.discard();
      this.#closeNow();
    }
  }

  #closeNow(): void {
    this.#stage = 'closing';
    this.#actions.close();
  }
}
