import { createContext, useContext } from 'react';
import type { Me, Units } from '../../../shared/api/accounts.ts';
import { may, type Action, type Resource } from '../../../shared/rules/authorization.ts';
import type { Reader } from '../time.ts';

export type Membership = Me['farms'][number];

export const MeContext = createContext<Me | null>(null);
export const FarmContext = createContext<Membership | null>(null);

/** Who is signed in. Only below the signed-in part of the router. */
export function useMe(): Me {
  const me = useContext(MeContext);
  if (!me) throw new Error('useMe belongs below SignedIn.');
  return me;
}

/** The units this person chose; US while nobody is signed in. */
export function useUnits(): Units {
  return useContext(MeContext)?.units ?? 'us';
}

/** The farm of the address, and the role one has there. Only below the farm part of the router. */
export function useFarm(): Membership {
  const farm = useContext(FarmContext);
  if (!farm) throw new Error('useFarm belongs below FarmGate.');
  return farm;
}

/** Whether one may do something at this farm. The server decides; a page only hides what would be refused. */
export function useMay(): (action: Action, resource: Resource) => boolean {
  const { role } = useFarm();
  return (action, resource) => may(role, action, resource);
}

/** How the person signed in reads this farm's times and figures. */
export function useReader(): Reader {
  const { units } = useMe();
  const { timeZone } = useFarm();
  return { units, timeZone };
}
