import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { MeContext } from '../lib/session/session.ts';
import { meQuery } from '../lib/session/get-me.ts';
import { paths } from '../lib/paths.ts';
import { PageSkeleton, ProblemPage } from './states.tsx';

/** Lets through who is signed in; leads others to the sign-in page and, after it, back here. */
export function SignedIn() {
  const { data: me, error, refetch } = useQuery(meQuery);
  const { pathname, search } = useLocation();
  if (me) {
    return (
      <MeContext value={me}>
        <Outlet />
      </MeContext>
    );
  }
  if (me === null) return <Navigate to={paths.signIn(pathname + search)} replace />;
  if (error) return <ProblemPage error={error} retry={() => void refetch()} />;
  return <PageSkeleton />;
}
