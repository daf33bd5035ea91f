import { useParams } from 'react-router-dom';
import { RecordPage } from '../../../components/records/record-page.tsx';
import { paths } from '../../../lib/paths.ts';
import { quantityText } from '../../../lib/quantities.ts';
import { useFarm, useUnits } from '../../../lib/session/session.ts';
import { blocksApi } from '../api/blocks.ts';

export function BlockPage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const units = useUnits();
  const block = blocksApi.useOne(farmId, id);
  const archive = blocksApi.useArchive(farmId);
  return (
    <RecordPage
      item={block}
      archive={archive}
      resource="block"
      kind="Block"
      editTo={paths.blocks.edit(farmId, id)}
      up={[paths.settings(farmId), 'Farm']}
      facts={[
        ['Crop', block.crop],
        ['Species', block.species],
        ['Area', quantityText(block.areaHa, 'area', units)],
        ['Trees', quantityText(block.trees, 'plain', units)],
        ['Rows', quantityText(block.rows, 'plain', units)],
        ['Notes', block.notes],
      ]}
    />
  );
}
