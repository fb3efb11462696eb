/** The commands and how they are called. */

import { Command } from 'commander';
import { PROGRAM_VERSION } from '../core/index';
import { biasCommand } from './commands/bias';
import { checkCommand } from './commands/check';
import { historyCommand } from './commands/history';
import { importCommand } from './commands/importTable';
import { rangeCommand } from './commands/range';
import { resistivityCommand } from './commands/resistivity';
import { schemaCommand } from './commands/schema';
import { solveCommand } from './commands/solve';
import { temperatureCommand } from './commands/temperature';

const AFTER_HELP = `
Examples:
  $ ohmstrata solve demo-profiles/p-resistor.json
  $ ohmstrata resistivity --dopant boron --concentration 1e16
  $ ohmstrata range --ion B --energy 60
  $ ohmstrata temperature demo-profiles/p-resistor.json --from -55 --to 125
  $ ohmstrata help solve

Answers go to standard output, everything else to standard error.
Exit codes: 0 done, 1 a defect of the program, 2 the input is wrong, 3 no solution was found.
A prediction does not release a lot: measure. For gases, acids and furnaces follow your site's safety rules.`;

export function program(): Command {
  const root = new Command('ohmstrata')
    .description(
      'What a doped layer in silicon will read: sheet resistance, junctions and Hall averages from a recipe.',
    )
    .version(PROGRAM_VERSION, '-V, --version', 'print the version')
    .helpOption('-h, --help', 'print this help')
    .helpCommand('help [command]', 'print the help of a command')
    .addHelpText('after', AFTER_HELP)
    .configureHelp({ showGlobalOptions: true })
    .showHelpAfterError('(--help shows what is allowed)');
  const commands = [
    solveCommand(),
    resistivityCommand(),
    rangeCommand(),
    historyCommand(),
    temperatureCommand(),
    biasCommand(),
    importCommand(),
    checkCommand(),
    schemaCommand(),
  ];
  for (const command of commands)
    root.addCommand(command.option('--trace', 'print the stack behind an error'));
  for (const command of [root, ...commands])
    command
      .exitOverride()
      .configureOutput({ outputError: (text, write) => write(text.replace(/^error: /, 'ohmstrata: ')) });
  return root;
}
