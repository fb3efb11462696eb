/** Answers for people: numbers with a sensible number of digits, tables in aligned columns. */

/** Up to four significant digits, powers of ten where a plain number would be long; a dash for what does not exist. */
export function figure(value: number | null, digits = 4): string {
  if (value === null || Number.isNaN(value)) return '-';
  const size = Math.abs(value);
  if (value !== 0 && (size >= 1e5 || size < 1e-3)) return value.toExponential(digits - 1).replace('e+', 'e');
  return String(Number(value.toPrecision(digits)));
}

/** Rows under their heads, the first column to the left and the others to the right. */
export function table(head: readonly string[], rows: readonly (readonly string[])[]): string {
  const widths = head.map((name, i) => Math.max(name.length, ...rows.map((row) => row[i].length)));
  const line = (cells: readonly string[]): string =>
    cells
      .map((cell, i) => (i === 0 ? cell.padEnd(widths[i]) : cell.padStart(widths[i])))
      .join('  ')
      .trimEnd();
  return [line(head), line(widths.map((width) => '-'.repeat(width))), ...rows.map(line)].join('\n');
}

/** `name  value` lines, the names padded to one width. */
export function pairs(entries: readonly (readonly [name: string, value: string])[]): string {
  const width = Math.max(...entries.map(([name]) => name.length));
  return entries.map(([name, value]) => `${name.padEnd(width)}  ${value}`).join('\n');
}

/** An answer to standard output. */
export function answer(text: string): void {
  process.stdout.write(`${text}\n`);
}

export const json = (value: unknown): string => JSON.stringify(value, null, 2);

/** Warnings to standard error, one a line. */
export function tellWarnings(warnings: readonly { message: string; step?: number }[]): void {
  for (const { message, step } of warnings)
    process.stderr.write(`warning: ${step === undefined ? '' : `step ${step}: `}${message}\n`);
}
