import { useState } from 'react';
import type { Block, Farm, Sprayer } from '../../../../shared/api/farms.ts';
import type { Product } from '../../../../shared/api/plans.ts';
import { ButtonLink, PageHeading } from '../../../components/index.ts';
import { paths } from '../../../lib/paths.ts';
import { BlockStep } from '../components/block-step.tsx';
import { FarmStep } from '../components/farm-step.tsx';
import { PlanStep } from '../components/plan-step.tsx';
import { ProductStep } from '../components/product-step.tsx';
import { SprayerStep } from '../components/sprayer-step.tsx';

interface Made {
  farm?: Farm;
  block?: Block;
  product?: Product;
  sprayer?: Sprayer;
  planned?: boolean;
}

const steps = ['Place', 'Block', 'Product', 'Sprayer', 'Plan', 'Phone'] as const;

/** From nothing to a real verdict: a few answers a step, each saved as it is given. */
export function FirstRunPage() {
  const [made, setMade] = useState<Made>({});
  const { farm, block, product, sprayer, planned } = made;
  const at = [farm, block, product, sprayer, planned].filter(Boolean).length;
  const take = (more: Made) => setMade({ ...made, ...more });
  return (
    <>
      <PageHeading title="Open a farm" over={`Step ${at + 1} of ${steps.length}: ${steps[at]!.toLowerCase()}`} />
      <ol aria-label="Steps" className="mb-6 flex gap-1">
        {steps.map((step, index) => (
          <li key={step} aria-current={index === at ? 'step' : undefined} className={`h-2 flex-1 rounded-full ${index <= at ? 'bg-straw' : 'bg-ink/15'}`}>
            <span className="sr-only">{step}</span>
          </li>
        ))}
      </ol>
      {!farm && <FarmStep done={(value) => take({ farm: value })} />}
      {farm && !block && <BlockStep farmId={farm.id} done={(value) => take({ block: value })} />}
      {farm && block && !product && <ProductStep farmId={farm.id} done={(value) => take({ product: value })} />}
      {farm && block && product && !sprayer && <SprayerStep farmId={farm.id} done={(value) => take({ sprayer: value })} />}
      {farm && block && product && sprayer && !planned && <PlanStep farm={farm} block={block} product={product} sprayer={sprayer} done={() => take({ planned: true })} />}
      {farm && planned && (
        <div className="space-y-4">
          <p>
            {farm.name} is set up. Enable your phone, and it is told the night before and at dawn; or look at the first answer now.
          </p>
          <p className="flex flex-wrap gap-2">
            <ButtonLink variant="primary" to={paths.devices(farm.id)}>
              Enable this device
            </ButtonLink>
            <ButtonLink to={paths.daybreak(farm.id)}>See the next morning</ButtonLink>
          </p>
        </div>
      )}
    </>
  );
}
