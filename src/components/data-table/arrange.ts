/** One column of a table. */
export interface Column<Row> {
  key: string;
  head: string;
  /** What is sorted, searched and saved; null where there is nothing. */
  value: (row: Row) => string | number | null;
}

export interface Arrangement {
  /** Text to find; every word must be somewhere in the row. */
  find: string;
  /** Column and direction; null leaves the order as given. */
  sort: { key: string; down: boolean } | null;
}

/** `-rate` is the column `rate`, downward. */
export const readSort = (text: string | null): Arrangement['sort'] => (text ? { key: text.replace(/^-/, ''), down: text.startsWith('-') } : null);

export const writeSort = (sort: Arrangement['sort']): string | null => (sort ? `${sort.down ? '-' : ''}${sort.key}` : null);

/** The next step of a column's head: upward, downward, as given. */
export function nextSort(sort: Arrangement['sort'], key: string): Arrangement['sort'] {
  if (sort?.key !== key) return { key, down: false };
  return sort.down ? null : { key, down: true };
}

const collator = new Intl.Collator(undefined, { numeric: true, sensitivity: 'base' });

function compare(one: string | number, two: string | number): number {
  return typeof one === 'number' && typeof two === 'number' ? one - two : collator.compare(String(one), String(two));
}

/** The rows that hold every word looked for, in the order asked for; what is empty stands last either way. */
export function arranged<Row>(rows: readonly Row[], columns: readonly Column<Row>[], { find, sort }: Arrangement): Row[] {
  const words = find.toLowerCase().split(/\s+/).filter(Boolean);
  const found = rows.filter((row) => {
    const text = columns.map(({ value }) => value(row) ?? '').join(' ').toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const column = sort && columns.find(({ key }) => key === sort.key);
  if (!sort || !column) return found;
  return found.toSorted((first, second) => {
    const [one, two] = [column.value(first), column.value(second)];
    if (one === null || two === null) return Number(one === null) - Number(two === null);
    return sort.down ? compare(two, one) : compare(one, two);
  });
}
