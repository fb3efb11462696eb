/** `history`: what the wafer would read after every step of its recipe. */

import { Command } from 'commander';
import { type HistoryResult, recipeHistory } from '../../core/index';
import { readStudy } from '../files';
import { answer, figure, json, table } from '../text';

export function historyCommand(): Command {
  return new Command('history')
    .description('Layers and thermal budget after every step of the recipe, not only the last.')
    .argument('<study>', 'the study (JSON); - reads standard input')
    .option('--json', 'print a JSON document')
    .addHelpText(
      'after',
      `
What is implanted and not annealed yet reads as if it were active.

Examples:
  $ ohmstrata history demo-profiles/npn-stack.json
  $ ohmstrata history demo-profiles/p-resistor.json --json`,
    )
    .action((path: string, options: { json?: boolean }) => {
      const result = recipeHistory(readStudy(path));
      answer(options.json ? json(result) : text(result));
    });
}

function text({ study, entries }: HistoryResult): string {
  return [
    study,
    '',
    table(
      ['after step', 'layers (type, depth um, ohm/sq)', 'sqrt(Dt) um'],
      entries.map(({ step, title, layers, diffusionLength_um }) => [
        `${step} ${title}`,
        layers
          .map(
            ({ type, bottom_um, sheetResistance_ohmSq }) =>
              `${type} to ${figure(bottom_um)}: ${figure(sheetResistance_ohmSq)}`,
          )
          .join('; '),
        Object.entries(diffusionLength_um)
          .map(([symbol, um]) => `${symbol} ${figure(um, 3)}`)
          .join(', ') || '-',
      ]),
    ),
  ].join('\n');
}
