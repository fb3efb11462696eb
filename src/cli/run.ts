/** Runs a command and turns what it ends with into an exit code and, when it fails, one line of words. */

import { type Command, CommanderError } from 'commander';
import { InputProblem, NoSolution } from '../core/index';

/** 0 done, 1 a defect of the program, 2 the input is wrong, 3 no solution was found. */
const EXIT = { done: 0, defect: 1, input: 2, noSolution: 3 } as const;

export async function run(program: Command, argv: readonly string[]): Promise<void> {
  endQuietlyWhenNobodyReads();
  try {
    await program.parseAsync([...argv]);
  } catch (error) {
    process.exitCode = failed(error, argv.includes('--trace'));
  }
}

function failed(error: unknown, withTrace: boolean): number {
  // Commander has already said what it had to say; help and version end this way too.
  if (error instanceof CommanderError) return error.exitCode === 0 ? EXIT.done : EXIT.input;
  if (withTrace && error instanceof Error) tell(error.stack ?? error.message);
  if (error instanceof InputProblem) return tell(error.oneLine, EXIT.input);
  if (error instanceof NoSolution) return tell(`no solution: ${error.message}`, EXIT.noSolution);
  const what = error instanceof Error ? error.message : String(error);
  return tell(
    `a defect of Ohmstrata, not of your input: ${what} (run again with --trace and report what it prints)`,
    EXIT.defect,
  );
}

function tell(text: string, exitCode: number = EXIT.defect): number {
  process.stderr.write(`ohmstrata: ${text.trimEnd()}\n`);
  return exitCode;
}

/** A reader that closes the pipe early, such as `head`, has what it wanted: that is no failure. */
function endQuietlyWhenNobodyReads(): void {
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error;
    process.exit(EXIT.done);
  });
}
