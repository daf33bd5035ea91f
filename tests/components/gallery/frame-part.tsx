import { AppFrame, PageHeading, Panel, type FrameLink } from '../../../src/components/index.ts';

const links: FrameLink[] = [
  { to: '/', name: 'Daybreak', icon: 'daybreak' },
  { to: '/plans', name: 'Plans', icon: 'plan' },
  { to: '/shelf', name: 'Shelf', icon: 'shelf' },
  { to: '/farm', name: 'Farm', icon: 'farm' },
  { to: '/notices', name: 'Notices', icon: 'bell' },
  { to: '/people', name: 'People', icon: 'people' },
  { to: '/you', name: 'You', icon: 'person' },
];

/** The frame around a short page. */
export const FramePart = () => (
  <AppFrame links={links} place="Quillbrook">
    <PageHeading title="Wednesday, June 10" over="Morning" />
    <Panel title="Why">
      <p>Wind leaves the least to spare.</p>
    </Panel>
  </AppFrame>
);
