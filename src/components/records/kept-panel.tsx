import { useState } from 'react';
import type { Archived } from '../../lib/api/kept.ts';
import { useFarm } from '../../lib/session/session.ts';
import { Button, ButtonLink, EmptyState } from '../index.ts';
import { QueryPanel } from './query-panel.tsx';
import { RecordList, type RecordRow } from './record-list.tsx';

interface KeptPanelProps<Item> {
  title: string;
  api: { useList: (farmId: string, archived?: Archived) => Item[] };
  /** Where a new one is made; null when one's role may not. */
  createTo: string | null;
  createLabel: string;
  /** What to do when there is none. */
  nothing: string;
  row: (item: Item) => RecordRow;
}

/** The list of one kind of thing that a farm keeps, with the archived ones behind a button. */
export function KeptPanel<Item>(props: KeptPanelProps<Item>) {
  const { title, createTo, createLabel } = props;
  const [archived, setArchived] = useState<Archived>('no');
  return (
    <QueryPanel title={title} actions={createTo && <ButtonLink to={createTo}>{createLabel}</ButtonLink>}>
      <List {...props} archived={archived} />
      <div className="mt-2">
        <Button variant="link" onClick={() => setArchived(archived === 'no' ? 'yes' : 'no')}>
          {archived === 'no' ? 'Show archived' : 'Back to those in use'}
        </Button>
      </div>
    </QueryPanel>
  );
}

function List<Item>({ api, archived, nothing, row }: KeptPanelProps<Item> & { archived: Archived }) {
  const { id: farmId } = useFarm();
  const items = api.useList(farmId, archived);
  if (items.length === 0) return <EmptyState>{archived === 'no' ? nothing : 'Nothing is archived here.'}</EmptyState>;
  return <RecordList rows={items.map(row)} />;
}
