import { useSuspenseInfiniteQuery } from '@tanstack/react-query';
import { Button, EmptyState, PageHeading } from '../../../components/index.ts';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { useFarm } from '../../../lib/session/session.ts';
import { noticesQuery } from '../api/get-notices.ts';
import { NoticeItem } from '../components/notice-item.tsx';
import { NoticeTabs } from '../components/notice-tabs.tsx';

/** What was told, to whom, and whether it arrived. */
export function NoticesPage() {
  return (
    <>
      <PageHeading title="Notices" />
      <NoticeTabs />
      <QueryPanel title="What was told" lines={8}>
        <NoticeList />
      </QueryPanel>
    </>
  );
}

function NoticeList() {
  const { id: farmId } = useFarm();
  const { data, hasNextPage, fetchNextPage, isFetchingNextPage } = useSuspenseInfiniteQuery(noticesQuery(farmId));
  const notices = data.pages.flat();
  if (notices.length === 0) return <EmptyState>Nothing was told yet. The first notice comes this evening; enable your phone meanwhile, under “Your devices”.</EmptyState>;
  return (
    <>
      <ul className="divide-y divide-ink/10">
        {notices.map((notice) => (
          <NoticeItem key={notice.id} notice={notice} />
        ))}
      </ul>
      {hasNextPage && (
        <Button variant="quiet" busy={isFetchingNextPage} onClick={() => void fetchNextPage()}>
          Show older ones
        </Button>
      )}
    </>
  );
}
