import { useState } from 'react';
import { z } from 'zod';
import { ApiProblem } from '../../../src/lib/api/problem.ts';
import { CheckField, CheckGroup, ChoiceField, NotesField, NumberField, TextField } from '../../../src/lib/forms/fields.tsx';
import { FileField } from '../../../src/lib/forms/file-field.tsx';
import { Fields, RecordForm } from '../../../src/lib/forms/record-form.tsx';
import { useTypedForm } from '../../../src/lib/forms/use-typed-form.ts';

const schema = z.object({
  name: z.string().trim().min(1, 'must not be empty'),
  areaHa: z.number().positive('must be more than 0'),
  crop: z.enum(['apple', 'pear']),
  bees: z.array(z.string()).min(1, 'choose at least one'),
  bloom: z.boolean(),
  firstDate: z.iso.date('must be a date'),
  eveTime: z.string().regex(/^\d\d:\d\d$/, 'must be a time'),
  notes: z.string().max(40, 'must have at most 40 characters'),
});
type Body = z.infer<typeof schema>;
const stored: Body = { name: '', areaHa: Number.NaN, crop: 'apple', bees: [], bloom: false, firstDate: '2026-06-10', eveTime: '20:00', notes: '' };

/** A form with every kind of field; the name "Taken" is refused by the far end. */
export function FormsPart() {
  const [sent, setSent] = useState('');
  const [file, setFile] = useState('');
  const form = useTypedForm<Body>({
    schema,
    numbers: { areaHa: 'area' },
    stored,
    save: async (body) => {
      if (body.name === 'Taken') throw new ApiProblem({ status: 422, title: 'Not kept', detail: 'Some entries need another look.', problems: [{ path: 'name', message: 'must differ from the names in use' }, { path: 'areaHa', message: 'must be at most 1000 ha' }] });
      setSent(JSON.stringify(body));
    },
  });
  return (
    <RecordForm form={form} saveLabel="Add the block" cancelTo="/">
      <Fields legend="Block" hint="Enough to judge a morning.">
        <TextField {...form.bind('name')} label="Name" hint="As you call it." required />
        <NumberField {...form.bind('areaHa')} label="Area" required />
        <ChoiceField {...form.bind('crop')} label="Crop" choices={[['apple', 'Apple'], ['pear', 'Pear']]} />
        <TextField {...form.bind('firstDate')} label="First day" type="date" required />
        <TextField {...form.bind('eveTime')} label="Told in the evening at" type="time" required />
        <CheckField {...form.bind('bloom')} label="Something is in bloom" hint="Clover under the trees counts." />
        <CheckGroup {...form.bind('bees')} label="Bees to look out for" choices={[['honey', 'Honey bees'], ['bumble', 'Bumble bees']]} />
        <NotesField {...form.bind('notes')} label="Notes" />
      </Fields>
      <div className="mb-6">
        <FileField label="The label" hint="PDF, at most 10 MB." accept="application/pdf" problem={file && !file.endsWith('.pdf') ? 'Choose a PDF file; this one is of another kind.' : undefined} onFile={({ name }) => setFile(name)} />
      </div>
      {sent && <output data-sent>{sent}</output>}
    </RecordForm>
  );
}
