import { useEffect } from 'react';
import { Outlet, useParams } from 'react-router-dom';
import { FarmContext, useMe } from '../lib/session/session.ts';
import { rememberFarm } from '../lib/session/last-farm.ts';
import { NotFoundPage } from './states.tsx';

/** Lets through members of the farm in the address; to others it does not exist. */
export function FarmGate() {
  const me = useMe();
  const { farmId } = useParams();
  const farm = me.farms.find(({ id }) => id === farmId);
  useEffect(() => {
    if (farm) rememberFarm(farm.id);
  }, [farm]);
  if (!farm) return <NotFoundPage />;
  return (
    <FarmContext value={farm}>
      <Outlet />
    </FarmContext>
  );
}
