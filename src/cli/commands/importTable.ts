/** `import`: a table of depth profiles becomes a study. */

import { basename } from 'node:path';
import { Command, Option } from 'commander';
import {
  type Dopant,
  embedTable,
  InputProblem,
  readTable,
  sha256Hex,
  TABLE_DELIMITERS,
  TABLE_ENCODINGS,
  type TableChoice,
  type TableReading,
  validateStudy,
  writeStudy,
} from '../../core/index';
import { nameOf, readTableBytes, tellTableWarning, writeWhole } from '../files';
import { dopant, quantity } from '../options';
import { answer } from '../text';

interface Options extends TableChoice {
  wafer: Dopant;
  concentration: number;
  dopant?: Dopant;
  column?: string;
  depthColumn?: string;
  out?: string;
}

const column = (text: string | undefined): string | number | undefined =>
  text !== undefined && /^\d+$/.test(text) ? Number(text) : text;

export function importCommand(): Command {
  return new Command('import')
    .description(
      'Read a table of depth profiles (such as SIMS) into a study; what it leaves open is asked, never guessed.',
    )
    .argument('<table>', 'the table (text); - reads standard input')
    .requiredOption('--wafer <dopant>', 'what the wafer is doped with', dopant)
    .requiredOption('--concentration <cm-3>', 'how much', quantity('concentration', 'cm-3', 1e10, 1e21))
    .option('--out <study.json>', 'write the study here instead of to standard output')
    .option('--dopant <dopant>', 'what the profile is, when its heading does not tell', dopant)
    .option('--column <n>', 'take only this concentration column, by number from 1 or heading')
    .option('--depth-column <n>', 'the depth column')
    .addOption(new Option('--delimiter <name>', 'what parts the columns').choices(TABLE_DELIMITERS))
    .addOption(new Option('--decimal <sign>', 'decimal sign').choices(['.', ',']))
    .addOption(new Option('--depth-unit <unit>', 'unit of depth').choices(['nm', 'um', 'A', 'cm']))
    .addOption(new Option('--concentration-unit <unit>', 'unit of concentration').choices(['cm-3', 'm-3']))
    .addOption(new Option('--encoding <name>', 'encoding of the text').choices(TABLE_ENCODINGS))
    .option('--skip <lines>', 'lines to leave out at the top', quantity('plain', '', 0, 1e6))
    .addHelpText(
      'after',
      `
Examples:
  $ ohmstrata import demo-profiles/sims-boron.csv --wafer P --concentration 1.3e15 --out boron.json
  $ ohmstrata import demo-profiles/sims-arsenic-boron.txt --wafer Sb --concentration 5e15 | ohmstrata solve -`,
    )
    .action((path: string, options: Options) => {
      const bytes = readTableBytes(path);
      const file = nameOf(path);
      const { delimiter, decimal, depthUnit, concentrationUnit, encoding, skip } = options;
      const choice = { delimiter, decimal, depthUnit, concentrationUnit, encoding, skip };
      const columns = { depth: column(options.depthColumn), concentration: column(options.column) };
      const reading = readTable(bytes, choice, file, columns);
      for (const warning of reading.warnings) tellTableWarning(warning, file);
      refuseOpenQuestions(reading, file);
      tellProfiles(reading, file);
      const source = { name: basename(file), sha256: sha256Hex(bytes) };
      const steps = reading.profiles.map((_, i) => embedTable(reading, i, source, options.dopant));
      const study = validateStudy({
        format: 'ohmstrata-study/1',
        name: source.name,
        wafer: { dopant: options.wafer, concentration_cm3: options.concentration },
        steps,
      });
      if (options.out === undefined) answer(writeStudy(study).trimEnd());
      else writeWhole(options.out, writeStudy(study));
    });
}

const OPTION_OF: Record<TableReading['questions'][number]['kind'], string> = {
  decimal: '--decimal',
  depthUnit: '--depth-unit',
  concentrationUnit: '--concentration-unit',
  columns: '--column or --depth-column',
};

function refuseOpenQuestions({ questions }: TableReading, file: string): void {
  const [question] = questions;
  if (question)
    throw new InputProblem(`${question.message}; state it with ${OPTION_OF[question.kind]}`, {
      file,
      line: question.line,
    });
}

function tellProfiles({ profiles, choice }: TableReading, file: string): void {
  const lines = profiles.map(
    ({ dopant: of, heading, depth_um, concentrationColumn }) =>
      `note: ${file}: column ${concentrationColumn}${heading ? ` "${heading}"` : ''}: ${of ?? 'dopant not named'}, ${depth_um.length} depths, ${depth_um[0]} to ${depth_um[depth_um.length - 1]} um (columns parted by ${choice.delimiter}, decimal "${choice.decimal}")\n`,
  );
  process.stderr.write(lines.join(''));
}
