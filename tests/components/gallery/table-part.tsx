import { useSearchParams } from 'react-router-dom';
import { DataTable } from '../../../src/components/data-table/data-table.tsx';

interface Sprayed {
  id: string;
  block: string;
  date: string;
  areaHa: number | null;
  note: string;
}

const rows: Sprayed[] = [
  { id: 'a', block: 'North rows', date: '2026-05-02', areaHa: 0.8, note: 'calm, dry' },
  { id: 'b', block: 'Brook side', date: '2026-05-11', areaHa: null, note: 'gusts, stopped' },
  { id: 'c', block: 'Ridge', date: '2026-04-20', areaHa: 1.2, note: '=1+1' },
  { id: 'd', block: 'Old pears', date: '2026-05-30', areaHa: 0.35, note: 'said "go"' },
];

/** A table of four rows; `?empty` shows it without any. */
export function TablePart() {
  const [search] = useSearchParams();
  return (
    <DataTable
      label="Sprayed"
      rows={search.has('empty') ? [] : rows}
      rowKey={({ id }) => id}
      to={({ id }) => `/?part=table&row=${id}`}
      csvName="sprayed"
      nothing="Nothing was sprayed yet. The first finished job stands here."
      columns={[
        { key: 'block', head: 'Block', value: ({ block }) => block },
        { key: 'date', head: 'Date', value: ({ date }) => date },
        { key: 'area', head: 'Area, ha', value: ({ areaHa }) => areaHa, figures: true },
        { key: 'note', head: 'Note', value: ({ note }) => note },
      ]}
    />
  );
}
