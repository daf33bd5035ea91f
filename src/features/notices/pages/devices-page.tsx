import { PageHeading, Panel } from '../../../components/index.ts';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { DeviceList } from '../components/device-list.tsx';
import { EnableDevice } from '../components/enable-device.tsx';
import { NoticeTabs } from '../components/notice-tabs.tsx';
import { WishesTable } from '../components/wishes-table.tsx';

/** How notices reach the person signed in. */
export function DevicesPage() {
  return (
    <>
      <PageHeading title="Your devices" over="Notices" />
      <NoticeTabs />
      <Panel title="This device">
        <EnableDevice />
      </Panel>
      <QueryPanel title="Devices that get a push">
        <DeviceList />
      </QueryPanel>
      <QueryPanel title="What reaches you" lines={6}>
        <WishesTable />
      </QueryPanel>
    </>
  );
}
