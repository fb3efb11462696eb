/** `bias`: one layer between reverse-biased junctions. */

import { Command, Option } from 'commander';
import { type BiasResult, type BiasSpan, biasSweep, csvText } from '../../core/index';
import { readStudy, writeWhole } from '../files';
import { quantity } from '../options';
import { answer, figure, json, pairs, table } from '../text';

interface Options {
  layer: number;
  from: number;
  to: number;
  points: number;
  junction: BiasSpan['junctions'];
  json?: boolean;
  out?: string;
}

const volts = quantity('voltage', 'V', 0, 1000);

export function biasCommand(): Command {
  return new Command('bias')
    .description('Sheet resistance, depletion and capacitance of a layer against reverse voltage; pinch-off.')
    .argument('<study>', 'the study (JSON); - reads standard input')
    .requiredOption('--layer <n>', 'the layer, counted from 1 at the surface', quantity('plain', '', 1, 100))
    .option('--from <V>', 'lowest reverse voltage', volts, 0)
    .option('--to <V>', 'highest reverse voltage', volts, 10)
    .option('--points <n>', 'voltages in the span', quantity('plain', '', 2, 1000), 11)
    .addOption(
      new Option('--junction <which>', 'junctions of the layer that carry the voltage')
        .choices(['both', 'upper', 'lower'])
        .default('both'),
    )
    .option('--json', 'print a JSON document')
    .option('--out <table.csv>', 'write the table to a CSV file')
    .addHelpText(
      'after',
      `
Fermi levels are flat in each layer: no current flows and nothing breaks down. Live structures at voltage are for
qualified staff under your site's rules.

Examples:
  $ ohmstrata bias demo-profiles/p-resistor.json --layer 1 --from 0 --to 10
  $ ohmstrata bias demo-profiles/npn-stack.json --layer 2 --junction lower --to 5 --json`,
    )
    .action((path: string, options: Options) => {
      const result = biasSweep(readStudy(path), {
        layer: options.layer,
        junctions: options.junction,
        from_V: options.from,
        to_V: options.to,
        points: options.points,
      });
      if (options.out !== undefined) writeWhole(options.out, sweepCsv(result));
      answer(options.json ? json(result) : text(result));
    });
}

function text(result: BiasResult): string {
  const { junctions, reverse_V, sheetResistance_ohmSq } = result;
  return [
    `${result.study}: layer ${result.layer} ${result.type}`,
    pairs([
      ['voltage coefficient', `${figure(result.voltageCoefficient_percentV, 3)} %/V`],
      ['pinch-off', result.pinchOff_V === null ? 'not up to 200 V' : `${figure(result.pinchOff_V)} V`],
    ]),
    '',
    table(
      [
        'reverse_V',
        'sheet_ohmSq',
        ...junctions.flatMap(({ position }) => [`${position}Depleted_um`, `${position}_nFcm2`]),
      ],
      reverse_V.map((v, i) => [
        figure(v),
        sheetResistance_ohmSq[i] === null ? 'depleted' : figure(sheetResistance_ohmSq[i]),
        ...junctions.flatMap(({ depletion_um, capacitance_nFcm2 }) => [
          depletion_um[i]?.map((um) => figure(um)).join(' to ') ?? '-',
          figure(capacitance_nFcm2[i]),
        ]),
      ]),
    ),
  ].join('\n');
}

function sweepCsv({ study, layer, reverse_V, sheetResistance_ohmSq, junctions }: BiasResult): string {
  const column = (values: readonly (number | null | undefined)[]) =>
    Float64Array.from(values, (value) => value ?? Number.NaN);
  return csvText(
    [
      'reverse_V',
      'sheetResistance_ohmSq',
      ...junctions.flatMap(({ position }) => [
        `${position}DepletionTop_um`,
        `${position}DepletionBottom_um`,
        `${position}Capacitance_nFcm2`,
      ]),
    ],
    [
      column(reverse_V),
      column(sheetResistance_ohmSq),
      ...junctions.flatMap(({ depletion_um, capacitance_nFcm2 }) => [
        column(depletion_um.map((edges) => edges?.[0])),
        column(depletion_um.map((edges) => edges?.[1])),
        column(capacitance_nFcm2),
      ]),
    ],
    [`study: ${study}`, `layer: ${layer}`],
  );
}
