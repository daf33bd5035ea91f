import type { ReactNode } from 'react';
import type { Resource } from '../../../shared/rules/authorization.ts';
import { useMay } from '../../lib/session/session.ts';
import { ButtonLink, PageHeading, Panel } from '../index.ts';
import { ArchiveButton } from './archive-button.tsx';
import { Facts, type Fact } from './facts.tsx';

interface RecordPageProps {
  item: { id: string; name: string; archivedAt: string | null };
  archive: Parameters<typeof ArchiveButton>[0]['archive'];
  resource: Resource;
  /** What it is, in a word above the name. */
  kind: string;
  editTo: string;
  /** Address and name of the page above. */
  up: [to: string, name: string];
  facts: Fact[];
  children?: ReactNode;
}

/** The page of one thing that a farm keeps: its facts, and what one's role may do with it. */
export function RecordPage({ item, archive, resource, kind, editTo, up, facts, children }: RecordPageProps) {
  const may = useMay();
  return (
    <>
      <PageHeading title={item.name} over={kind} up={up}>
        {may('update', resource) && <ButtonLink to={editTo}>Edit</ButtonLink>}
        {may('archive', resource) && <ArchiveButton item={item} archive={archive} />}
      </PageHeading>
      {item.archivedAt !== null && <p className="mb-4">Archived: it is kept for the record and no longer used.</p>}
      <Panel title="Facts">
        <Facts facts={facts} />
      </Panel>
      {children}
    </>
  );
}
