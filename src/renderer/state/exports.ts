/** Readings, columns and pictures of the shown solution into files, each with where it came from. */

import { columnsTable, csvText, PROGRAM_VERSION, readingsTable } from '../../core/index';
import type { ExportKind } from '../../main/bridge';
import { pictureOf } from '../tracks/picture';
import { bridge } from './bridge';
import { fileNameFor, inWords } from './files';
import { type Shown, shown, solveProblem } from './solver';
import { concentrationScale, depthUnit, depthWindow, say, sayError } from './viewState';

export interface PictureRequest {
  readonly format: 'svg' | 'png';
  readonly width: number;
  readonly height: number;
  /** Pixels of a PNG for each of the picture's own. */
  readonly scale: number;
}

/** The solution to export; says why there is none. */
function current(): Shown | null {
  if (solveProblem.value) sayError('Not exported: the recipe as it stands cannot be solved');
  else if (!shown.value) sayError('Not exported: nothing has been solved yet');
  return solveProblem.value ? null : shown.value;
}

function provenance({ study, solution }: Shown): string[] {
  const { models, temperature_C, study: source } = solution.result;
  return [
    `Ohmstrata ${PROGRAM_VERSION}`,
    `study: ${study.name}`,
    `study SHA-256: ${source.sha256}`,
    `temperature_C: ${temperature_C}`,
    `mobility: ${models.mobility} (${models.mobilitySource})`,
    `exported: ${new Date().toISOString()}`,
  ];
}

async function write(kind: ExportKind, suggestedName: string, data: string | Uint8Array): Promise<void> {
  const outcome = await bridge.exportFile({ kind, suggestedName, data });
  if (!outcome.ok) sayError(`Not exported: ${outcome.message}`);
  else if (outcome.value !== null) say(`Exported ${outcome.value}`);
}

export async function exportReadings(): Promise<void> {
  const now = current();
  if (!now) return;
  const { header, rows } = readingsTable(now.solution);
  const columns = header.map((_, i) => rows.map((row) => (row[i] === null ? '' : String(row[i]))));
  await write(
    'csv',
    fileNameFor(`${now.study.name} readings`, 'csv'),
    csvText(header, columns, provenance(now)),
  );
}

export async function exportColumns(): Promise<void> {
  const now = current();
  if (!now) return;
  const { header, columns } = columnsTable(now.solution);
  await write(
    'csv',
    fileNameFor(`${now.study.name} columns`, 'csv'),
    csvText(header, columns, provenance(now)),
  );
}

export async function exportPicture(request: PictureRequest): Promise<void> {
  const now = current();
  if (!now || !depthWindow.value) return;
  const view = { depthUnit: depthUnit.value, scale: concentrationScale.value };
  const caption = `${now.study.name} · SHA-256 ${now.solution.result.study.sha256.slice(0, 12)} · Ohmstrata ${PROGRAM_VERSION}, ${now.solution.result.models.mobility}, ${now.solution.result.temperature_C} °C`;
  try {
    const data = await pictureOf(now.solution, view, depthWindow.value, request, caption);
    await write(request.format, fileNameFor(now.study.name, request.format), data);
  } catch (error) {
    sayError(`Not exported: ${inWords(error)}`);
  }
}
