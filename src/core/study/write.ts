/** Writes a study as text, and publishes the JSON Schema of the format. */

import { z } from 'zod';
import { type Study, studySchema } from './schema';

/** The study as JSON text: the keys in the order of the format, two blanks of indent, one newline at the end. */
export function writeStudy(study: Study): string {
  return `${JSON.stringify(studySchema.parse(study), null, 2)}\n`;
}

/** JSON Schema (draft 2020-12) of the study format, from the definition that validates. */
export function studyJsonSchema(): Record<string, unknown> {
  return z.toJSONSchema(studySchema, { io: 'input' });
}
