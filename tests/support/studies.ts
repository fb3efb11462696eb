/** Small studies for tests. */

import type { z } from 'zod';
import { type Study, studySchema } from '../../src/core/study/schema';

type StudyInput = z.input<typeof studySchema>;

/** A valid study with the given parts; an n-type wafer of 1.3e15 by default. */
export function study(parts: Partial<StudyInput> = {}): Study {
  return studySchema.parse({
    format: 'ohmstrata-study/1',
    wafer: { dopant: 'phosphorus', concentration_cm3: 1.3e15 },
    ...parts,
  });
}
