import { useSuspenseQuery } from '@tanstack/react-query';
import type { PlanVerdict } from '../../../../shared/api/mornings.ts';
import { HeadroomRibbon } from '../../../components/ribbon/headroom-ribbon.tsx';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { morningQuery } from '../../mornings/api/get-morning.ts';

/** The headroom ribbon of the plan that leads the morning: for a screen wide enough to read it at a glance. */
export function WholeRibbon({ verdict: { planId, date } }: { verdict: PlanVerdict }) {
  const { id: farmId } = useFarm();
  const reader = useReader();
  const { data: morning } = useSuspenseQuery(morningQuery(farmId, date));
  const plan = morning.plans.find(({ verdict }) => verdict.planId === planId);
  if (!plan) return null;
  return <HeadroomRibbon answer={plan.answer} timeZone={reader.timeZone} minutesNeeded={plan.verdict.minutesNeeded} units={reader.units} />;
}
