import { QueryErrorResetBoundary, useQuery } from '@tanstack/react-query';
import { lazy, Suspense, type ReactNode } from 'react';
import { Outlet, useLocation } from 'react-router-dom';
import { AppFrame, type FrameLink } from '../components/index.ts';
import { paths } from '../lib/paths.ts';
import { demoStatusQuery } from '../lib/session/get-demo-status.ts';
import { meQuery } from '../lib/session/get-me.ts';
import { lastFarmOf } from '../lib/session/last-farm.ts';
import { MeContext, useFarm } from '../lib/session/session.ts';
import { PageBoundary, PageSkeleton } from './states.tsx';

const DemoBar = lazy(() => import('../features/demo/components/demo-bar.tsx').then(({ DemoBar: component }) => ({ default: component })));

/** The demo's strip, only while the fakes run. */
function Strip() {
  const { data: status } = useQuery(demoStatusQuery);
  if (!status?.demo) return null;
  return (
    <Suspense fallback={<div className="h-12 bg-night" />}>
      <DemoBar />
    </Suspense>
  );
}

/** A frame whose page may load, or fail, by itself. */
function Frame({ links, place, children }: { links: FrameLink[]; place?: string; children: ReactNode }) {
  const { pathname } = useLocation();
  return (
    <AppFrame links={links} {...(place ? { place } : {})} strip={<Strip />}>
      <QueryErrorResetBoundary>
        {({ reset }) => (
          <PageBoundary address={pathname} onRetry={reset}>
            <Suspense fallback={<PageSkeleton />}>{children}</Suspense>
          </PageBoundary>
        )}
      </QueryErrorResetBoundary>
    </AppFrame>
  );
}

const linksOf = (farmId: string): FrameLink[] => [
  { to: paths.daybreak(farmId), name: 'Daybreak', icon: 'daybreak', end: true },
  { to: paths.plans.list(farmId), name: 'Plans', icon: 'plan' },
  { to: paths.shelf.list(farmId), name: 'Shelf', icon: 'shelf' },
  { to: paths.settings(farmId), name: 'Farm', icon: 'farm' },
  { to: paths.notices(farmId), name: 'Notices', icon: 'bell' },
  { to: paths.people(farmId), name: 'People', icon: 'people' },
  { to: paths.account(), name: 'You', icon: 'person' },
];

/** Pages of a farm. */
export function FarmLayout() {
  const { id, name } = useFarm();
  return (
    <Frame links={linksOf(id)} place={name}>
      <Outlet />
    </Frame>
  );
}

/** Pages of no farm: signing in, one's account, the demo. Whoever is signed in keeps the way back to the farm last looked at. */
export function PlainLayout() {
  const { data: me = null } = useQuery(meQuery);
  const farm = me && lastFarmOf(me);
  return (
    <MeContext value={me}>
      <Frame links={farm ? linksOf(farm.id) : []} {...(farm ? { place: farm.name } : {})}>
        <Outlet />
      </Frame>
    </MeContext>
  );
}
