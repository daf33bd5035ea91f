import { useSuspenseQuery } from '@tanstack/react-query';
import { EmptyState, VerdictSign } from '../../../components/index.ts';
import { RecordList } from '../../../components/records/record-list.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useReader } from '../../../lib/session/session.ts';
import { longDate } from '../../../lib/time.ts';
import { stateOf, why, windowText } from '../../../lib/verdict-text.ts';
import { daybreakQuery } from '../../daybreak/api/get-daybreak.ts';

/** The coming mornings as this plan is judged on them. */
export function PlanMornings({ planId }: { planId: string }) {
  const { id: farmId } = useFarm();
  const reader = useReader();
  const { data } = useSuspenseQuery(daybreakQuery(farmId));
  const verdicts = data.mornings.flatMap((morning) => morning.verdicts).filter((verdict) => verdict.planId === planId);
  if (verdicts.length === 0) return <EmptyState>None of the coming mornings lies between the first and the last day of this plan.</EmptyState>;
  return (
    <RecordList
      rows={verdicts.map((verdict) => ({
        id: verdict.date,
        to: paths.morning(farmId, verdict.date),
        name: longDate(verdict.date),
        about: windowText(verdict, reader) || why(verdict, reader),
        mark: <VerdictSign state={stateOf(verdict)} size={40} />,
      }))}
    />
  );
}
