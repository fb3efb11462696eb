/** `temperature`: sheet resistance of every layer against temperature, with TC1 and TC2. */

import { Command } from 'commander';
import { csvText, type TemperatureResult, temperatureSweep } from '../../core/index';
import { readStudy, writeWhole } from '../files';
import { quantity } from '../options';
import { answer, figure, json, table, tellWarnings } from '../text';

interface Options {
  from: number;
  to: number;
  points: number;
  json?: boolean;
  out?: string;
}

const celsius = quantity('temperature', 'C', -73.15, 226.85);

export function temperatureCommand(): Command {
  return new Command('temperature')
    .description('Sheet resistance of every layer against temperature; TC1 and TC2 by least squares.')
    .argument('<study>', 'the study (JSON); - reads standard input')
    .option('--from <C>', 'lowest temperature', celsius, -55)
    .option('--to <C>', 'highest temperature', celsius, 125)
    .option('--points <n>', 'temperatures in the span', quantity('plain', '', 2, 1000), 19)
    .option('--json', 'print a JSON document')
    .option('--out <table.csv>', 'write the table to a CSV file')
    .addHelpText(
      'after',
      `
The coefficients belong to R = R0 (1 + TC1 dT + TC2 dT^2) with R0 at the study's own temperature.

Examples:
  $ ohmstrata temperature demo-profiles/p-resistor.json --from -55 --to 125
  $ ohmstrata temperature demo-profiles/npn-stack.json --points 7 --json`,
    )
    .action((path: string, options: Options) => {
      const result = temperatureSweep(readStudy(path), {
        from_C: options.from,
        to_C: options.to,
        points: options.points,
      });
      if (options.out !== undefined) writeWhole(options.out, sweepCsv(result));
      answer(options.json ? json(result) : text(result));
      if (!options.json) tellWarnings(result.warnings);
    });
}

const heads = ({ layers }: TemperatureResult): string[] => [
  'temperature_C',
  ...layers.map(({ index, type }) => `layer${index}${type}_ohmSq`),
];

function text(result: TemperatureResult): string {
  const { layers, temperature_C, reference_C, study, mobility } = result;
  return [
    `${study}: mobility ${mobility}, coefficients at ${figure(reference_C)} C`,
    '',
    table(
      ['layer', 'reference_ohmSq', 'TC1_ppmK', 'TC2_ppmK2', 'worst_percent'],
      layers.map((layer) => [
        `${layer.index} ${layer.type}`,
        figure(layer.reference_ohmSq),
        figure(layer.tcr1_ppmK),
        figure(layer.tcr2_ppmK2, 3),
        figure(layer.worst_percent, 2),
      ]),
    ),
    '',
    table(
      heads(result),
      temperature_C.map((t, i) => [
        figure(t),
        ...layers.map(({ sheetResistance_ohmSq: values }) => figure(values[i])),
      ]),
    ),
  ].join('\n');
}

function sweepCsv(result: TemperatureResult): string {
  const columns = [
    Float64Array.from(result.temperature_C),
    ...result.layers.map(({ sheetResistance_ohmSq: values }) =>
      Float64Array.from(values, (v) => v ?? Number.NaN),
    ),
  ];
  return csvText(heads(result), columns, [
    `study: ${result.study}`,
    `mobility: ${result.mobility}`,
    `reference_C: ${result.reference_C}`,
  ]);
}
