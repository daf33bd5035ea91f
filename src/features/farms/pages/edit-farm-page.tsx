import { useSuspenseQuery } from '@tanstack/react-query';
import { RecordEditor } from '../../../components/records/record-editor.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { farmQuery, useUpdateFarm } from '../api/farm.ts';
import { FarmForm } from '../components/farm-form.tsx';

export function EditFarmPage() {
  const { id: farmId } = useFarm();
  const { data: farm } = useSuspenseQuery(farmQuery(farmId));
  const save = useUpdateFarm(farmId);
  const here = paths.settings(farmId);
  return (
    <RecordEditor resource="farm" title="Edit the farm" stored={farm} save={save.mutateAsync} after={() => here} cancelTo={here}>
      {(part) => <FarmForm {...part} stored={farm} />}
    </RecordEditor>
  );
}
