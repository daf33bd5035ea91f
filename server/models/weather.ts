import type { Sequelize } from 'sequelize';
import type { PlanVerdict } from '../../shared/api/mornings.ts';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { day, flag, instant, instantOrNull, integer, jsonColumn, key, number, numberOrNull, reference, referenceOrNull, table, text, textOrNull } from './table.ts';

export interface ForecastRow {
  id: string;
  farmId: string;
  provider: 'openMeteo' | 'nws' | 'metNorway' | 'webhook';
  model: string | null;
  issuedAt: Date | null;
  fetchedAt: Date;
  expiresAt: Date | null;
  checkedAt: Date;
  placeLatitude: number;
  placeLongitude: number;
  placeElevationM: number | null;
  etag: string | null;
  lastModified: string | null;
  standInBecause: string | null;
  hours: ForecastHour[];
  createdAt: Date;
}
export interface ReadingRow {
  id: string;
  farmId: string;
  source: string;
  takenBy: string | null;
  takenAt: Date;
  windMs: number | null;
  windHeightM: number;
  windFromDeg: number | null;
  temperatureC: number | null;
  relativeHumidityPct: number | null;
  hangTest: 'mixed' | 'hung' | 'blew' | null;
  note: string;
  createdAt: Date;
}
export interface VerdictRow {
  id: string;
  farmId: string;
  planId: string | null;
  /** The plan's id, or `usual` for the farm's usual limits: a unique key may not hold null. */
  planKey: string;
  /** Local date. */
  morning: string;
  revision: number;
  verdict: 'go' | 'hold';
  enoughToTell: boolean;
  bindingLimit: string | null;
  forecastId: string | null;
  summary: PlanVerdict;
  decidedAt: Date;
}
export interface DaybreakRow {
  farmId: string;
  forecastId: string | null;
  /** JSON text, sent as it is. */
  body: string;
  assessedAt: Date;
  validUntil: Date;
}

export const weatherTables = (sequelize: Sequelize) => ({
  forecasts: table<ForecastRow>(sequelize, 'forecasts', {
    id: key(), farmId: reference(), provider: text(12), model: textOrNull(120), issuedAt: instantOrNull(), fetchedAt: instant(), expiresAt: instantOrNull(), checkedAt: instant(), placeLatitude: number(), placeLongitude: number(),
    placeElevationM: numberOrNull(), etag: textOrNull(300), lastModified: textOrNull(80), standInBecause: textOrNull(300), hours: jsonColumn('hours'), createdAt: instant(),
  }),
  readings: table<ReadingRow>(sequelize, 'readings', {
    id: key(), farmId: reference(), source: text(60), takenBy: referenceOrNull(), takenAt: instant(), windMs: numberOrNull(), windHeightM: number(), windFromDeg: numberOrNull(), temperatureC: numberOrNull(),
    relativeHumidityPct: numberOrNull(), hangTest: textOrNull(10), note: text(500), createdAt: instant(),
  }),
  verdicts: table<VerdictRow>(sequelize, 'verdicts', {
    id: key(), farmId: reference(), planId: referenceOrNull(), planKey: text(36), morning: day(), revision: integer(), verdict: text(4), enoughToTell: flag(), bindingLimit: textOrNull(40), forecastId: referenceOrNull(),
    summary: jsonColumn('summary'), decidedAt: instant(),
  }),
  daybreaks: table<DaybreakRow>(sequelize, 'daybreaks', { farmId: key(), forecastId: referenceOrNull(), body: text(), assessedAt: instant(), validUntil: instant() }),
});
