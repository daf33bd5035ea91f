import { useSuspenseQuery } from '@tanstack/react-query';
import { lazy } from 'react';
import { ForecastNote, StaleBanner } from '../../../components/forecast-facts.tsx';
import { EmptyState, PageHeading } from '../../../components/index.ts';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { useMediaQuery } from '../../../lib/use-media-query.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { longDate, shortDate, weekday } from '../../../lib/time.ts';
import { daybreakQuery } from '../api/get-daybreak.ts';
import { leadOf, NextMornings } from '../components/next-mornings.tsx';
import { OtherPlans } from '../components/other-plans.tsx';
import { PlanAnswer } from '../components/plan-answer.tsx';
import { morningName } from '../next-step.ts';

/** Too heavy for the first load of a phone, which shows the small ribbon instead. */
const WholeRibbon = lazy(async () => ({ default: (await import('../components/whole-ribbon.tsx')).WholeRibbon }));

/** The first page: the coming morning's answer, and the five after it. */
export function DaybreakPage() {
  const { id: farmId } = useFarm();
  const { data: daybreak } = useSuspenseQuery(daybreakQuery(farmId));
  const { mornings, forecast, stale, now, timeZone } = daybreak;
  const wide = useMediaQuery('(min-width: 64rem)');
  const [first, ...rest] = mornings;
  const lead = first && leadOf(first.verdicts);
  if (!first || !lead) {
    return (
      <>
        <PageHeading title="Daybreak" />
        <EmptyState>The first mornings are being worked out. This takes a moment after a farm is opened.</EmptyState>
      </>
    );
  }
  const name = morningName(first.date, now, timeZone);
  const others = first.verdicts.filter((verdict) => verdict !== lead);
  return (
    <>
      {stale && <StaleBanner forecast={forecast} now={now} />}
      <PageHeading title={name} low>
        {name !== longDate(first.date) && <p className="over">{`${weekday(first.date)}, ${shortDate(first.date)}`}</p>}
      </PageHeading>
      <div className="lg:grid lg:grid-cols-[3fr_2fr] lg:gap-12">
        <div>
          <PlanAnswer daybreak={daybreak} verdict={lead} />
          {others.length > 0 && <OtherPlans verdicts={others} />}
        </div>
        <section aria-label="The mornings after" className="mt-3 lg:mt-0">
          <NextMornings mornings={rest} />
          <div className="mt-2">
            <ForecastNote forecast={forecast} stale={stale} now={now} />
          </div>
        </section>
      </div>
      {wide && (
        <div className="mt-10">
          <QueryPanel title={lead.planName} lines={8}>
            <WholeRibbon verdict={lead} />
          </QueryPanel>
        </div>
      )}
    </>
  );
}
