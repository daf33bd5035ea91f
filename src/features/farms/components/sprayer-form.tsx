import type { z } from 'zod';
import { sprayerBody, type Sprayer } from '../../../../shared/api/farms.ts';
import { ChoiceField, NotesField, NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { choices } from '../../../lib/forms/choices.ts';
import type { FormPart } from '../../../lib/forms/form-part.ts';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { dropletWords, sprayerTypeWords } from '../words.ts';

type Body = z.infer<typeof sprayerBody>;
const numbers = { tankL: 'volume', minutesPerTank: 'plain', changeOverMinutes: 'plain' } as const;
const empty: Body = { name: '', type: 'backpackMistBlower', tankL: Number.NaN, dropletClass: 'fine', minutesPerTank: Number.NaN, changeOverMinutes: Number.NaN, notes: '' };

export function SprayerForm({ stored, save, cancelTo }: FormPart<Sprayer, Body>) {
  const form = useTypedForm<Body>({ schema: sprayerBody, numbers, stored: stored ?? empty, save });
  return (
    <RecordForm form={form} cancelTo={cancelTo} saveLabel={stored ? 'Save the sprayer' : 'Add the sprayer'}>
      <Fields legend="The sprayer">
        <TextField {...form.bind('name')} label="Name" required />
        <ChoiceField {...form.bind('type')} label="Type" choices={choices(sprayerTypeWords)} />
        <NumberField {...form.bind('tankL')} label="Tank" required />
        <ChoiceField {...form.bind('dropletClass')} label="Droplet size" hint="From the nozzle's or maker's sheet. Finer drops drift farther." choices={choices(dropletWords)} />
      </Fields>
      <Fields legend="How long it takes" hint="Dawnvane counts the minutes a job needs from these.">
        <NumberField {...form.bind('minutesPerTank')} label="Minutes to spray one tank" unit="min" required />
        <NumberField {...form.bind('changeOverMinutes')} label="Minutes between tanks" unit="min" hint="Walk back, refill, mix." required />
        <NotesField {...form.bind('notes')} label="Notes" />
      </Fields>
    </RecordForm>
  );
}
