import { productBody, productProblems, type Product } from '../../../../shared/api/plans.ts';
import type { z } from 'zod';
import { CheckField, ChoiceField, NotesField, NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { rateUnitWords } from '../../../lib/rate-words.ts';
import type { FormPart } from '../../../lib/forms/form-part.ts';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { choices } from '../../../lib/forms/choices.ts';
import { beeStatementWords, moaSystemWords } from '../words.ts';

type Body = z.infer<typeof productBody>;

const numbers = {
  rateMin: 'plain',
  rateMax: 'plain',
  carrierMinLHa: 'carrier',
  carrierMaxLHa: 'carrier',
  windMaxMs: 'speed',
  windMinMs: 'speed',
  windHeightM: 'height',
  gustMaxMs: 'speed',
  rainFreeHours: 'plain',
  temperatureMinC: 'temperature',
  temperatureMaxC: 'temperature',
  reiHours: 'plain',
  phiDays: 'plain',
  maxApplicationsPerSeason: 'plain',
  maxRatePerSeason: 'plain',
  minIntervalDays: 'plain',
} as const;

const empty: Body = {
  name: '',
  epaRegistrationNumber: '',
  activeIngredients: '',
  moaSystem: 'IRAC',
  moaGroup: '',
  rateMin: Number.NaN,
  rateMax: Number.NaN,
  rateUnit: 'flOzPerAcre',
  carrierMinLHa: null,
  carrierMaxLHa: null,
  adjuvantWanted: '',
  adjuvantForbidden: '',
  windMaxMs: null,
  windMinMs: null,
  windHeightM: 2,
  gustMaxMs: null,
  inversionProhibited: true,
  rainFreeHours: null,
  temperatureMinC: null,
  temperatureMaxC: null,
  beeStatement: 'none',
  reiHours: null,
  phiDays: null,
  maxApplicationsPerSeason: null,
  maxRatePerSeason: null,
  minIntervalDays: null,
  restrictedUse: false,
  notes: '',
};

/** The label's figures, in the order in which labels tend to print them. */
export function ProductForm({ stored, save, cancelTo }: FormPart<Product, Body>) {
  const form = useTypedForm<Body>({ schema: productBody, more: productProblems, numbers, stored: stored ?? empty, save });
  return (
    <RecordForm form={form} cancelTo={cancelTo} saveLabel={stored ? 'Save the product' : 'Put it on the shelf'}>
      <Fields legend="What it is" hint="Copy every figure from the label in your hand. Leave empty what the label does not say.">
        <TextField {...form.bind('name')} label="Trade name" required />
        <TextField {...form.bind('epaRegistrationNumber')} label="EPA registration number" hint="Such as 1234-567." />
        <TextField {...form.bind('activeIngredients')} label="Active ingredients" />
        <ChoiceField {...form.bind('moaSystem')} label="Mode-of-action system" choices={choices(moaSystemWords)} />
        <TextField {...form.bind('moaGroup')} label="Mode-of-action group" hint="The number or letters in the box on the label." />
        <CheckField {...form.bind('restrictedUse')} label="Restricted use" hint="Only a certified applicator, or someone under their supervision." />
      </Fields>
      <Fields legend="Rate and water">
        <NumberField {...form.bind('rateMin')} label="Lowest rate" required />
        <NumberField {...form.bind('rateMax')} label="Highest rate" required />
        <ChoiceField {...form.bind('rateUnit')} label="Rate is in" choices={choices(rateUnitWords)} />
        <NumberField {...form.bind('carrierMinLHa')} label="Least carrier volume" hint="Water or oil per area." />
        <NumberField {...form.bind('carrierMaxLHa')} label="Most carrier volume" />
        <TextField {...form.bind('adjuvantWanted')} label="Adjuvant wanted" />
        <TextField {...form.bind('adjuvantForbidden')} label="Adjuvant forbidden" />
      </Fields>
      <Fields legend="Weather" hint="Where a plan's own limits are looser, these hold.">
        <NumberField {...form.bind('windMaxMs')} label="Most wind" />
        <NumberField {...form.bind('windMinMs')} label="Least wind" hint="Still air at dawn is inversion air." />
        <NumberField {...form.bind('gustMaxMs')} label="Most gust" />
        <NumberField {...form.bind('windHeightM')} label="Height the wind is meant at" hint="Where the label says none, leave the usual." required />
        <CheckField {...form.bind('inversionProhibited')} label="Not in a temperature inversion" />
        <NumberField {...form.bind('rainFreeHours')} label="Hours without rain afterwards" unit="h" />
        <NumberField {...form.bind('temperatureMinC')} label="Lowest temperature" />
        <NumberField {...form.bind('temperatureMaxC')} label="Highest temperature" />
        <ChoiceField {...form.bind('beeStatement')} label="Bees" choices={choices(beeStatementWords)} />
      </Fields>
      <Fields legend="Afterwards">
        <NumberField {...form.bind('reiHours')} label="Restricted-entry interval (REI)" unit="h" />
        <NumberField {...form.bind('phiDays')} label="Pre-harvest interval (PHI)" unit="days" />
        <NumberField {...form.bind('maxApplicationsPerSeason')} label="Most applications in a season" />
        <NumberField {...form.bind('maxRatePerSeason')} label="Most product in a season" hint="In the unit of the rate." />
        <NumberField {...form.bind('minIntervalDays')} label="Least days between applications" unit="days" />
        <NotesField {...form.bind('notes')} label="Notes" />
      </Fields>
    </RecordForm>
  );
}
