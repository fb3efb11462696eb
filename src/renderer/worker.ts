/** The worker: runs the core away from the window, so that typing and pointing never wait for it. */

import * as Comlink from 'comlink';
import {
  type BiasResult,
  type BiasSpan,
  biasSweep,
  type HistoryResult,
  InputProblem,
  recipeHistory,
  type Solution,
  type Study,
  solve,
  type TemperatureResult,
  type TemperatureSpan,
  temperatureSweep,
} from '../core/index';

interface Failed {
  ok: false;
  key: string;
  message: string;
}

/** What a run ends with; problems cross as data. */
export type Solved = { ok: true; solution: Solution; milliseconds: number } | Failed;
export type Swept<Result> = { ok: true; result: Result } | Failed;

function asProblem(error: unknown): Failed {
  if (error instanceof InputProblem) return { ok: false, key: error.place.key ?? '', message: error.message };
  return { ok: false, key: '', message: error instanceof Error ? error.message : String(error) };
}

function buffersOf({ columns }: Solution): ArrayBuffer[] {
  const { dopants, ...rest } = columns;
  const all = [...Object.values(rest), ...dopants.flatMap((each) => [each.chemical_cm3, each.active_cm3])];
  return [...new Set(all.map((column) => column.buffer as ArrayBuffer))];
}

const calculations = {
  solve(study: Study): Solved {
    const start = performance.now();
    try {
      const solution = solve(study);
      const milliseconds = performance.now() - start;
      return Comlink.transfer({ ok: true, solution, milliseconds }, buffersOf(solution));
    } catch (error) {
      return asProblem(error);
    }
  },

  temperature: (study: Study, span: TemperatureSpan): Swept<TemperatureResult> =>
    swept(() => temperatureSweep(study, span)),

  history: (study: Study): Swept<HistoryResult> => swept(() => recipeHistory(study)),

  bias: (study: Study, span: BiasSpan): Swept<BiasResult> => swept(() => biasSweep(study, span)),
};

function swept<Result>(run: () => Result): Swept<Result> {
  try {
    return { ok: true, result: run() };
  } catch (error) {
    return asProblem(error);
  }
}

export type Calculations = typeof calculations;

Comlink.expose(calculations);
