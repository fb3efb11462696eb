/** The public face of the calculation: all that the window and the command line may import. */

export { type BiasResult, type BiasSpan, biasSweep } from './explore/bias';
export { type HistoryResult, recipeHistory } from './explore/history';
export { type TemperatureResult, type TemperatureSpan, temperatureSweep } from './explore/temperature';
export {
  DOPANT_FACTS,
  DOPANTS,
  type Dopant,
  dopantOf,
  IMPLANT_SPECIES,
  type ImplantSpecies,
} from './material/dopants';
export { ELEMENTS } from './material/elements';
export { concentrationOf, resistivityOf } from './material/mf723';
export { TARGETS, type TargetName } from './material/targets';
export { MOBILITY_MODELS } from './mobility/list';
export { uniformResistivity } from './mobility/resistivity';
export { rangeStatistics } from './process/ranges';
export { rangeMoments } from './process/stopping/moments';
export { csvText } from './report/csv';
export { type ColumnTable, columnsTable, type RowTable, readingsTable } from './report/tables';
export type {
  JunctionResult,
  LayerResult,
  MeasurementResult,
  ResultDocument,
  Solution,
  SolvedColumns,
  StepResult,
} from './result';
export { type SolveOptions, solve } from './solve';
export { sha256Hex } from './study/hash';
export {
  CARRIER_NAMES,
  DIFFUSION_NAMES,
  DIFFUSIVITY_SETS,
  IONISATION_NAMES,
  MOBILITY_NAMES,
  NARROWING_NAMES,
  RANGE_SETS,
  STATISTICS_NAMES,
  TABLE_DELIMITERS,
  TABLE_ENCODINGS,
} from './study/names';
export { InputProblem, NoSolution, type StudyProblem, type Warning } from './study/problem';
export { formatQuantity, parseQuantity } from './study/quantity';
export { resolveTables, safeTableName } from './study/resolveTables';
export type { Measurement, Study, StudyStep, StudyStepKind, TableChoice } from './study/schema';
export { embedTable } from './study/table/embed';
export { readTable } from './study/table/read';
export type {
  ColumnChoice,
  TableColumn,
  TableProfile,
  TableQuestion,
  TableReading,
  TableWarning,
} from './study/table/reading';
export { parseStudy, studyProblems, validateStudy } from './study/validate';
export { studyJsonSchema, writeStudy } from './study/write';
export { PROGRAM_VERSION } from './version';
