/** What reading a text table gives: the dialect that was used, the columns, the profiles, remarks and open questions. */

import type { Dopant } from '../../material/dopants';
import type { Warning } from '../problem';
import type { TableChoice } from '../schema';

export interface TableColumn {
  /** Counted from 1. */
  position: number;
  /** As it stands above the column; empty when the table has no headings. */
  heading: string;
  role: 'depth' | 'concentration' | 'other';
  dopant?: Dopant;
  /** One of the units of TableChoice once known. */
  unit?: string;
}

export interface TableProfile {
  dopant?: Dopant;
  heading: string;
  /** Ascending without repetition, >= 0. */
  depth_um: Float64Array;
  /** Positive. */
  concentration_cm3: Float64Array;
  /** Positions of the columns it came from, counted from 1. */
  depthColumn: number;
  concentrationColumn: number;
  /** Rows marked as below detection, zero or negative; they are not in the profile. */
  belowDetection: number;
}

/** A remark with the line of the file (from 1) it first applies to. */
export interface TableWarning extends Warning {
  line?: number;
}

/** Something the file does not say; the answer goes into the key of TableChoice, or of the step's `columns`, named by `kind`. */
export interface TableQuestion {
  kind: 'decimal' | 'depthUnit' | 'concentrationUnit' | 'columns';
  options: string[];
  message: string;
  line?: number;
}

/** How the table was read; given back as a TableChoice it makes a second reading identical. Units are absent while unknown or mixed. */
export type TableDialect = Required<Omit<TableChoice, 'depthUnit' | 'concentrationUnit' | 'decimal'>> &
  Pick<TableChoice, 'depthUnit' | 'concentrationUnit' | 'decimal'>;

export interface TableReading {
  choice: TableDialect;
  /** Comments and free text around the table. */
  metadata: string[];
  columns: TableColumn[];
  /** Empty while a question is open. */
  profiles: TableProfile[];
  /** The first rows: numbers as understood, everything else as it stands. */
  preview: string[][];
  warnings: TableWarning[];
  questions: TableQuestion[];
}

/** Columns chosen by a person: a position from 1 or a heading. */
export interface ColumnChoice {
  depth?: number | string;
  concentration?: number | string;
}
