import type { Column } from './arrange.ts';

/** A text that a spreadsheet would take for a formula. */
const formula = /^[=+\-@\t\r]/;

function field(value: string | number | null): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  const safe = formula.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/**
 * Rows as CSV: a head line, CRLF line ends, quotes doubled [RFC 4180 §2]; text that a spreadsheet would run as a formula is
 * led by an apostrophe (common practice against CSV injection).
 */
export function csvOf<Row>(rows: readonly Row[], columns: readonly Column<Row>[]): string {
  const lines = [columns.map(({ head }) => field(head)), ...rows.map((row) => columns.map(({ value }) => field(value(row))))];
  return lines.map((line) => `${line.join(',')}\r\n`).join('');
}

/** Hands a text to the browser as a file. A byte order mark tells spreadsheets that it is UTF-8. */
export function saveCsv(name: string, text: string): void {
  const address = URL.createObjectURL(new Blob(['\uFEFF', text], { type: 'text/csv;charset=utf-8' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = `${name}.csv`;
  link.click();
  URL.revokeObjectURL(address);
}
