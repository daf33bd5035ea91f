import type { z } from 'zod';
import type { Block, Sprayer } from '../../../../shared/api/farms.ts';
import { planBody, planProblems, type Plan, type Product } from '../../../../shared/api/plans.ts';
import { CheckField, CheckGroup, ChoiceField, NotesField, NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, MoreFields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { choices } from '../../../lib/forms/choices.ts';
import type { FormPart } from '../../../lib/forms/form-part.ts';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { beeKindWords, planStateWords } from '../words.ts';
import { MixFields } from './mix-fields.tsx';

export type PlanBody = z.infer<typeof planBody>;

const numbers = {
  'products.*.rate': 'plain',
  carrierLHa: 'carrier',
  reserveMinutes: 'plain',
  windMaxMs: 'speed',
  windMinMs: 'speed',
  gustMaxMs: 'speed',
  inversionMax: 'plain',
  rainFreeHours: 'plain',
  rainMm: 'rain',
  rainProbabilityPct: 'plain',
  deltaTMinC: 'temperatureSpan',
  deltaTMaxC: 'temperatureSpan',
  temperatureMinC: 'temperature',
  temperatureMaxC: 'temperature',
} as const;

/** @param today the farm's local date, from which a new plan may run for a week */
export function emptyPlan(today: string, lastDate: string, sprayerId: string): PlanBody {
  return {
    name: '',
    target: '',
    blockIds: [],
    products: [{ productId: '', rate: Number.NaN }],
    sprayerId,
    carrierLHa: Number.NaN,
    firstDate: today,
    lastDate,
    reserveMinutes: 10,
    state: 'planned',
    bloom: false,
    beeKinds: ['honeyBee', 'bumbleBee', 'masonBee'],
    windMaxMs: null,
    windMinMs: null,
    gustMaxMs: null,
    inversionMax: null,
    rainFreeHours: null,
    rainMm: 0.2,
    rainProbabilityPct: 40,
    foliageDry: false,
    deltaTMinC: null,
    deltaTMaxC: null,
    temperatureMinC: null,
    temperatureMaxC: null,
    notes: '',
  };
}

export interface PlanChoices {
  blocks: Block[];
  products: Product[];
  sprayers: Sprayer[];
}

export function PlanForm({ stored, start, save, cancelTo, blocks, products, sprayers }: FormPart<Plan, PlanBody> & PlanChoices & { start: PlanBody }) {
  const form = useTypedForm<PlanBody>({ schema: planBody, more: planProblems, numbers, stored: stored ?? start, save });
  return (
    <RecordForm form={form} cancelTo={cancelTo} saveLabel={stored ? 'Save the plan' : 'Make the plan'}>
      <Fields legend="What and where">
        <TextField {...form.bind('name')} label="Name" hint="Such as “Mites on the ridge”." required />
        <TextField {...form.bind('target')} label="Against what" hint="The pest or disease you scouted." />
        <CheckGroup {...form.bind('blockIds')} label="Blocks" choices={blocks.map(({ id, name }) => [id, name])} />
        <ChoiceField {...form.bind('sprayerId')} label="Sprayer" choices={sprayers.map(({ id, name }) => [id, name])} />
      </Fields>
      <Fields legend="The mix">
        <MixFields form={form} products={products} />
        <NumberField {...form.bind('carrierLHa')} label="Carrier volume" hint="Water or oil per area, within what each label allows." required />
      </Fields>
      <Fields legend="When">
        <TextField {...form.bind('firstDate')} label="First day" type="date" required />
        <TextField {...form.bind('lastDate')} label="Last day" type="date" required />
        <NumberField {...form.bind('reserveMinutes')} label="Minutes to spare" unit="min" hint="Kept free at the end of the window." required />
        {stored && <ChoiceField {...form.bind('state')} label="State" choices={choices(planStateWords)} />}
      </Fields>
      <Fields legend="Bees">
        <CheckField {...form.bind('bloom')} label="Something is in bloom in or near the blocks" hint="Weeds and clover under the trees count." />
        <CheckGroup {...form.bind('beeKinds')} label="Bees to look out for" choices={choices(beeKindWords)} />
      </Fields>
      <MoreFields legend="Your own limits" hint="Leave empty to go by the label alone. Where the label is stricter, the label holds.">
        <NumberField {...form.bind('windMaxMs')} label="Most wind" />
        <NumberField {...form.bind('windMinMs')} label="Least wind" />
        <NumberField {...form.bind('gustMaxMs')} label="Most gust" />
        <NumberField {...form.bind('inversionMax')} label="Inversion likelihood borne" hint="0 bears none, 1 bears any. Where the label forbids inversions, 0.5 is taken." />
        <NumberField {...form.bind('rainFreeHours')} label="Hours without rain afterwards" unit="h" />
        <NumberField {...form.bind('rainMm')} label="Rain that counts, in an hour" required />
        <NumberField {...form.bind('rainProbabilityPct')} label="Chance of rain that counts" unit="%" required />
        <CheckField {...form.bind('foliageDry')} label="Leaves must be dry" />
        <NumberField {...form.bind('deltaTMinC')} label="Least Delta T" hint="Dry-bulb less wet-bulb temperature: low is damp, high is drying." />
        <NumberField {...form.bind('deltaTMaxC')} label="Most Delta T" />
        <NumberField {...form.bind('temperatureMinC')} label="Lowest temperature" />
        <NumberField {...form.bind('temperatureMaxC')} label="Highest temperature" />
      </MoreFields>
      <Fields>
        <NotesField {...form.bind('notes')} label="Notes" />
      </Fields>
    </RecordForm>
  );
}
