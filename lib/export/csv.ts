/** Signs, the wide ones of East Asian keyboards too, that make a spreadsheet take a cell for a formula to carry out. */
const formulaStart = /^[=+\-@\t\r＝＋－＠]/;

/**
 * One line of CSV (RFC 4180), with its end. A cell that a spreadsheet would take for a formula begins with an apostrophe, which
 * spreadsheets hide; quotation marks stand around a cell that needs them.
 */
export const csvLine = (cells: readonly (string | number | null)[]): string => `${cells.map(cellOf).join(',')}\r\n`;

function cellOf(cell: string | number | null): string {
  if (cell === null) return '';
  if (typeof cell === 'number') return String(cell);
  const safe = formulaStart.test(cell) ? `'${cell}` : cell;
  return /[",\r\n]/.test(safe) || safe !== safe.trim() ? `"${safe.replaceAll('"', '""')}"` : safe;
}
