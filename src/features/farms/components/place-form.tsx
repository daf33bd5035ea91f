import type { z } from 'zod';
import { placeBody, type SensitivePlace } from '../../../../shared/api/farms.ts';
import { ChoiceField, NotesField, NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { choices } from '../../../lib/forms/choices.ts';
import type { FormPart } from '../../../lib/forms/form-part.ts';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { placeKindWords } from '../words.ts';

type Body = z.infer<typeof placeBody>;
const numbers = { bearingDeg: 'plain', distanceM: 'distance' } as const;
const empty: Body = { name: '', kind: 'hives', bearingDeg: Number.NaN, distanceM: Number.NaN, polygon: null, contactName: '', contactEmail: '', notes: '' };

export function PlaceForm({ stored, save, cancelTo }: FormPart<SensitivePlace, Body>) {
  const form = useTypedForm<Body>({ schema: placeBody, numbers, stored: stored ?? empty, save });
  return (
    <RecordForm form={form} cancelTo={cancelTo} saveLabel={stored ? 'Save the place' : 'Add the place'}>
      <Fields legend="The place">
        <TextField {...form.bind('name')} label="Name" required />
        <ChoiceField {...form.bind('kind')} label="What it is" choices={choices(placeKindWords)} />
        <NumberField {...form.bind('bearingDeg')} label="Bearing from the farm" unit="°" hint="As a compass reads it: 0 is north, 90 east, 180 south, 270 west." required />
        <NumberField {...form.bind('distanceM')} label="Distance" hint="From the nearest row you spray." required />
      </Fields>
      <Fields legend="Who to tell" hint="A beekeeper or neighbour who wants to know beforehand. Ask them first.">
        <TextField {...form.bind('contactName')} label="Their name" autoComplete="off" />
        <TextField {...form.bind('contactEmail')} label="Their e-mail" type="email" autoComplete="off" />
        <NotesField {...form.bind('notes')} label="Notes" />
      </Fields>
    </RecordForm>
  );
}
