import { caseSchema, type AssessmentCase, type ForecastHour } from '../../shared/assessment/case.ts';
import type { z } from 'zod';

/**
 * Makes an assessment case of a fetched series: the hours as they are, and the rest from the caller.
 * @throws ZodError naming the field, when the two together are no case
 */
export const caseFromForecast = (hours: readonly ForecastHour[], rest: Omit<z.input<typeof caseSchema>, 'hours'>): AssessmentCase => caseSchema.parse({ ...rest, hours });
