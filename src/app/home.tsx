import { Navigate } from 'react-router-dom';
import { paths } from '../lib/paths.ts';
import { readLastFarm } from '../lib/session/last-farm.ts';
import { useMe } from '../lib/session/session.ts';

/** The bare address leads to the farm last looked at, or to opening the first one. */
export function Home() {
  const { farms } = useMe();
  const last = readLastFarm();
  const farm = farms.find(({ id }) => id === last) ?? farms[0];
  return <Navigate to={farm ? paths.daybreak(farm.id) : paths.newFarm()} replace />;
}
