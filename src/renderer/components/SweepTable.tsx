/** The values behind a sweep, as a table that scrolls by itself. */

interface Props {
  label: string;
  head: readonly string[];
  rows: readonly (readonly string[])[];
}

export function SweepTable({ label, head, rows }: Props) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard.
    <section class="table-scroll" tabIndex={0} aria-label={label}>
      <table class="data-table">
        <thead>
          <tr>
            {head.map((name) => (
              <th key={name} scope="col">
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row[0]}>
              {row.map((cell, k) =>
                k === 0 ? (
                  <th key="head" scope="row">
                    {cell}
                  </th>
                ) : (
                  <td key={head[k]}>{cell}</td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
