/** `resistivity`: uniformly doped silicon, from its dopant concentration to its resistivity or back. */

import { Command, Option } from 'commander';
import {
  type Dopant,
  InputProblem,
  IONISATION_NAMES,
  MOBILITY_MODELS,
  uniformResistivity,
} from '../../core/index';
import { dopant, quantity } from '../options';
import { answer, figure, json, pairs, tellWarnings } from '../text';

type MobilityName = (typeof MOBILITY_MODELS)[number]['name'];

interface Options {
  dopant: Dopant;
  concentration?: number;
  resistivity?: number;
  temperature: number;
  mobility: MobilityName;
  ionisation: 'levels' | 'complete';
  json?: boolean;
}

const ZERO_CELSIUS = 273.15;

export function resistivityCommand(): Command {
  return new Command('resistivity')
    .description('Resistivity of uniformly doped silicon from its dopant concentration, or the reverse.')
    .requiredOption('--dopant <dopant>', 'by name or symbol', dopant)
    .option('--concentration <cm-3>', 'active dopant atoms', quantity('concentration', 'cm-3', 1e8, 1e21))
    .option('--resistivity <ohm cm>', 'resistivity to reach', quantity('resistivity', 'ohm cm', 1e-6, 1e7))
    .option('--temperature <C>', 'temperature', quantity('temperature', 'C', -73.15, 226.85), 25)
    .addOption(
      new Option('--mobility <model>', 'mobility model')
        .choices(MOBILITY_MODELS.map(({ name }) => name))
        .default('klaassen'),
    )
    .addOption(
      new Option(
        '--ionisation <model>',
        'which part of the dopant is ionised; models made from dopants take all',
      )
        .choices(IONISATION_NAMES)
        .default('complete'),
    )
    .option('--json', 'print a JSON document')
    .addHelpText(
      'after',
      `
SEMI MF723 (23 C) is shown beside the model: the published models differ from it by up to 12 %.

Examples:
  $ ohmstrata resistivity --dopant boron --concentration 1e16
  $ ohmstrata resistivity --dopant P --resistivity 3 --mobility masetti --json`,
    )
    .action((options: Options) => {
      if ((options.concentration === undefined) === (options.resistivity === undefined))
        throw new InputProblem('give either --concentration or --resistivity');
      const found = uniformResistivity({ ...options, temperature: options.temperature + ZERO_CELSIUS });
      const values = {
        resistivity_ohmCm: found.resistivity,
        mobility_cm2Vs: found.mobility,
        concentration_cm3: found.concentration,
        electrons_cm3: found.electrons,
        holes_cm3: found.holes,
      };
      const standard =
        options.concentration === undefined ? 'mf723Concentration_cm3' : 'mf723Resistivity_ohmCm';
      const mf723 = { value: found.standard.value, inRange: found.standard.inRange };
      if (options.json)
        return answer(
          json({
            dopant: options.dopant,
            temperature_C: options.temperature,
            mobility: options.mobility,
            ionisation: options.ionisation,
            ...values,
            [standard]: mf723.value,
            mf723InRange: mf723.inRange,
            warnings: found.warnings,
          }),
        );
      answer(
        [
          `silicon doped with ${options.dopant}, ${options.temperature} C, ${options.mobility}`,
          pairs(
            Object.entries({ ...values, [standard]: mf723.value }).map(([name, value]) => [
              name,
              figure(value),
            ]),
          ),
        ].join('\n'),
      );
      tellWarnings(found.warnings);
      if (!mf723.inRange) tellWarnings([{ message: 'MF723 is extrapolated beyond its measurements.' }]);
    });
}
