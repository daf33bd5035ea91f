import type { z } from 'zod';
import { farmBody, type Farm } from '../../../../shared/api/farms.ts';
import { UseMyPlace } from '../../../components/use-my-place.tsx';
import { NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { useMe } from '../../../lib/session/session.ts';
import { useCreateFarm } from '../../farms/api/farm.ts';

type Body = z.infer<typeof farmBody>;

const numbers = { latitude: 'position', longitude: 'position', elevationM: 'height', dawnLeadMinutes: 'plain' } as const;

export function FarmStep({ done }: { done: (farm: Farm) => void }) {
  const me = useMe();
  const create = useCreateFarm();
  const stored: Body = { name: '', latitude: Number.NaN, longitude: Number.NaN, elevationM: Number.NaN, exposure: 'open', units: me.units, eveTime: '20:00', dawnLeadMinutes: 30 };
  const form = useTypedForm<Body>({ schema: farmBody, numbers, stored, save: async (body) => done(await create.mutateAsync(body)) });
  return (
    <RecordForm form={form} saveLabel="Go on">
      <Fields hint="The forecast, the sun and the time zone follow from the position.">
        <TextField {...form.bind('name')} label="Name of the farm" required />
        <UseMyPlace take={form.fill} />
        <NumberField {...form.bind('latitude')} label="Latitude" hint="North is above 0." required />
        <NumberField {...form.bind('longitude')} label="Longitude" hint="West is below 0, with a minus sign." required />
        <NumberField {...form.bind('elevationM')} label="Elevation" hint="About is good enough." required />
      </Fields>
    </RecordForm>
  );
}
