/** What each request may carry: the window's arguments are checked against this before anything is done with them. */

import { z } from 'zod';
import type { Bridge } from './bridge';
import type { Channel } from './channels';
import { STUDY_LIMIT_BYTES, TABLE_LIMIT_BYTES } from './limits';

const shownName = z.string().max(500);
const bytes = z.custom<Uint8Array>(
  (value) => value instanceof Uint8Array && value.length <= TABLE_LIMIT_BYTES,
);

export const REQUESTS: { [C in Channel]: z.ZodType<Parameters<Bridge[C]>> } = {
  openStudy: z.tuple([]),
  initialStudy: z.tuple([]),
  saveStudy: z.tuple([
    z.strictObject({
      id: z.uuid().nullable(),
      suggestedName: shownName,
      // Twice the limit passes here so that a study slightly too large gets its own message instead of a refusal.
      text: z.string().max(2 * STUDY_LIMIT_BYTES),
      as: z.boolean(),
    }),
  ]),
  openTable: z.tuple([]),
  exportFile: z.tuple([
    z.strictObject({
      kind: z.enum(['csv', 'json', 'svg', 'png']),
      suggestedName: shownName,
      data: z.union([z.string().max(TABLE_LIMIT_BYTES), bytes]),
    }),
  ]),
  showDocumentState: z.tuple([
    z.strictObject({
      name: shownName,
      unsaved: z.boolean(),
      undo: shownName.nullable(),
      redo: shownName.nullable(),
    }),
  ]),
  keepRecovery: z.tuple([
    z.strictObject({
      name: shownName,
      text: z
        .string()
        .max(2 * STUDY_LIMIT_BYTES)
        .nullable(),
    }),
  ]),
  takeRecovery: z.tuple([]),
  setTheme: z.tuple([z.enum(['system', 'light', 'dark'])]),
  runtimeFacts: z.tuple([]),
};
