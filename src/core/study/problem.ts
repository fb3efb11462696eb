/** What goes wrong with a user's input: one closed shape for every message, in the terminal and beside a field. */

export interface ProblemPlace {
  /** File as the user named it. */
  file?: string;
  /** Key inside a study, such as `steps[2].energy_keV`. */
  key?: string;
  /** Line of a text table, counted from 1. */
  line?: number;
}

/** Input that cannot be used. The message says what was found and what is allowed, in one line. */
export class InputProblem extends Error {
  override readonly name = 'InputProblem';
  readonly place: ProblemPlace;

  constructor(message: string, place: ProblemPlace = {}) {
    super(message);
    this.place = place;
  }

  /** The whole message in one line: file, key or line, then what is wrong and what is allowed. */
  get oneLine(): string {
    const { file, key, line } = this.place;
    const where = [file, line === undefined ? undefined : `line ${line}`, key].filter(Boolean).join(': ');
    return where ? `${where}: ${this.message}` : this.message;
  }
}

/** One problem of a study, for showing beside its field. */
export interface StudyProblem {
  /** Path such as `steps[2].energy_keV`; empty for the study as a whole. */
  key: string;
  message: string;
}

/** A well-posed question without an answer (exit code 3): why, and what to change. */
export class NoSolution extends Error {
  override readonly name = 'NoSolution';
}

/** A remark that does not stop the calculation. `code` is stable, `message` is for people. */
export interface Warning {
  code: string;
  message: string;
  /** Position of the recipe step that caused it, counted from 1 in the document. */
  step?: number;
}
