/** A profile that was read becomes a step of the study, with its data and where they came from. */

import type { Dopant } from '../../material/dopants';
import { InputProblem } from '../problem';
import { MAX_TABLE_POINTS, type StudyStep } from '../schema';
import type { TableReading } from './reading';
import { thinProfile } from './thin';

export type TableStepDocument = Extract<StudyStep, { step: 'table' }>;

/** What a study can hold: deeper or denser than this is a wrong unit. */
const DEEPEST_UM = 1e4;
const DENSEST_CM3 = 1e23;

/**
 * The table step for one profile of a reading, thinned to {@link MAX_TABLE_POINTS} where needed.
 * @param source name of the file and SHA-256 of its bytes.
 * @param dopant needed where the heading does not tell; goes before what the heading says.
 * @throws InputProblem when there is no such profile, no dopant, or values that no study may hold.
 */
export function embedTable(
  reading: TableReading,
  profileIndex: number,
  source: { name: string; sha256: string },
  dopant?: Dopant,
): TableStepDocument {
  const file = source.name;
  const open = reading.questions[0];
  if (open) throw new InputProblem(open.message, { file, line: open.line });
  const profile = reading.profiles[profileIndex];
  if (!profile)
    throw new InputProblem(
      `there is no profile ${profileIndex + 1}; the table holds ${reading.profiles.length}`,
      {
        file,
      },
    );
  const of = dopant ?? profile.dopant;
  if (!of) throw new InputProblem(`"${profile.heading}" names no dopant; state which one it is`, { file });
  const deepest = profile.depth_um[profile.depth_um.length - 1];
  const densest = profile.concentration_cm3.reduce((a, b) => Math.max(a, b));
  if (deepest > DEEPEST_UM)
    throw new InputProblem(
      `"${profile.heading}" reaches ${deepest} um deep; at most ${DEEPEST_UM} are allowed: is the depth unit right?`,
      { file },
    );
  if (densest > DENSEST_CM3)
    throw new InputProblem(
      `"${profile.heading}" reaches ${densest} cm^-3; at most ${DENSEST_CM3} are allowed: is the concentration unit right?`,
      { file },
    );
  const { depth_um, concentration_cm3 } = thinProfile(
    profile.depth_um,
    profile.concentration_cm3,
    MAX_TABLE_POINTS,
  );
  return {
    step: 'table',
    dopant: of,
    depth_um: Array.from(depth_um),
    concentration_cm3: Array.from(concentration_cm3),
    source: { name: source.name.slice(0, 255), sha256: source.sha256 },
  };
}
