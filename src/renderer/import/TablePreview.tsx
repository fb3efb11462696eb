/** The first rows as they were understood, under the headings and roles of their columns. */

import type { TableSketch } from './tableWorker';

export function TablePreview({ sketch }: { sketch: TableSketch }) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard.
    <section class="table-scroll sheet-preview" tabIndex={0} aria-label="First rows of the table">
      <table class="data-table">
        <thead>
          <tr>
            {sketch.columns.map(({ position, heading, role, dopant, unit }) => (
              <th key={position} scope="col" class={role === 'other' ? 'column-other' : ''}>
                {heading || `column ${position}`}
                <span class="column-role">
                  {role === 'other' ? 'not used' : [role, dopant, unit].filter(Boolean).join(', ')}
                </span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {sketch.preview.map((row, i) => (
            <tr key={i}>
              {row.map((cell, j) => (
                <td key={j} class={sketch.columns[j]?.role === 'other' ? 'column-other' : ''}>
                  {shortNumber(cell)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}

/** Long whole numbers as powers of ten: 18050... with twenty digits cannot be read. */
function shortNumber(cell: string): string {
  return /^\d{7,}$/.test(cell) ? Number(cell).toExponential().replace('e+', 'e') : cell;
}
