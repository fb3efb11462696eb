/** `range`: where implanted ions come to rest. */

import { Command, Option } from 'commander';
import {
  DOPANT_FACTS,
  ELEMENTS,
  type ImplantSpecies,
  InputProblem,
  RANGE_SETS,
  rangeMoments,
  rangeStatistics,
  TARGETS,
  type TargetName,
  type Warning,
} from '../../core/index';
import { ion, quantity } from '../options';
import { answer, figure, json, pairs, tellWarnings } from '../text';

interface Options {
  ion: string;
  energy: number;
  target: TargetName;
  ranges: (typeof RANGE_SETS)[number];
  solve?: boolean;
  json?: boolean;
}

interface Found {
  projectedRange: number;
  straggle: number;
  lateralStraggle: number;
  skewness: number;
  kurtosis: number;
  warnings: readonly Warning[];
}

const UM_PER_CM = 1e4;
/** Boron's share of the energy of a BF2 ion, by mass numbers. */
const BORON_IN_BF2 = 11 / 49;

export function rangeCommand(): Command {
  return new Command('range')
    .description('Projected range, straggle and shape of an implant in an amorphous target.')
    .requiredOption(
      '--ion <ion>',
      'a dopant by name or symbol, or BF2; with --solve any element known here',
      anyIon,
    )
    .requiredOption(
      '--energy <keV>',
      'ion energy, such as 60 or "2 MeV"',
      quantity('energy', 'keV', 0.1, 10_000),
    )
    .addOption(
      new Option('--target <material>', 'what the ions enter')
        .choices(Object.keys(TARGETS))
        .default('silicon'),
    )
    .addOption(new Option('--ranges <set>', 'set of range data').choices(RANGE_SETS).default('universal'))
    .option('--solve', 'solve the transport equation instead of using fits or tables')
    .option('--json', 'print a JSON document')
    .addHelpText(
      'after',
      `
Examples:
  $ ohmstrata range --ion B --energy 60
  $ ohmstrata range --ion As --energy "150 keV" --target oxide --ranges lss1975 --json
  $ ohmstrata range --ion Ge --energy 120 --target photoresist --solve`,
    )
    .action((options: Options) => {
      const { ion: species, energy, target, ranges } = options;
      const found = options.solve ? solved(options) : fitted(options);
      const values = {
        projectedRange_um: found.projectedRange * UM_PER_CM,
        straggle_um: found.straggle * UM_PER_CM,
        lateralStraggle_um: found.lateralStraggle * UM_PER_CM,
        skewness: found.skewness,
        kurtosis: found.kurtosis,
      };
      const how = options.solve ? 'solved' : 'fits or tables';
      if (options.json)
        return answer(
          json({
            ion: species,
            energy_keV: energy,
            target,
            ranges,
            how,
            ...values,
            warnings: found.warnings,
          }),
        );
      answer(
        [
          `${species}, ${energy} keV, into ${target} (${ranges} ranges, ${how})`,
          pairs(Object.entries(values).map(([name, value]) => [name, figure(value)])),
        ].join('\n'),
      );
      tellWarnings(found.warnings);
    });
}

/** A dopant as the fits know it, or the symbol of an element. */
function anyIon(text: string): string {
  const symbol = [...ELEMENTS.keys()].find((each) => each.toLowerCase() === text.trim().toLowerCase());
  const isDopant = Object.values(DOPANT_FACTS).some((facts) => facts.symbol === symbol);
  return symbol && !isDopant ? symbol : ion(text);
}

function fitted({ ion: species, energy, target, ranges }: Options): Found {
  if (target === 'photoresist' || ELEMENTS.has(species))
    throw new InputProblem(`${species} in ${target} has no fit or table; add --solve`);
  return rangeStatistics({ species: species as ImplantSpecies, energy_keV: energy, target, set: ranges });
}

function solved({ ion: species, energy, target, ranges }: Options): Found {
  const isMolecule = species === 'BF2';
  const dopant = DOPANT_FACTS[species as keyof typeof DOPANT_FACTS];
  const symbol = isMolecule ? 'B' : (dopant?.symbol ?? species);
  const moments = rangeMoments(symbol, isMolecule ? energy * BORON_IN_BF2 : energy, TARGETS[target], ranges);
  return { ...moments, warnings: [] };
}
