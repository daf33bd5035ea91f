import type { z } from 'zod';
import { farmBody, type Farm } from '../../../../shared/api/farms.ts';
import { UseMyPlace } from '../../../components/use-my-place.tsx';
import { ChoiceField, NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { choices } from '../../../lib/forms/choices.ts';
import type { FormPart } from '../../../lib/forms/form-part.ts';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { exposureWords } from '../words.ts';

type Body = z.infer<typeof farmBody>;
const numbers = { latitude: 'position', longitude: 'position', elevationM: 'height', dawnLeadMinutes: 'plain' } as const;

export function FarmForm({ stored, save, cancelTo }: FormPart<Farm, Body> & { stored: Farm }) {
  const form = useTypedForm<Body>({ schema: farmBody, numbers, stored, save });
  return (
    <RecordForm form={form} cancelTo={cancelTo} saveLabel="Save the farm">
      <Fields legend="Where it is" hint="The forecast, the sun and the time zone follow from the position.">
        <TextField {...form.bind('name')} label="Name" required />
        <NumberField {...form.bind('latitude')} label="Latitude" hint="North is above 0." required />
        <NumberField {...form.bind('longitude')} label="Longitude" hint="West is below 0, with a minus sign." required />
        <NumberField {...form.bind('elevationM')} label="Elevation" required />
        <UseMyPlace take={form.fill} />
        <ChoiceField {...form.bind('exposure')} label="How it lies" hint="Valley floors hold cold, still air longer." choices={choices(exposureWords)} />
      </Fields>
      <Fields legend="When to tell you">
        <TextField {...form.bind('eveTime')} label="The night before, at" type="time" hint="Farm time." required />
        <NumberField {...form.bind('dawnLeadMinutes')} label="At dawn, before sunrise by" unit="min" required />
        <ChoiceField
          {...form.bind('units')}
          label="Units of the farm"
          hint="For letters to people without an account. Each member chooses their own."
          choices={[
            ['us', 'US: mph, °F, acres, gallons'],
            ['metric', 'Metric: m/s, °C, hectares, litres'],
          ]}
        />
      </Fields>
    </RecordForm>
  );
}
