import { useParams } from 'react-router-dom';
import { RecordEditor } from '../../../components/records/record-editor.tsx';
import { paths } from '../../../lib/paths.ts';
import { useFarm } from '../../../lib/session/session.ts';
import { placesApi } from '../api/places.ts';
import { PlaceForm } from '../components/place-form.tsx';

export function NewPlacePage() {
  const { id: farmId } = useFarm();
  const save = placesApi.useSave(farmId, null);
  return (
    <RecordEditor resource="sensitivePlace" title="New place" stored={null} save={save.mutateAsync} after={(item) => paths.places.one(farmId, item.id)} cancelTo={paths.settings(farmId)}>
      {(part) => <PlaceForm {...part} />}
    </RecordEditor>
  );
}

export function EditPlacePage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const place = placesApi.useOne(farmId, id);
  const save = placesApi.useSave(farmId, id);
  const here = paths.places.one(farmId, id);
  return (
    <RecordEditor resource="sensitivePlace" title={`Edit ${place.name}`} stored={place} save={save.mutateAsync} after={() => here} cancelTo={here}>
      {(part) => <PlaceForm {...part} />}
    </RecordEditor>
  );
}
