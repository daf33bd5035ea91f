import { useSuspenseQueries } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { Panel } from '../../../components/index.ts';
import { Facts } from '../../../components/records/facts.tsx';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { RecordPage } from '../../../components/records/record-page.tsx';
import { paths } from '../../../lib/paths.ts';
import { quantityText, type Quantity } from '../../../lib/quantities.ts';
import { useFarm, useUnits } from '../../../lib/session/session.ts';
import { longDate } from '../../../lib/time.ts';
import { blocksApi } from '../../farms/api/blocks.ts';
import { sprayersApi } from '../../farms/api/sprayers.ts';
import { productsApi } from '../../shelf/api/products.ts';
import { plansApi } from '../api/plans.ts';
import { PlanMornings } from '../components/plan-mornings.tsx';
import { rateUnitWords } from '../../../lib/rate-words.ts';
import { beeKindWords, planStateWords } from '../words.ts';

export function PlanPage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const units = useUnits();
  const plan = plansApi.useOne(farmId, id);
  // Archived ones too: a plan of last month may hold a block that is gone.
  const [{ data: blocks }, { data: products }, { data: sprayers }] = useSuspenseQueries({ queries: [blocksApi.listQuery(farmId, 'all'), productsApi.listQuery(farmId, 'all'), sprayersApi.listQuery(farmId, 'all')] });
  const archive = plansApi.useArchive(farmId);
  const q = (value: number | null, quantity: Quantity) => quantityText(value, quantity, units);
  const sprayer = sprayers.find((candidate) => candidate.id === plan.sprayerId);

  return (
    <RecordPage
      item={plan}
      archive={archive}
      resource="plan"
      kind={`Plan · ${planStateWords[plan.state]}`}
      editTo={paths.plans.edit(farmId, id)}
      up={[paths.plans.list(farmId), 'Plans']}
      facts={[
        ['Against', plan.target],
        ['Blocks', blocks.filter((block) => plan.blockIds.includes(block.id)).map((block) => block.name).join(', ')],
        ['Area', q(plan.areaHa, 'area')],
        ['Sprayer', sprayer ? <Link className="underline" to={paths.sprayers.one(farmId, sprayer.id)}>{sprayer.name}</Link> : ''],
        ['Carrier volume', q(plan.carrierLHa, 'carrier')],
        ['Tanks', q(plan.tanks, 'plain')],
        ['Minutes needed', `${plan.minutesNeeded} min and ${plan.reserveMinutes} to spare`],
        ['May run', `${longDate(plan.firstDate)} to ${longDate(plan.lastDate)}`],
        ['Notes', plan.notes],
      ]}
    >
      <Panel title="The mix">
        <ul className="space-y-2">
          {plan.products.map(({ productId, rate }) => {
            const product = products.find((candidate) => candidate.id === productId);
            return (
              <li key={productId}>
                {product ? (
                  <Link to={paths.shelf.one(farmId, productId)} className="font-semibold underline">
                    {product.name}
                  </Link>
                ) : (
                  'A product no longer here'
                )}
                {product && `, ${rate} ${rateUnitWords[product.rateUnit]}`}
              </li>
            );
          })}
        </ul>
      </Panel>
      <QueryPanel title="Mornings in sight">
        <PlanMornings planId={id} />
      </QueryPanel>
      <Panel title="Limits of your own">
        <p className="mb-3">Beside these, each label in the mix holds; the stricter one counts.</p>
        <Facts
          facts={[
            ['Most wind', q(plan.windMaxMs, 'speed')],
            ['Least wind', q(plan.windMinMs, 'speed')],
            ['Most gust', q(plan.gustMaxMs, 'speed')],
            ['Inversion likelihood borne', q(plan.inversionMax, 'plain')],
            ['Without rain afterwards', plan.rainFreeHours === null ? '' : `${plan.rainFreeHours} h`],
            ['Rain that counts, in an hour', q(plan.rainMm, 'rain')],
            ['Chance of rain that counts', `${plan.rainProbabilityPct} %`],
            ['Leaves', plan.foliageDry ? 'Must be dry' : 'May be wet'],
            ['Bloom', plan.bloom ? 'Something is in bloom in or near the blocks' : 'Nothing in bloom'],
            ['Bees to look out for', plan.beeKinds.map((kind) => beeKindWords[kind]).join(', ')],
            ['Least Delta T', q(plan.deltaTMinC, 'temperatureSpan')],
            ['Most Delta T', q(plan.deltaTMaxC, 'temperatureSpan')],
            ['Lowest temperature', q(plan.temperatureMinC, 'temperature')],
            ['Highest temperature', q(plan.temperatureMaxC, 'temperature')],
          ]}
        />
      </Panel>
    </RecordPage>
  );
}
