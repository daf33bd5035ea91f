import { useParams } from 'react-router-dom';
import { RecordEditor } from '../../../components/records/record-editor.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { sprayersApi } from '../api/sprayers.ts';
import { SprayerForm } from '../components/sprayer-form.tsx';

export function NewSprayerPage() {
  const { id: farmId } = useFarm();
  const save = sprayersApi.useSave(farmId, null);
  return (
    <RecordEditor resource="sprayer" title="New sprayer" stored={null} save={save.mutateAsync} after={(item) => paths.sprayers.one(farmId, item.id)} cancelTo={paths.settings(farmId)}>
      {(part) => <SprayerForm {...part} />}
    </RecordEditor>
  );
}

export function EditSprayerPage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const sprayer = sprayersApi.useOne(farmId, id);
  const save = sprayersApi.useSave(farmId, id);
  const here = paths.sprayers.one(farmId, id);
  return (
    <RecordEditor resource="sprayer" title={`Edit ${sprayer.name}`} stored={sprayer} save={save.mutateAsync} after={() => here} cancelTo={here}>
      {(part) => <SprayerForm {...part} />}
    </RecordEditor>
  );
}
