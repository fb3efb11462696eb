/** `solve`: a study to its layers and junctions. */

import { Command } from 'commander';
import { columnsTable, csvText, type ResultDocument, type Solution, solve } from '../../core/index';
import { readStudy, writeWhole } from '../files';
import { answer, figure, json, table, tellWarnings } from '../text';

interface Options {
  json?: boolean;
  profile?: string;
}

export function solveCommand(): Command {
  return new Command('solve')
    .description('Solve a study: sheet resistance, junctions and Hall averages of every layer.')
    .argument('<study>', 'the study (JSON); - reads standard input')
    .option('--json', 'print the result document')
    .option('--profile <out.csv>', 'write every column against depth to a CSV file')
    .addHelpText(
      'after',
      `
Examples:
  $ ohmstrata solve demo-profiles/p-resistor.json
  $ ohmstrata solve demo-profiles/npn-stack.json --json
  $ ohmstrata solve demo-profiles/n-plus.json --profile columns.csv`,
    )
    .action((path: string, options: Options) => {
      const solution = solve(readStudy(path));
      if (options.profile !== undefined) writeWhole(options.profile, profileCsv(solution));
      answer(options.json ? json(solution.result) : readings(solution.result));
      if (!options.json) tellWarnings(solution.result.warnings);
    });
}

function profileCsv(solution: Solution): string {
  const { study, program, models, temperature_C } = solution.result;
  const { header, columns } = columnsTable(solution);
  return csvText(header, columns, [
    `Ohmstrata ${program.version}`,
    `study: ${study.name}`,
    `study SHA-256: ${study.sha256}`,
    `temperature_C: ${temperature_C}`,
    `mobility: ${models.mobility} (${models.mobilitySource})`,
  ]);
}

function readings(result: ResultDocument): string {
  const { study, models, temperature_C } = result;
  return [
    study.name,
    `${figure(temperature_C)} C, mobility ${models.mobility}, carriers ${models.carriers}, ionisation ${models.ionisation}, activation ${activation(models.activation)}`,
    '',
    layers(result),
    '',
    result.junctions.length > 0 ? junctions(result) : 'No junctions.',
    ...(result.measurements.length > 0 ? ['', measurements(result)] : []),
  ].join('\n');
}

function activation(choice: ResultDocument['models']['activation']): string {
  return typeof choice === 'string'
    ? choice
    : Object.entries(choice)
        .map(([dopant, fraction]) => `${dopant} ${figure(fraction)}`)
        .join(', ');
}

function layers({ layers: all }: ResultDocument): string {
  return table(
    [
      'layer',
      'from_um',
      'to_um',
      'sheet_ohmSq',
      'by models_ohmSq',
      'mean_ohmCm',
      'carriers_cm2',
      'mobility_cm2Vs',
      'hallMobility_cm2Vs',
      'hall_cm2',
      'peakNet_cm3',
      'peak_um',
      'TC1_ppmK',
    ],
    all.map((layer) => [
      `${layer.index} ${layer.type}`,
      figure(layer.top_um),
      figure(layer.bottom_um),
      figure(layer.sheetResistance_ohmSq),
      layer.sheetResistanceSpread_ohmSq.map((value) => figure(value)).join(' to '),
      figure(layer.meanResistivity_ohmCm),
      figure(layer.carrierDose_cm2),
      figure(layer.conductivityMobility_cm2Vs),
      figure(layer.hallMobility_cm2Vs),
      figure(layer.hallDose_cm2),
      figure(layer.peakNet_cm3),
      figure(layer.peakDepth_um),
      figure(layer.tcr1_ppmK),
    ]),
  );
}

function junctions({ junctions: all }: ResultDocument): string {
  return table(
    ['junction', 'metallurgical_um', 'electrical_um', 'depleted_um', 'builtIn_V', 'capacitance_nFcm2'],
    all.map((junction, i) => [
      `${i + 1}`,
      figure(junction.metallurgical_um),
      figure(junction.electrical_um),
      junction.depletion_um?.map((um) => figure(um)).join(' to ') ?? '-',
      figure(junction.builtIn_V, 3),
      figure(junction.capacitance_nFcm2),
    ]),
  );
}

function measurements({ measurements: all }: ResultDocument): string {
  return table(
    ['measured', 'layer', 'measured_ohmSq', 'predicted_ohmSq', 'difference_percent', 'difference_sigma'],
    all.map((measurement) => [
      'four-point',
      String(measurement.layer),
      figure(measurement.measured_ohmSq),
      measurement.predicted_ohmSq === null ? 'no such layer' : figure(measurement.predicted_ohmSq),
      figure(measurement.difference_percent, 3),
      figure(measurement.difference_sigma, 3),
    ]),
  );
}
