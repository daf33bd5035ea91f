import { useSuspenseQueries, useSuspenseQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { EmptyState, PageHeading } from '../../../components/index.ts';
import { RecordEditor } from '../../../components/records/record-editor.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { dateOf } from '../../../lib/time.ts';
import { blocksApi } from '../../farms/api/blocks.ts';
import { sprayersApi } from '../../farms/api/sprayers.ts';
import { daybreakQuery } from '../../daybreak/api/get-daybreak.ts';
import { productsApi } from '../../shelf/api/products.ts';
import { plansApi } from '../api/plans.ts';
import { emptyPlan, PlanForm, type PlanChoices } from '../components/plan-form.tsx';

/** What a plan is put together from. */
function usePlanChoices(farmId: string): PlanChoices {
  const [{ data: blocks }, { data: products }, { data: sprayers }] = useSuspenseQueries({ queries: [blocksApi.listQuery(farmId), productsApi.listQuery(farmId), sprayersApi.listQuery(farmId)] });
  return { blocks, products, sprayers };
}

const planDays = 7;
const later = (date: string, days: number): string => new Date(Date.parse(`${date}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10);

/** What is still to be added before a plan can be made. */
function Missing({ farmId, choices }: { farmId: string; choices: PlanChoices }) {
  const missing: [boolean, string, string][] = [
    [choices.blocks.length === 0, paths.blocks.create(farmId), 'Add a block'],
    [choices.products.length === 0, paths.shelf.create(farmId), 'Put a product on the shelf'],
    [choices.sprayers.length === 0, paths.sprayers.create(farmId), 'Add a sprayer'],
  ];
  return (
    <>
      <PageHeading title="New plan" />
      <EmptyState>
        A plan is made of blocks, products and a sprayer. Still to do:{' '}
        {missing
          .filter(([wanted]) => wanted)
          .map(([, to, label]) => (
            <Link key={to} to={to} className="block min-h-touch py-3 font-semibold underline">
              {label}
            </Link>
          ))}
      </EmptyState>
    </>
  );
}

export function NewPlanPage() {
  const { id: farmId, timeZone } = useFarm();
  const choices = usePlanChoices(farmId);
  const { data: daybreak } = useSuspenseQuery(daybreakQuery(farmId));
  const save = plansApi.useSave(farmId, null);
  const [sprayer] = choices.sprayers;
  if (choices.blocks.length === 0 || choices.products.length === 0 || !sprayer) return <Missing farmId={farmId} choices={choices} />;
  const today = daybreak.mornings[0]?.date ?? dateOf(daybreak.now, timeZone);
  return (
    <RecordEditor resource="plan" title="New plan" stored={null} save={save.mutateAsync} after={(plan) => paths.plans.one(farmId, plan.id)} cancelTo={paths.plans.list(farmId)}>
      {(part) => <PlanForm {...part} {...choices} start={emptyPlan(today, later(today, planDays), sprayer.id)} />}
    </RecordEditor>
  );
}

export function EditPlanPage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const choices = usePlanChoices(farmId);
  const plan = plansApi.useOne(farmId, id);
  const save = plansApi.useSave(farmId, id);
  const here = paths.plans.one(farmId, id);
  return (
    <RecordEditor resource="plan" title={`Edit ${plan.name}`} stored={plan} save={save.mutateAsync} after={() => here} cancelTo={here}>
      {(part) => <PlanForm {...part} {...choices} start={plan} />}
    </RecordEditor>
  );
}
