import { useParams } from 'react-router-dom';
import { RecordEditor } from '../../../components/records/record-editor.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { blocksApi } from '../api/blocks.ts';
import { BlockForm } from '../components/block-form.tsx';

export function NewBlockPage() {
  const { id: farmId } = useFarm();
  const save = blocksApi.useSave(farmId, null);
  return (
    <RecordEditor resource="block" title="New block" stored={null} save={save.mutateAsync} after={(item) => paths.blocks.one(farmId, item.id)} cancelTo={paths.settings(farmId)}>
      {(part) => <BlockForm {...part} />}
    </RecordEditor>
  );
}

export function EditBlockPage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const block = blocksApi.useOne(farmId, id);
  const save = blocksApi.useSave(farmId, id);
  const here = paths.blocks.one(farmId, id);
  return (
    <RecordEditor resource="block" title={`Edit ${block.name}`} stored={block} save={save.mutateAsync} after={() => here} cancelTo={here}>
      {(part) => <BlockForm {...part} />}
    </RecordEditor>
  );
}
