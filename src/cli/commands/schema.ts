/** `schema`: the JSON Schema of a study, from the definition that validates. */

import { Command } from 'commander';
import { studyJsonSchema } from '../../core/index';
import { answer, json } from '../text';

export function schemaCommand(): Command {
  return new Command('schema')
    .description('Print the JSON Schema of a study, for editors and for programs that write studies.')
    .addHelpText(
      'after',
      `
Example:
  $ ohmstrata schema > ohmstrata-study.schema.json`,
    )
    .action(() => answer(json(studyJsonSchema())));
}
