import { csvText } from '../../../shared/records/csv.ts';
import type { Column } from './arrange.ts';

/** Rows as CSV, safe to open in a spreadsheet. */
export const csvOf = <Row>(rows: readonly Row[], columns: readonly Column<Row>[]): string =>
  csvText(
    columns.map(({ head }) => head),
    rows.map((row) => columns.map(({ value }) => value(row))),
  );

/** Hands a text to the browser as a file. A byte order mark tells spreadsheets that it is UTF-8. */
export function saveCsv(name: string, text: string): void {
  const address = URL.createObjectURL(new Blob(['\uFEFF', text], { type: 'text/csv;charset=utf-8' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = `${name}.csv`;
  link.click();
  URL.revokeObjectURL(address);
}
