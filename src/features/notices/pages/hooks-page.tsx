import { PageHeading } from '../../../components/index.ts';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { InboundSources } from '../components/inbound-sources.tsx';
import { NoticeTabs } from '../components/notice-tabs.tsx';
import { Webhooks } from '../components/webhooks.tsx';

/** Other machines: those that are told, and those that may send. */
export function HooksPage() {
  return (
    <>
      <PageHeading title="Webhooks" over="Notices" />
      <NoticeTabs />
      <QueryPanel title="Machines that are told">
        <Webhooks />
      </QueryPanel>
      <QueryPanel title="Machines that may send forecasts">
        <InboundSources />
      </QueryPanel>
    </>
  );
}
