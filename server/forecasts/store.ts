import { randomUUID } from 'node:crypto';
import { Op, type Transaction } from 'sequelize';
import type { Models } from '../models/index.ts';
import type { ForecastRow } from '../models/weather.ts';
import type { IssuedForecast } from './provider.ts';

/** Hours after which a forecast that no provider has confirmed is too old to say go. */
export const staleAfterHours = 6;
/** Minutes between two questions to a provider on behalf of one farm. */
const refreshMinutes = 55;

/** When a stored forecast stops being fresh enough for a go. */
export const freshUntil = (forecast: Pick<ForecastRow, 'checkedAt'>): Date => new Date(forecast.checkedAt.getTime() + staleAfterHours * 3_600_000);

/** Whether the provider should be asked again: an hour has passed and its own expiry, if told, too. */
export function refreshDue(forecast: ForecastRow | null, now: Date): boolean {
  if (!forecast) return true;
  const sinceMinutes = (now.getTime() - forecast.checkedAt.getTime()) / 60_000;
  if (sinceMinutes < 0 || sinceMinutes >= 3 * refreshMinutes) return true;
  return sinceMinutes >= refreshMinutes && (forecast.expiresAt === null || forecast.expiresAt <= now);
}

/** The middle of a provider's grid cell may lie this far from the farm, degrees; a farm that moved farther needs another forecast. */
const sameCellDeg = 0.35;

/** The farm's newest stored issue for where it lies now, whatever its provider. */
export async function newestForecast(models: Models, farm: { id: string; latitude: number; longitude: number }, transaction: Transaction | null = null): Promise<ForecastRow | null> {
  const near = (middle: number) => ({ [Op.between]: [middle - sameCellDeg, middle + sameCellDeg] });
  const where = { farmId: farm.id, placeLatitude: near(farm.latitude), placeLongitude: near(farm.longitude) };
  const row = await models.forecasts.findOne({ where, order: [['fetchedAt', 'DESC'], ['id', 'DESC']], transaction });
  return row ? row.get({ plain: true }) : null;
}

/** Adds an issue as issued; earlier ones stay for later verification. */
export async function storeForecast(
  models: Models,
  farmId: string,
  forecast: Omit<IssuedForecast, 'provider'> & { provider: ForecastRow['provider'] },
  standInBecause: string | null,
  transaction: Transaction,
): Promise<ForecastRow> {
  const row: ForecastRow = {
    id: randomUUID(),
    farmId,
    provider: forecast.provider,
    model: forecast.model,
    issuedAt: forecast.issuedAt,
    fetchedAt: forecast.fetchedAt,
    expiresAt: forecast.expiresAt,
    checkedAt: forecast.fetchedAt,
    placeLatitude: forecast.place.latitude,
    placeLongitude: forecast.place.longitude,
    placeElevationM: forecast.place.elevationM,
    etag: forecast.validators.etag,
    lastModified: forecast.validators.lastModified,
    standInBecause: standInBecause?.slice(0, 300) ?? null,
    hours: forecast.hours,
    createdAt: forecast.fetchedAt,
  };
  await models.forecasts.create(row, { transaction });
  return row;
}

/** Notes that the provider had nothing newer: the issue stands confirmed. */
export async function confirmForecast(models: Models, forecast: ForecastRow, now: Date, expiresAt: Date | null, transaction: Transaction): Promise<ForecastRow> {
  const confirmed = { ...forecast, checkedAt: now, expiresAt };
  await models.forecasts.update({ checkedAt: now, expiresAt }, { where: { id: forecast.id }, transaction });
  return confirmed;
}
