/** What the program remembers between starts: the theme, so that the window opens on the right ground. */

import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { saveAtomically } from './atomicSave';

const settingsSchema = z.object({ theme: z.enum(['system', 'light', 'dark']) });
export type Settings = z.output<typeof settingsSchema>;

const DEFAULTS: Settings = { theme: 'system' };
const fileIn = (folder: string) => join(folder, 'settings.json');

/** The defaults when there are none yet or they cannot be read: settings are never worth a failed start. */
export function readSettings(folder: string): Settings {
  try {
    return settingsSchema.parse(JSON.parse(readFileSync(fileIn(folder), 'utf8')));
  } catch {
    return DEFAULTS;
  }
}

export const writeSettings = (folder: string, settings: Settings): Promise<void> =>
  saveAtomically(fileIn(folder), JSON.stringify(settings));
