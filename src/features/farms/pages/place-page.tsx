import { useParams } from 'react-router-dom';
import { RecordPage } from '../../../components/records/record-page.tsx';
import { paths } from '../../../lib/paths.ts';
import { quantityText } from '../../../lib/quantities.ts';
import { useFarm, useUnits } from '../../../lib/session/session.ts';
import { placesApi } from '../api/places.ts';
import { bearingWord, placeKindWords } from '../words.ts';

export function PlacePage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const units = useUnits();
  const place = placesApi.useOne(farmId, id);
  const archive = placesApi.useArchive(farmId);
  return (
    <RecordPage
      item={place}
      archive={archive}
      resource="sensitivePlace"
      kind={placeKindWords[place.kind]}
      editTo={paths.places.edit(farmId, id)}
      up={[paths.settings(farmId), 'Farm']}
      facts={[
        ['Bearing from the farm', `${Math.round(place.bearingDeg)}°, ${bearingWord(place.bearingDeg)}`],
        ['Distance', quantityText(place.distanceM, 'distance', units)],
        ['Who to tell', [place.contactName, place.contactEmail].filter(Boolean).join('\n')],
        ['Notes', place.notes],
      ]}
    />
  );
}
