import type { z } from 'zod';
import { blockBody, type Block } from '../../../../shared/api/farms.ts';
import { NumberField, TextField } from '../../../lib/forms/fields.tsx';
import { Fields, RecordForm } from '../../../lib/forms/record-form.tsx';
import { useTypedForm } from '../../../lib/forms/use-typed-form.ts';
import { blocksApi } from '../../farms/api/blocks.ts';

type Body = z.infer<typeof blockBody>;

const numbers = { areaHa: 'area', trees: 'plain', rows: 'plain' } as const;
const stored: Body = { name: '', crop: '', species: '', areaHa: Number.NaN, trees: null, rows: null, polygon: null, notes: '' };

export function BlockStep({ farmId, done }: { farmId: string; done: (block: Block) => void }) {
  const save = blocksApi.useSave(farmId, null);
  const form = useTypedForm<Body>({ schema: blockBody, numbers, stored, save: async (body) => done(await save.mutateAsync({ body, version: undefined })) });
  return (
    <RecordForm form={form} saveLabel="Go on">
      <Fields legend="A first block" hint="A piece of ground that you spray in one go.">
        <TextField {...form.bind('name')} label="What you call it" required />
        <TextField {...form.bind('crop')} label="Crop" required />
        <NumberField {...form.bind('areaHa')} label="Area" required />
      </Fields>
    </RecordForm>
  );
}
