import { useId, useState, type KeyboardEvent, type ReactNode } from 'react';
import { Link, useSearchParams } from 'react-router-dom';
import { useT } from '../../lib/messages/use-t.ts';
import { Button } from '../button.tsx';
import { Icon } from '../icon.tsx';
import { EmptyState } from '../states.tsx';
import { arranged, nextSort, readSort, writeSort, type Column } from './arrange.ts';
import { csvOf, saveCsv } from './csv.ts';

export interface TableColumn<Row> extends Column<Row> {
  /** What is shown, where it is more than the value. */
  cell?: (row: Row) => ReactNode;
  /** Figures stand to the right. */
  figures?: boolean;
  /** Long text, which may take several lines. */
  wrap?: boolean;
}

interface DataTableProps<Row> {
  /** What the table holds; names it for screen readers. */
  label: string;
  rows: readonly Row[];
  columns: readonly TableColumn<Row>[];
  rowKey: (row: Row) => string;
  /** Where a row leads; its first cell is the link. */
  to?: (row: Row) => string;
  /** Name of the CSV file, without its ending; left out, there is none. */
  csvName?: string;
  /** What to do when there are no rows at all. */
  nothing: ReactNode;
  /** Sets the table's part of the address apart where a page has several. */
  name?: string;
}

/** A table that one can sort, search and save. How it is arranged stands in the address, so a link or the way back keeps it. */
export function DataTable<Row>({ label, rows, columns, rowKey, to, csvName, nothing, name = '' }: DataTableProps<Row>) {
  const t = useT();
  const [search, setSearch] = useSearchParams();
  const findId = useId();
  // What is typed shows at once; the address follows when the router comes to it.
  const [find, setFind] = useState(() => search.get(`${name}find`) ?? '');
  if (rows.length === 0) return <EmptyState>{nothing}</EmptyState>;
  const sort = readSort(search.get(`${name}sort`));
  const shown = arranged(rows, columns, { find, sort });

  function keep(key: string, value: string | null) {
    setSearch(
      (before) => {
        if (value) before.set(name + key, value);
        else before.delete(name + key);
        return before;
      },
      { replace: true, preventScrollReset: true },
    );
  }

  function look(text: string) {
    setFind(text);
    keep('find', text);
  }

  return (
    <div>
      <div className="mb-3 flex flex-wrap items-end gap-3">
        <p className="min-w-0 grow sm:max-w-72">
          <label htmlFor={findId} className="block text-sm font-semibold">
            {t('table.filter')}
          </label>
          <input id={findId} type="search" value={find} onChange={(event) => look(event.target.value)} className="min-h-touch w-full rounded-lg border-[1.5px] border-ink/50 bg-paper-raised px-3" />
        </p>
        <p role="status" className="grow py-3 text-sm text-ink-soft">
          {t('table.count', { shown: shown.length, total: rows.length })}
        </p>
        {csvName && (
          <Button variant="quiet" onClick={() => saveCsv(csvName, csvOf(shown, columns))}>
            <Icon name="save" /> {t('table.csv')}
          </Button>
        )}
      </div>
      {shown.length === 0 ? (
        <EmptyState>
          <p className="mb-2">{t('table.nothingFound', { text: find })}</p>
          <Button variant="quiet" onClick={() => look('')}>
            {t('table.clear')}
          </Button>
        </EmptyState>
      ) : (
        <div className="overflow-x-auto" role="region" aria-label={label} tabIndex={0}>
          <table className="w-full text-left">
            <thead className="border-b-2 border-ink/80">
              <tr>
                {columns.map((column) => (
                  <Head key={column.key} column={column} sorted={sort?.key === column.key ? (sort.down ? 'descending' : 'ascending') : 'none'} onSort={() => keep('sort', writeSort(nextSort(sort, column.key)))} />
                ))}
              </tr>
            </thead>
            <tbody onKeyDown={moveByRow}>
              {shown.map((row) => (
                <tr key={rowKey(row)} className="border-b border-ink/10 hover:bg-paper-sunk">
                  {columns.map(({ key, value, cell, figures, wrap }, index) => {
                    const content = cell ? cell(row) : (value(row) ?? '—');
                    return (
                      <td key={key} className={`px-2 py-1 first:pl-0 ${figures ? 'text-right' : ''} ${wrap ? 'min-w-48' : 'whitespace-nowrap'}`}>
                        {index === 0 && to ? (
                          <Link to={to(row)} className="inline-flex min-h-touch min-w-touch items-center font-semibold underline decoration-ink/30 underline-offset-4">
                            {content}
                          </Link>
                        ) : (
                          content
                        )}
                      </td>
                    );
                  })}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
    </div>
  );
}

const sortWords = { ascending: 'table.sortUp', descending: 'table.sortDown' } as const;

function Head<Row>({ column, sorted, onSort }: { column: TableColumn<Row>; sorted: 'ascending' | 'descending' | 'none'; onSort: () => void }) {
  const t = useT();
  return (
    <th scope="col" aria-sort={sorted} className={`px-2 first:pl-0 ${column.figures ? 'text-right' : ''}`}>
      <button type="button" onClick={onSort} className="inline-flex min-h-touch min-w-touch items-center gap-1 font-semibold whitespace-nowrap">
        {column.head}
        {sorted !== 'none' && <Icon name={sorted === 'ascending' ? 'up' : 'down'} size={16} />}
        {sorted !== 'none' && <span className="sr-only">, {t(sortWords[sorted])}</span>}
      </button>
    </th>
  );
}

/** Arrow keys go from a row's link to the one above or below. */
function moveByRow(event: KeyboardEvent<HTMLTableSectionElement>) {
  if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
  const row = (event.target as HTMLElement).closest('tr');
  const next = event.key === 'ArrowDown' ? row?.nextElementSibling : row?.previousElementSibling;
  const link = next?.querySelector('a');
  if (!link) return;
  event.preventDefault();
  link.focus();
}
