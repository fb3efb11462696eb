/** `range`: where implanted ions come to rest. */

import { Command, Option } from 'commander';
import { type ImplantSpecies, RANGE_SETS, rangeStatistics } from '../../core/index';
import { ion, quantity } from '../options';
import { answer, figure, json, pairs, tellWarnings } from '../text';

interface Options {
  ion: ImplantSpecies;
  energy: number;
  target: 'silicon' | 'oxide' | 'nitride';
  ranges: (typeof RANGE_SETS)[number];
  json?: boolean;
}

const UM_PER_CM = 1e4;

export function rangeCommand(): Command {
  return new Command('range')
    .description('Projected range, straggle and shape of an implant in an amorphous target.')
    .requiredOption('--ion <ion>', 'a dopant by name or symbol, or BF2', ion)
    .requiredOption(
      '--energy <keV>',
      'ion energy, such as 60 or "2 MeV"',
      quantity('energy', 'keV', 0.1, 10_000),
    )
    .addOption(
      new Option('--target <material>', 'what the ions enter')
        .choices(['silicon', 'oxide', 'nitride'])
        .default('silicon'),
    )
    .addOption(new Option('--ranges <set>', 'set of range data').choices(RANGE_SETS).default('universal'))
    .option('--json', 'print a JSON document')
    .addHelpText(
      'after',
      `
Examples:
  $ ohmstrata range --ion B --energy 60
  $ ohmstrata range --ion As --energy "150 keV" --target oxide --ranges lss1975 --json`,
    )
    .action(({ ion: species, energy, target, ranges, json: asJson }: Options) => {
      const found = rangeStatistics({ species, energy_keV: energy, target, set: ranges });
      const values = {
        projectedRange_um: found.projectedRange * UM_PER_CM,
        straggle_um: found.straggle * UM_PER_CM,
        lateralStraggle_um: found.lateralStraggle * UM_PER_CM,
        skewness: found.skewness,
        kurtosis: found.kurtosis,
      };
      if (asJson)
        return answer(
          json({ ion: species, energy_keV: energy, target, ranges, ...values, warnings: found.warnings }),
        );
      answer(
        [
          `${species}, ${energy} keV, into ${target} (${ranges} ranges)`,
          pairs(Object.entries(values).map(([name, value]) => [name, figure(value)])),
        ].join('\n'),
      );
      tellWarnings(found.warnings);
    });
}
