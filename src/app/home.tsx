import { Navigate } from 'react-router-dom';
import { paths } from '../lib/paths.ts';
import { lastFarmOf } from '../lib/session/last-farm.ts';
import { useMe } from '../lib/session/session.ts';

/** The bare address leads to the farm last looked at, or to opening the first one. */
export function Home() {
  const farm = lastFarmOf(useMe());
  return <Navigate to={farm ? paths.daybreak(farm.id) : paths.newFarm()} replace />;
}
