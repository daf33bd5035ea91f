import type { z } from 'zod';
import { sprayerBody, type Sprayer } from '../../../../shared/api/farms.ts';
import { NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { sprayersApi } from '../../farms/api/sprayers.ts';

type Body = z.infer<typeof sprayerBody>;

const numbers = { tankL: 'volume', minutesPerTank: 'plain', changeOverMinutes: 'plain' } as const;
const stored: Body = { name: 'Backpack mist blower', type: 'backpackMistBlower', tankL: Number.NaN, dropletClass: 'fine', minutesPerTank: Number.NaN, changeOverMinutes: Number.NaN, notes: '' };

export function SprayerStep({ farmId, done }: { farmId: string; done: (sprayer: Sprayer) => void }) {
  const save = sprayersApi.useSave(farmId, null);
  const form = useTypedForm<Body>({ schema: sprayerBody, numbers, stored, save: async (body) => done(await save.mutateAsync({ body, version: undefined })) });
  return (
    <RecordForm form={form} saveLabel="Go on">
      <Fields legend="Your sprayer" hint="Guess the minutes for now; they tell how long a job needs.">
        <TextField {...form.bind('name')} label="Name" required />
        <NumberField {...form.bind('tankL')} label="Tank" required />
        <NumberField {...form.bind('minutesPerTank')} label="Minutes to spray one tank" unit="min" required />
        <NumberField {...form.bind('changeOverMinutes')} label="Minutes between tanks" unit="min" required />
      </Fields>
    </RecordForm>
  );
}
