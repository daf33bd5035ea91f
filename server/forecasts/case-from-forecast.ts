import type { z } from 'zod';
import { caseSchema, type AssessmentCase, type ForecastHour } from '../../shared/assessment/case.ts';
import { metHours, metPlace, metSchema } from './adapters/met-norway-answer.ts';
import { gridHours, gridPlace, gridSchema } from './adapters/nws-grid.ts';
import { canonicalHours, openMeteoSchema, placeOf } from './adapters/open-meteo-answer.ts';
import type { Place, ProviderId } from './provider.ts';

/** A case without its hours. */
export type CaseFrame = Omit<z.input<typeof caseSchema>, 'hours'>;

/**
 * Makes an assessment case of a fetched series: the hours as they are, and the rest from the caller.
 * @throws ZodError naming the field, when the two together are no case
 */
export const caseFromForecast = (hours: readonly ForecastHour[], frame: CaseFrame): AssessmentCase => caseSchema.parse({ ...frame, hours });

/**
 * Reads a provider's answer as it came over the wire (at NWS the raw grid), for looking into a stored one.
 * @throws ZodError when it is no answer of that provider
 */
export function readAnswer(provider: ProviderId, body: unknown): { place: Place; hours: ForecastHour[] } {
  if (provider === 'nws') {
    const grid = gridSchema.parse(body);
    return { place: gridPlace(grid, { latitude: 0, longitude: 0, elevationM: null }), hours: gridHours(grid) };
  }
  if (provider === 'metNorway') {
    const answer = metSchema.parse(body);
    return { place: metPlace(answer), hours: metHours(answer) };
  }
  const answer = openMeteoSchema.parse(body);
  return { place: placeOf(answer), hours: canonicalHours(answer) };
}
