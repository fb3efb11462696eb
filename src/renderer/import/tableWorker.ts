/** The worker that reads tables: apart from the solver, so that a large file holds nothing up and can be given up. */

import * as Comlink from 'comlink';
import {
  type Dopant,
  embedTable,
  InputProblem,
  readTable,
  resolveTables,
  type Study,
  type StudyStep,
  sha256Hex,
  type TableChoice,
} from '../../core/index';
import type { Outcome } from '../../main/bridge';

type Reading = ReturnType<typeof readTable>;
export type ColumnChoice = NonNullable<Parameters<typeof readTable>[3]>;

/** A profile as the import sheet shows it: the data stay in the worker. */
export interface ProfileSketch {
  readonly heading: string;
  readonly dopant?: Dopant;
  readonly points: number;
  readonly belowDetection: number;
  readonly deepest_um: number;
  readonly peak_cm3: number;
  /** At most `SKETCH_POINTS` of the points, for a small picture. */
  readonly depth_um: number[];
  readonly concentration_cm3: number[];
}

export interface TableSketch {
  readonly choice: Reading['choice'];
  readonly columns: Reading['columns'];
  readonly preview: string[][];
  readonly metadata: string[];
  readonly warnings: Reading['warnings'];
  readonly questions: Reading['questions'];
  readonly profiles: ProfileSketch[];
}

/** A profile to take in, as which dopant. */
export interface Pick {
  readonly profile: number;
  readonly dopant: Dopant;
}

const SKETCH_POINTS = 160;

let held: { bytes: Uint8Array; name: string; reading?: Reading } | undefined;

function inWords(error: unknown): { ok: false; message: string } {
  if (error instanceof InputProblem) return { ok: false, message: error.oneLine };
  return { ok: false, message: error instanceof Error ? error.message : String(error) };
}

function sketch({
  heading,
  dopant,
  belowDetection,
  depth_um,
  concentration_cm3,
}: Reading['profiles'][number]): ProfileSketch {
  const points = depth_um.length;
  const every = Math.max(1, Math.ceil(points / SKETCH_POINTS));
  const thin = (column: Float64Array): number[] => Array.from(column.filter((_, i) => i % every === 0));
  return {
    heading,
    dopant,
    points,
    belowDetection,
    deepest_um: depth_um[points - 1],
    peak_cm3: concentration_cm3.reduce((a, b) => Math.max(a, b), 0),
    depth_um: thin(depth_um),
    concentration_cm3: thin(concentration_cm3),
  };
}

const tables = {
  hold(bytes: Uint8Array, name: string): void {
    held = { bytes, name };
  },

  read(choice: TableChoice, columns: ColumnChoice): Outcome<TableSketch> {
    if (!held) return { ok: false, message: 'no table is open' };
    try {
      const reading = readTable(held.bytes, choice, held.name, columns);
      held.reading = reading;
      const { profiles, ...rest } = reading;
      return { ok: true, value: { ...rest, profiles: profiles.map(sketch) } };
    } catch (error) {
      held.reading = undefined;
      return inWords(error);
    }
  },

  embed(picks: readonly Pick[]): Outcome<StudyStep[]> {
    if (!held?.reading) return { ok: false, message: 'the table has not been read' };
    const { bytes, name, reading } = held;
    try {
      const source = { name, sha256: sha256Hex(bytes) };
      return {
        ok: true,
        value: picks.map(({ profile, dopant }) => embedTable(reading, profile, source, dopant)),
      };
    } catch (error) {
      return inWords(error);
    }
  },

  /** Takes the tables a study names into the study. */
  resolve(study: Study, files: Record<string, Outcome<Uint8Array>>): Outcome<Study> {
    try {
      const bytesOf = (name: string): Uint8Array => {
        const file = files[name];
        if (!file) throw new Error('it was not found beside the study');
        if (!file.ok) throw new Error(file.message);
        return file.value;
      };
      return { ok: true, value: resolveTables(study, bytesOf) };
    } catch (error) {
      return inWords(error);
    }
  },
};

export type Tables = typeof tables;

Comlink.expose(tables);
