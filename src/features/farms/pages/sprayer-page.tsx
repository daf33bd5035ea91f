import { useParams } from 'react-router-dom';
import { RecordPage } from '../../../components/records/record-page.tsx';
import { paths } from '../../../lib/paths.ts';
import { quantityText } from '../../../lib/quantities.ts';
import { useFarm, useUnits } from '../../../lib/session/session.ts';
import { sprayersApi } from '../api/sprayers.ts';
import { dropletWords, sprayerTypeWords } from '../words.ts';

export function SprayerPage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const units = useUnits();
  const sprayer = sprayersApi.useOne(farmId, id);
  const archive = sprayersApi.useArchive(farmId);
  return (
    <RecordPage
      item={sprayer}
      archive={archive}
      resource="sprayer"
      kind={sprayerTypeWords[sprayer.type]}
      editTo={paths.sprayers.edit(farmId, id)}
      up={[paths.settings(farmId), 'Farm']}
      facts={[
        ['Tank', quantityText(sprayer.tankL, 'volume', units)],
        ['Droplet size', dropletWords[sprayer.dropletClass]],
        ['One tank takes', `${sprayer.minutesPerTank} min`],
        ['Between tanks', `${sprayer.changeOverMinutes} min`],
        ['Notes', sprayer.notes],
      ]}
    />
  );
}
