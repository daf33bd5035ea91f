import { useSuspenseQuery } from '@tanstack/react-query';
import { ButtonLink, PageHeading } from '../../../components/index.ts';
import { Facts } from '../../../components/records/facts.tsx';
import { KeptPanel } from '../../../components/records/kept-panel.tsx';
import { QueryPanel } from '../../../components/records/query-panel.tsx';
import { paths } from '../../../lib/paths.ts';
import { quantityText } from '../../../lib/quantities.ts';
import { useFarm, useMay, useUnits } from '../../../lib/session/session.ts';
import { blocksApi } from '../api/blocks.ts';
import { farmQuery } from '../api/farm.ts';
import { placesApi } from '../api/places.ts';
import { sprayersApi } from '../api/sprayers.ts';
import { bearingWord, dropletWords, exposureWords, placeKindWords } from '../words.ts';

/** What the farm is made of: settings, blocks, sensitive places, sprayers. */
export function FarmPage() {
  const { id: farmId, name } = useFarm();
  const may = useMay();
  const units = useUnits();
  return (
    <>
      <PageHeading title={name} over="Farm">
        {may('update', 'farm') && <ButtonLink to={paths.editSettings(farmId)}>Edit the farm</ButtonLink>}
      </PageHeading>
      <KeptPanel
        title="Blocks"
        api={blocksApi}
        createTo={may('create', 'block') ? paths.blocks.create(farmId) : null}
        createLabel="Add a block"
        nothing="No blocks yet. A block is a piece of ground you spray in one go; a plan needs at least one."
        row={(block) => ({ id: block.id, name: block.name, to: paths.blocks.one(farmId, block.id), about: [block.crop, quantityText(block.areaHa, 'area', units), block.trees === null ? '' : `${block.trees} trees`].filter(Boolean).join(' · ') })}
      />
      <KeptPanel
        title="Sensitive places"
        api={placesApi}
        createTo={may('create', 'sensitivePlace') ? paths.places.create(farmId) : null}
        createLabel="Add a place"
        nothing="No sensitive places yet. Add the hives, houses, water and roads around you: wind toward them is held against a morning."
        row={(place) => ({ id: place.id, name: place.name, to: paths.places.one(farmId, place.id), about: `${placeKindWords[place.kind]} · ${quantityText(place.distanceM, 'distance', units)} ${bearingWord(place.bearingDeg)}` })}
      />
      <KeptPanel
        title="Sprayers"
        api={sprayersApi}
        createTo={may('create', 'sprayer') ? paths.sprayers.create(farmId) : null}
        createLabel="Add a sprayer"
        nothing="No sprayers yet. The tank and the minutes it takes tell how long a job needs."
        row={(sprayer) => ({ id: sprayer.id, name: sprayer.name, to: paths.sprayers.one(farmId, sprayer.id), about: `${quantityText(sprayer.tankL, 'volume', units)} tank · ${dropletWords[sprayer.dropletClass].toLowerCase()} droplets · ${sprayer.minutesPerTank} min a tank` })}
      />
      <QueryPanel title="Settings">
        <FarmFacts />
      </QueryPanel>
    </>
  );
}

function FarmFacts() {
  const { id: farmId } = useFarm();
  const units = useUnits();
  const { data: farm } = useSuspenseQuery(farmQuery(farmId));
  return (
    <Facts
      facts={[
        ['Position', `${farm.latitude}°, ${farm.longitude}°`],
        ['Elevation', quantityText(farm.elevationM, 'height', units)],
        ['Time zone', farm.timeZone.replaceAll('_', ' ')],
        ['How it lies', exposureWords[farm.exposure]],
        ['The night before, told at', farm.eveTime],
        ['At dawn, told before sunrise by', `${farm.dawnLeadMinutes} min`],
      ]}
    />
  );
}
