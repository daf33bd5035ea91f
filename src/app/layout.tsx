import { QueryErrorResetBoundary, useQuery } from '@tanstack/react-query';
import { lazy, Suspense, type ReactNode } from 'react';
import { Outlet, useLocation } from 'react-router-dom';
import { AppFrame, type FrameLink } from '../components/index.ts';
import { paths } from '../lib/paths.ts';
import { demoStatusQuery } from '../lib/session/get-demo-status.ts';
import { useFarm } from '../lib/session/session.ts';
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

/** Pages of a farm. */
export function FarmLayout() {
  const { id, name } = useFarm();
  const links: FrameLink[] = [
    { to: paths.daybreak(id), name: 'Daybreak', end: true },
    { to: paths.plans.list(id), name: 'Plans' },
    { to: paths.shelf.list(id), name: 'Shelf' },
    { to: paths.settings(id), name: 'Farm' },
    { to: paths.notices(id), name: 'Notices' },
    { to: paths.people(id), name: 'People' },
    { to: paths.account(), name: 'You' },
  ];
  return (
    <Frame links={links} place={name}>
      <Outlet />
    </Frame>
  );
}

/** Pages of no farm: signing in, one's account, the demo. */
export function PlainLayout() {
  return (
    <Frame links={[]}>
      <Outlet />
    </Frame>
  );
}
