import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Block, Farm, Sprayer } from '../../../../shared/api/farms.ts';
import type { Product } from '../../../../shared/api/plans.ts';
import { Button } from '../../../components/index.ts';
import { rateUnitWords } from '../../../lib/rate-words.ts';
import { dateOf } from '../../../lib/time.ts';
import { daybreakQuery } from '../../daybreak/api/get-daybreak.ts';
import { plansApi } from '../../plans/api/plans.ts';

const weekMs = 7 * 86_400_000;
/** Where the label of an example names no carrier volume: about 15 gallons an acre. */
const usualCarrierLHa = 140;

interface PlanStepProps {
  farm: Farm;
  block: Block;
  product: Product;
  sprayer: Sprayer;
  done: () => void;
}

/** Puts what was entered together into a first plan for the coming week. */
export function PlanStep({ farm, block, product, sprayer, done }: PlanStepProps) {
  const { data: daybreak } = useSuspenseQuery(daybreakQuery(farm.id));
  const save = plansApi.useSave(farm.id, null);
  const [problem, setProblem] = useState<string | null>(null);
  const firstDate = daybreak.mornings[0]?.date ?? dateOf(daybreak.now, farm.timeZone);

  async function make() {
    setProblem(null);
    try {
      await save.mutateAsync({
        body: {
          name: `First plan, ${block.name}`,
          blockIds: [block.id],
          products: [{ productId: product.id, rate: product.rateMin }],
          sprayerId: sprayer.id,
          carrierLHa: product.carrierMinLHa ?? usualCarrierLHa,
          firstDate,
          lastDate: new Date(Date.parse(firstDate) + weekMs).toISOString().slice(0, 10),
        },
        version: undefined,
      });
      done();
    } catch (error) {
      setProblem(error instanceof Error ? error.message : 'That did not work. Try again.');
    }
  }

  return (
    <div className="space-y-4">
      <p>
        A first plan for the coming week: {product.name} on {block.name} with {sprayer.name}, {product.rateMin} {rateUnitWords[product.rateUnit]}. You can change everything later.
      </p>
      <Button busy={save.isPending} onClick={() => void make()}>
        Make the plan
      </Button>
      {problem && <p role="alert">{problem}</p>}
    </div>
  );
}
