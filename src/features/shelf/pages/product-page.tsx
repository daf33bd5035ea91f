import { useParams } from 'react-router-dom';
import { Panel } from '../../../components/index.ts';
import { Facts } from '../../../components/records/facts.tsx';
import { RecordPage } from '../../../components/records/record-page.tsx';
import { paths } from '../../../lib/paths.ts';
import { quantityText, rangeText, type Quantity } from '../../../lib/quantities.ts';
import { rateUnitWords } from '../../../lib/rate-words.ts';
import { useFarm, useMay, useUnits } from '../../../lib/session/session.ts';
import { productsApi } from '../api/products.ts';
import { LabelFile } from '../components/label-file.tsx';
import { beeStatementWords, moaOf, rateRange } from '../words.ts';

export function ProductPage() {
  const { id: farmId } = useFarm();
  const { id = '' } = useParams();
  const may = useMay();
  const units = useUnits();
  const product = productsApi.useOne(farmId, id);
  const archive = productsApi.useArchive(farmId);
  const q = (value: number | null, quantity: Quantity) => quantityText(value, quantity, units);
  const range = (low: number | null, high: number | null, quantity: Quantity) => rangeText(low, high, quantity, units);

  return (
    <RecordPage
      item={product}
      archive={archive}
      resource="product"
      kind={product.isExample ? 'Example product: invented, replace it by the label in hand' : 'Product'}
      editTo={paths.shelf.edit(farmId, id)}
      up={[paths.shelf.list(farmId), 'Shelf']}
      facts={[
        ['EPA registration number', product.epaRegistrationNumber],
        ['Active ingredients', product.activeIngredients],
        ['Mode of action', moaOf(product)],
        ['Rate', rateRange(product)],
        ['Carrier volume', range(product.carrierMinLHa, product.carrierMaxLHa, 'carrier')],
        ['Adjuvant wanted', product.adjuvantWanted],
        ['Adjuvant forbidden', product.adjuvantForbidden],
        ['Use', product.restrictedUse ? 'Restricted use: certified applicators only' : ''],
        ['Notes', product.notes],
      ]}
    >
      <Panel title="Weather">
        <Facts
          facts={[
            ['Wind', range(product.windMinMs, product.windMaxMs, 'speed')],
            ['Meant at a height of', q(product.windHeightM, 'height')],
            ['Gusts', range(null, product.gustMaxMs, 'speed')],
            ['Inversion', product.inversionProhibited ? 'Not in a temperature inversion' : 'Not mentioned'],
            ['Without rain afterwards', product.rainFreeHours === null ? '' : `${product.rainFreeHours} h`],
            ['Temperature', range(product.temperatureMinC, product.temperatureMaxC, 'temperature')],
            ['Bees', beeStatementWords[product.beeStatement]],
          ]}
        />
      </Panel>
      <Panel title="Afterwards">
        <Facts
          facts={[
            ['Restricted-entry interval (REI)', product.reiHours === null ? '' : `${product.reiHours} h`],
            ['Pre-harvest interval (PHI)', product.phiDays === null ? '' : `${product.phiDays} days`],
            ['Most applications in a season', q(product.maxApplicationsPerSeason, 'plain')],
            ['Most product in a season', product.maxRatePerSeason === null ? '' : `${product.maxRatePerSeason} ${rateUnitWords[product.rateUnit]}`],
            ['Between applications', product.minIntervalDays === null ? '' : `at least ${product.minIntervalDays} days`],
          ]}
        />
      </Panel>
      <Panel title="Label file">
        <LabelFile product={product} mayChange={may('update', 'product')} />
      </Panel>
    </RecordPage>
  );
}
