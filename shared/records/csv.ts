export type CsvValue = string | number | boolean | null;

/** Text that a spreadsheet would run as a formula, full-width signs included. */
const formula = /^[=+\-@\t\r\n＝＋－＠]/;

function field(value: CsvValue): string {
  if (value === null) return '';
  if (typeof value === 'number') return Number.isFinite(value) ? String(value) : '';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  const safe = formula.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/**
 * Rows as CSV: a head line, CRLF line ends, fields quoted when they must be, quotes doubled [rfc4180, §2]. Text that a spreadsheet
 * would take for a formula is led by an apostrophe (common practice against CSV injection); numbers are written as they are.
 * @throws RangeError when a row has not as many fields as the head
 */
export function csvText(head: readonly string[], rows: readonly (readonly CsvValue[])[]): string {
  const lines = rows.map((row, index) => {
    if (row.length !== head.length) throw new RangeError(`Row ${index + 1} has ${row.length} fields, the head has ${head.length}.`);
    return row;
  });
  return [head, ...lines].map((line) => `${line.map(field).join(',')}\r\n`).join('');
}
