/** `check`: whether a study can be used, with every problem at once. */

import { Command } from 'commander';
import { InputProblem } from '../../core/index';
import { nameOf, readStudy } from '../files';
import { answer, json } from '../text';

export function checkCommand(): Command {
  return new Command('check')
    .description('Validate a study and the tables it names; solve nothing, write nothing.')
    .argument('<study>', 'the study (JSON); - reads standard input')
    .option('--json', 'print { "ok": true } or the problem as a document')
    .addHelpText(
      'after',
      `
Examples:
  $ ohmstrata check demo-profiles/n-plus.json
  $ ohmstrata check demo-profiles/sims-pair.json --json`,
    )
    .action((path: string, options: { json?: boolean }) => {
      if (!options.json) return answer(`${nameOf(path)}: ${summary(path)}`);
      try {
        answer(json({ ok: true, summary: summary(path) }));
      } catch (error) {
        if (error instanceof InputProblem)
          answer(json({ ok: false, ...error.place, message: error.message }));
        throw error;
      }
    });
}

function summary(path: string): string {
  const { name, steps } = readStudy(path);
  const disabled = steps.filter((step) => step.disabled).length;
  return `a valid study, "${name}", with ${steps.length} step${steps.length === 1 ? '' : 's'}${disabled > 0 ? ` (${disabled} disabled)` : ''}`;
}
