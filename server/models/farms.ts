import type { Sequelize } from 'sequelize';
import type { Block, Farm, SensitivePlace, Sprayer } from '../../shared/api/farms.ts';
import type { Plan, Product } from '../../shared/api/plans.ts';
import { day, flag, instant, instantOrNull, integer, integerOrNull, jsonColumn, key, number, numberOrNull, reference, referenceOrNull, table, text } from './table.ts';

/** The API's shape with its instants as dates, as the database keeps them. */
type Stamps = 'createdAt' | 'updatedAt' | 'archivedAt';
type Stored<T> = Omit<T, Stamps> & { createdAt: Date; updatedAt: Date; archivedAt: Date | null; /** Who changed it last; null when that person is gone. */ updatedBy: string | null };

export type FarmRow = Stored<Farm>;
export type BlockRow = Stored<Block>;
export type SensitivePlaceRow = Stored<SensitivePlace>;
export type SprayerRow = Stored<Sprayer>;
export type ProductRow = Omit<Stored<Product>, 'labelFile'>;
export type PlanRow = Omit<Stored<Plan>, 'blockIds' | 'products' | 'areaHa' | 'tanks' | 'minutesNeeded'>;
export interface PlanBlockRow {
  planId: string;
  blockId: string;
  position: number;
}
export interface PlanProductRow {
  planId: string;
  productId: string;
  position: number;
  rate: number;
}
export interface LabelFileRow {
  productId: string;
  fileName: string;
  storageKey: string;
  bytes: number;
  sha256: string;
  uploadedAt: Date;
}

const stamps = () => ({ version: integer(), archivedAt: instantOrNull(), createdAt: instant(), updatedAt: instant(), updatedBy: referenceOrNull() });
const kept = () => ({ id: key(), farmId: reference(), ...stamps() });

export const farmTables = (sequelize: Sequelize) => ({
  farms: table<FarmRow>(sequelize, 'farms', {
    id: key(), ...stamps(), name: text(120), latitude: number(), longitude: number(), elevationM: number(), exposure: text(20), timeZone: text(64), units: text(10), eveTime: text(5), dawnLeadMinutes: integer(),
  }),
  blocks: table<BlockRow>(sequelize, 'blocks', {
    ...kept(), name: text(120), crop: text(120), species: text(120), areaHa: number(), trees: integerOrNull(), rows: integerOrNull(), polygon: jsonColumn('polygon'), notes: text(4000),
  }),
  sensitivePlaces: table<SensitivePlaceRow>(sequelize, 'sensitive_places', {
    ...kept(), name: text(120), kind: text(10), bearingDeg: number(), distanceM: number(), polygon: jsonColumn('polygon'), contactName: text(120), contactEmail: text(254), notes: text(4000),
  }),
  sprayers: table<SprayerRow>(sequelize, 'sprayers', {
    ...kept(), name: text(120), type: text(30), tankL: number(), dropletClass: text(12), minutesPerTank: number(), changeOverMinutes: number(), notes: text(4000),
  }),
  products: table<ProductRow>(sequelize, 'products', {
    ...kept(), name: text(120), epaRegistrationNumber: text(40), activeIngredients: text(400), moaSystem: text(5), moaGroup: text(20), rateMin: number(), rateMax: number(), rateUnit: text(12),
    carrierMinLHa: { ...numberOrNull(), field: 'carrier_min_l_ha' }, carrierMaxLHa: { ...numberOrNull(), field: 'carrier_max_l_ha' }, adjuvantWanted: text(200), adjuvantForbidden: text(200),
    windMaxMs: numberOrNull(), windMinMs: numberOrNull(), windHeightM: number(), gustMaxMs: numberOrNull(), inversionProhibited: flag(), rainFreeHours: numberOrNull(), temperatureMinC: numberOrNull(), temperatureMaxC: numberOrNull(),
    beeStatement: text(20), reiHours: numberOrNull(), phiDays: numberOrNull(), maxApplicationsPerSeason: integerOrNull(), maxRatePerSeason: numberOrNull(), minIntervalDays: numberOrNull(), restrictedUse: flag(), isExample: flag(), notes: text(4000),
  }),
  labelFiles: table<LabelFileRow>(sequelize, 'label_files', { productId: key(), fileName: text(200), storageKey: text(200), bytes: integer(), sha256: text(64), uploadedAt: instant() }),
  plans: table<PlanRow>(sequelize, 'plans', {
    ...kept(), name: text(120), target: text(120), sprayerId: reference(), carrierLHa: { ...number(), field: 'carrier_l_ha' }, firstDate: day(), lastDate: day(), reserveMinutes: integer(), state: text(10), bloom: flag(), beeKinds: jsonColumn('beeKinds'),
    windMaxMs: numberOrNull(), windMinMs: numberOrNull(), gustMaxMs: numberOrNull(), inversionMax: numberOrNull(), rainFreeHours: numberOrNull(), rainMm: number(), rainProbabilityPct: number(), foliageDry: flag(),
    deltaTMinC: { ...numberOrNull(), field: 'delta_t_min_c' }, deltaTMaxC: { ...numberOrNull(), field: 'delta_t_max_c' }, temperatureMinC: numberOrNull(), temperatureMaxC: numberOrNull(), notes: text(4000),
  }),
  planBlocks: table<PlanBlockRow>(sequelize, 'plan_blocks', { planId: key(), blockId: key(), position: integer() }),
  planProducts: table<PlanProductRow>(sequelize, 'plan_products', { planId: key(), productId: key(), position: integer(), rate: number() }),
});
