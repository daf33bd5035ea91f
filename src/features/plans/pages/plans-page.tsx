import { PageHeading } from '../../../components/index.ts';
import { KeptPanel } from '../../../components/records/kept-panel.tsx';
import { paths } from '../../../lib/paths.ts';
import { quantityText } from '../../../lib/quantities.ts';
import { useFarm, useMay, useUnits } from '../../../lib/session/session.ts';
import { shortDate } from '../../../lib/time.ts';
import { plansApi } from '../api/plans.ts';
import { planStateWords } from '../words.ts';

/** What is meant to be sprayed, and between which days. */
export function PlansPage() {
  const { id: farmId } = useFarm();
  const may = useMay();
  const units = useUnits();
  return (
    <>
      <PageHeading title="Plans" over="What to spray, and when" />
      <KeptPanel
        title="Plans"
        api={plansApi}
        createTo={may('create', 'plan') ? paths.plans.create(farmId) : null}
        createLabel="Make a plan"
        nothing="No plans yet. With a plan, each morning is judged by your products' labels and the minutes your job needs."
        row={(plan) => ({
          id: plan.id,
          name: plan.name,
          to: paths.plans.one(farmId, plan.id),
          about: [`${shortDate(plan.firstDate)} to ${shortDate(plan.lastDate)}`, plan.target, quantityText(plan.areaHa, 'area', units), `${plan.minutesNeeded} min`].filter(Boolean).join(' · '),
          mark: plan.state === 'planned' ? undefined : <span className="rounded-full border px-3 py-1 text-sm">{planStateWords[plan.state]}</span>,
        })}
      />
    </>
  );
}
