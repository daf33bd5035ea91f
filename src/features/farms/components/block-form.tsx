import type { z } from 'zod';
import { blockBody, type Block } from '../../../../shared/api/farms.ts';
import { NotesField, NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import type { FormPart } from '../../../lib/forms/form-part.ts';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';

type Body = z.infer<typeof blockBody>;
const numbers = { areaHa: 'area', trees: 'plain', rows: 'plain' } as const;
const empty: Body = { name: '', crop: '', species: '', areaHa: Number.NaN, trees: null, rows: null, polygon: null, notes: '' };

export function BlockForm({ stored, save, cancelTo }: FormPart<Block, Body>) {
  const form = useTypedForm<Body>({ schema: blockBody, numbers, stored: stored ?? empty, save });
  return (
    <RecordForm form={form} cancelTo={cancelTo} saveLabel={stored ? 'Save the block' : 'Add the block'}>
      <Fields>
        <TextField {...form.bind('name')} label="Name" hint="What you call it in the field." required />
        <TextField {...form.bind('crop')} label="Crop" hint="Such as apple, Christmas trees, nursery stock." required />
        <TextField {...form.bind('species')} label="Species" hint="The botanical name, if it matters to you." />
        <NumberField {...form.bind('areaHa')} label="Area" hint="The ground you spray, not the whole field." required />
        <NumberField {...form.bind('trees')} label="Trees" />
        <NumberField {...form.bind('rows')} label="Rows" />
        <NotesField {...form.bind('notes')} label="Notes" />
      </Fields>
    </RecordForm>
  );
}
