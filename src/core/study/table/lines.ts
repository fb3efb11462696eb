/** The lines of a text, found once and cut out on demand: a table of a million rows is never held as a million strings. */

import { InputProblem } from '../problem';
import { END_OF_FILE } from './decode';

export const MAX_TABLE_ROWS = 5_000_000;
export const MAX_LINE_LENGTH = 10_000;

export interface Lines {
  readonly count: number;
  /** Line by index from 0, without its end mark. */
  at(index: number): string;
}

const LINE_FEED = 10;
const CARRIAGE_RETURN = 13;

/**
 * Splits at CR LF, LF or CR, in any mixture.
 * @throws InputProblem for a line or a number of lines beyond the limits.
 */
export function splitLines(text: string, file?: string): Lines {
  let bounds = new Uint32Array(2048);
  let count = 0;
  const add = (start: number, end: number): void => {
    if (end - start > MAX_LINE_LENGTH)
      throw new InputProblem(`the line has ${end - start} characters; at most ${MAX_LINE_LENGTH} are read`, {
        file,
        line: count + 1,
      });
    if (count === MAX_TABLE_ROWS)
      throw new InputProblem(`the table goes on; at most ${MAX_TABLE_ROWS} lines are read`, {
        file,
        line: count + 1,
      });
    if (2 * count + 2 > bounds.length) {
      const longer = new Uint32Array(2 * bounds.length);
      longer.set(bounds);
      bounds = longer;
    }
    bounds[2 * count] = start;
    bounds[2 * count + 1] = end;
    count++;
  };
  const length = text.charCodeAt(text.length - 1) === END_OF_FILE ? text.length - 1 : text.length;
  let start = 0;
  for (let i = 0; i < length; i++) {
    const code = text.charCodeAt(i);
    if (code !== LINE_FEED && code !== CARRIAGE_RETURN) continue;
    add(start, i);
    if (code === CARRIAGE_RETURN && text.charCodeAt(i + 1) === LINE_FEED) i++;
    start = i + 1;
  }
  if (start < length) add(start, length);
  return { count, at: (index) => text.slice(bounds[2 * index], bounds[2 * index + 1]) };
}
