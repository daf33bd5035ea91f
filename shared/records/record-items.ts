import type { RecordItem } from '../rules/record-rules.ts';
import type { ApplicationRecord, RecordedProduct } from './application-record.ts';

/** What is missing of an item: nothing, the whole of it (`''`), or the part of each named product. */
type Missing = readonly string[];

const whole = (isThere: boolean): Missing => (isThere ? [] : ['']);
const filled = (text: string): boolean => text.trim() !== '';
/** Of no product at all the whole is missing. */
const ofEach = (isThere: (product: RecordedProduct) => boolean) => (record: ApplicationRecord): Missing =>
  record.products.length === 0 ? [''] : record.products.flatMap((product, index) => (isThere(product) ? [] : [filled(product.name) ? product.name : `product ${index + 1}`]));

const hasAmount = ({ amount, amountUnit }: RecordedProduct): boolean => amount !== null && amount > 0 && amountUnit !== null;

/** English name of each item, and what a record lacks of it. */
export const itemTable: Record<RecordItem, { name: string; missing: (record: ApplicationRecord) => Missing }> = {
  productName: { name: 'product name', missing: ofEach(({ name }) => filled(name)) },
  registrationNumber: { name: 'registration number', missing: ofEach(({ registrationNumber }) => filled(registrationNumber)) },
  activeIngredients: { name: 'active ingredients', missing: ofEach(({ activeIngredients }) => filled(activeIngredients)) },
  amount: { name: 'total amount of product', missing: ofEach(hasAmount) },
  rate: { name: 'rate', missing: ofEach(({ rate, rateUnit }) => rate !== null && rate > 0 && rateUnit !== null) },
  /** Amount over spray volume says the concentration. */
  concentration: { name: 'concentration', missing: (record) => (record.sprayVolumeL === null ? [''] : ofEach(hasAmount)(record)) },
  sprayVolume: { name: 'total spray volume', missing: ({ sprayVolumeL }) => whole(sprayVolumeL !== null) },
  location: { name: 'location', missing: ({ location }) => whole(filled(location)) },
  geodata: { name: 'position of the treated area', missing: ({ position }) => whole(position !== null) },
  map: { name: 'map of the treated area', missing: ({ hasMap }) => whole(hasMap) },
  area: { name: 'size of the treated area', missing: ({ areaHa }) => whole(areaHa !== null) },
  crop: { name: 'crop or site', missing: ({ crop }) => whole(filled(crop)) },
  eppoCode: { name: 'EPPO code of the crop', missing: ({ cropEppoCode }) => whole(filled(cropEppoCode)) },
  bbch: { name: 'growth stage (BBCH)', missing: ({ bbch }) => whole(bbch !== null) },
  target: { name: 'target', missing: ({ target }) => whole(filled(target)) },
  date: { name: 'date', missing: ({ date }) => whole(date !== null) },
  startTime: { name: 'start time', missing: ({ startedAt }) => whole(startedAt !== null) },
  stopTime: { name: 'stop time', missing: ({ stoppedAt }) => whole(stoppedAt !== null) },
  applicatorName: { name: 'name of the applicator', missing: ({ applicator }) => whole(filled(applicator.name)) },
  licenceNumber: { name: 'certification or licence number of the applicator', missing: ({ applicator }) => whole(filled(applicator.licenceNumber)) },
  uncertifiedApplicator: { name: 'name of whoever sprayed under the certified applicator', missing: ({ uncertifiedApplicator }) => whole(filled(uncertifiedApplicator)) },
  customer: { name: 'name and address of the customer', missing: ({ customer }) => whole(customer !== null && filled(customer.name) && filled(customer.address)) },
  permitNumber: { name: 'permit number', missing: ({ permitNumber }) => whole(filled(permitNumber)) },
  windDirection: { name: 'wind direction', missing: ({ windFromDeg }) => whole(windFromDeg !== null) },
  windSpeed: { name: 'wind speed', missing: ({ windMs }) => whole(windMs !== null) },
  temperature: { name: 'air temperature', missing: ({ temperatureC }) => whole(temperatureC !== null) },
  equipment: { name: 'equipment or method', missing: ({ equipment }) => whole(filled(equipment)) },
  restrictedEntryInterval: { name: 'restricted-entry interval', missing: ofEach(({ reiHours }) => reiHours !== null) },
  safetyDataSheet: { name: 'safety data sheets', missing: ({ hasSafetyDataSheets }) => whole(hasSafetyDataSheets) },
};
