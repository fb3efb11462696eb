/** Reads a table of published numbers from `tests/published/data`: comment lines with the source, a header, rows. */

import { readFileSync } from 'node:fs';
import Papa from 'papaparse';

/** Rows by column name; numbers where they read as numbers. */
export function publishedTable<Row>(name: string): Row[] {
  const text = readFileSync(new URL(`./data/${name}.csv`, import.meta.url), 'utf8');
  const { data, errors } = Papa.parse<Row>(text, {
    comments: '#',
    header: true,
    // Papa's own typing leaves numbers above 2^53 as text, and concentrations are.
    transform: (value: string) => (Number.isNaN(Number(value)) ? value : Number(value)),
    skipEmptyLines: true,
  });
  if (errors.length > 0) throw new Error(`${name}.csv: ${errors[0].message}`);
  return data;
}
