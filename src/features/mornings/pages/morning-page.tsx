import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { ForecastNote, StaleBanner } from '../../../components/forecast-facts.tsx';
import { PageHeading, Panel } from '../../../components/index.ts';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useMay } from '../../../lib/session/session.ts';
import { longDate } from '../../../lib/time.ts';
import { morningQuery } from '../api/get-morning.ts';
import { PlanMorning } from '../components/plan-morning.tsx';
import { ReadingForm } from '../components/reading-form.tsx';
import { ReadingList } from '../components/reading-list.tsx';
import { RefreshButton } from '../components/refresh-button.tsx';
import { VerdictHistory } from '../components/verdict-history.tsx';

/** One morning, step by step, with every limit. */
export function MorningPage() {
  const { id: farmId } = useFarm();
  const { date = '' } = useParams();
  const may = useMay();
  const { data: morning } = useSuspenseQuery(morningQuery(farmId, date));
  const { forecast, stale, now } = morning;
  return (
    <>
      {stale && <StaleBanner forecast={forecast} now={now} />}
      <PageHeading title={longDate(date)} over="Morning" up={[paths.daybreak(farmId), 'Daybreak']}>
        {may('run', 'morning') && <RefreshButton />}
      </PageHeading>
      {morning.plans.map((plan) => (
        <PlanMorning key={plan.verdict.planId} plan={plan} />
      ))}
      <ForecastNote forecast={forecast} stale={stale} now={now} />
      <div className="mt-8 lg:grid lg:grid-cols-2 lg:gap-12">
        <div>
          {may('create', 'reading') && (
            <Panel title="Measured on site">
              <ReadingForm now={now} />
            </Panel>
          )}
          <QueryPanel title="Readings of this farm">
            <ReadingList />
          </QueryPanel>
        </div>
        <Panel title="How the answer changed">
          <VerdictHistory morning={morning} />
        </Panel>
      </div>
    </>
  );
}
