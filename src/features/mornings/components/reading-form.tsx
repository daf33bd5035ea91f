import { useState } from 'react';
import type { z } from 'zod';
import { readingBody } from '../../../../shared/api/mornings.ts';
import { useToast } from '../../../components/index.ts';
import { ChoiceField, NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, MoreFields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { choices } from '../../../lib/forms/choices.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { useAddReading } from '../api/change-readings.ts';
import { hangTestWords } from '../words.ts';

type Body = z.infer<typeof readingBody>;

const numbers = { windMs: 'speed', windHeightM: 'height', windFromDeg: 'plain', temperatureC: 'temperature', relativeHumidityPct: 'plain' } as const;

/** At least one thing must have been measured. */
function emptyProblem({ windMs, temperatureC, relativeHumidityPct, hangTest, windFromDeg }: Body) {
  const nothing = [windMs, temperatureC, relativeHumidityPct, hangTest, windFromDeg].every((value) => value === null);
  return nothing ? [{ path: 'windMs', message: 'Fill in at least one reading.' }] : [];
}

/** A reading on site: it beats any forecast. A fresh form follows each one. */
export function ReadingForm({ now }: { now: string }) {
  const [kept, setKept] = useState(0);
  return <OneReading key={kept} now={now} done={() => setKept(kept + 1)} />;
}

function OneReading({ now, done }: { now: string; done: () => void }) {
  const { id: farmId } = useFarm();
  const add = useAddReading(farmId);
  const toast = useToast();
  const stored: Body = { takenAt: now, windMs: null, windHeightM: 2, windFromDeg: null, temperatureC: null, relativeHumidityPct: null, hangTest: null, note: '' };
  const form = useTypedForm<Body>({
    schema: readingBody,
    more: emptyProblem,
    numbers,
    stored,
    save: async (body) => {
      await add.mutateAsync({ ...body, takenAt: now });
      toast('The reading is kept and counts from now on.');
      done();
    },
  });
  return (
    <RecordForm form={form} saveLabel="Keep the reading">
      <Fields hint="Hold the meter up for a minute and take the mean. Burn a smoke emitter or throw dust up: smoke that hangs in a layer is an inversion.">
        <NumberField {...form.bind('windMs')} label="Wind" />
        <NumberField {...form.bind('windFromDeg')} label="Wind from" unit="°" hint="0 is north, 90 east." />
        <ChoiceField {...form.bind('hangTest', { emptyIsNull: true })} label="What smoke or dust did" choices={[['', 'Not tried'], ...choices(hangTestWords)]} />
      </Fields>
      <MoreFields legend="More to enter">
        <NumberField {...form.bind('windHeightM')} label="Height of the wind meter" required />
        <NumberField {...form.bind('temperatureC')} label="Temperature" />
        <NumberField {...form.bind('relativeHumidityPct')} label="Humidity" unit="%" />
        <TextField {...form.bind('note')} label="Note" />
      </MoreFields>
    </RecordForm>
  );
}
