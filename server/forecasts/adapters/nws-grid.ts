import { Duration } from 'luxon';
import { z } from 'zod';
import type { ForecastHour } from '../../../shared/assessment/case.ts';
import { hourFields, hourMs, HourTable, longestHours, type HourField } from '../hours.ts';
import type { Place } from '../provider.ts';
import { conversionFrom } from '../units.ts';

/** One layer: `uom` may be absent, values may be null or, in layers that are not read here, objects. */
const layerSchema = z.object({ uom: z.string().nullish(), values: z.array(z.object({ validTime: z.string(), value: z.number().nullable() })) }).optional();

/**
 * Layers of the raw grid and the fields they fill. Every stamp is `start/duration`, so the grid looks FORWARD: a row at
 * 14:00/PT1H describes 14–15, the canonical hour as it is. Levels hold through their interval and are repeated for
 * each hour; `quantitativePrecipitation` is the sum over its interval and is divided. The probability of a block is
 * the chance of rain anywhere in it; repeated, it errs on the cautious side. There is no radiation and no upper air.
 */
const layers = {
  temperature: { field: 'temperature2mC', kind: 'level' },
  dewpoint: { field: 'dewPoint2mC', kind: 'level' },
  relativeHumidity: { field: 'relativeHumidityPct', kind: 'level' },
  windSpeed: { field: 'windSpeed10mMs', kind: 'level' },
  windGust: { field: 'windGust10mMs', kind: 'level' },
  windDirection: { field: 'windFromDeg', kind: 'level' },
  skyCover: { field: 'cloudCoverPct', kind: 'level' },
  quantitativePrecipitation: { field: 'precipitationMm', kind: 'total' },
  probabilityOfPrecipitation: { field: 'precipitationProbabilityPct', kind: 'level' },
} as const satisfies Record<string, { field: HourField; kind: 'level' | 'total' }>;
type LayerName = keyof typeof layers;
const layerNames = Object.keys(layers) as LayerName[];

const layerShape = Object.fromEntries(layerNames.map((layer) => [layer, layerSchema])) as Record<LayerName, typeof layerSchema>;
export const gridSchema = z.object({
  geometry: z.object({ coordinates: z.array(z.array(z.tuple([z.number(), z.number()]).rest(z.number()))) }).nullish(),
  properties: z.object({
    updateTime: z.iso.datetime({ offset: true }),
    elevation: z.object({ unitCode: z.string(), value: z.number().nullable() }).nullish(),
    ...layerShape,
  }),
});
export type GridAnswer = z.infer<typeof gridSchema>;

export const pointSchema = z.object({ properties: z.object({ gridId: z.string().regex(/^[A-Z]{3}$/), gridX: z.coerce.number().int(), gridY: z.coerce.number().int() }) });

/**
 * Reads `2022-02-03T13:00:00+00:00/P1DT4H` (ISO 8601 start and duration).
 * @returns the span in epoch milliseconds, or null when it cannot be read or is empty
 */
export function spanOf(validTime: string): { startMs: number; endMs: number } | null {
  const [start = '', length = ''] = validTime.split('/');
  const startMs = Date.parse(start);
  const lengthMs = Duration.fromISO(length).toMillis();
  return Number.isFinite(startMs) && Number.isFinite(lengthMs) && lengthMs > 0 ? { startMs, endMs: startMs + lengthMs } : null;
}

/** Brings the raw layers to canonical hours. A layer that is absent, empty, or of unknown unit leaves its field null. */
export function gridHours(answer: GridAnswer): ForecastHour[] {
  const table = new HourTable();
  for (const name of layerNames) {
    const layer = answer.properties[name];
    const { field, kind } = layers[name];
    const convert = conversionFrom(hourFields[field].quantity, layer?.uom);
    if (!layer || !convert) continue;
    for (const { validTime, value } of layer.values) {
      const span = spanOf(validTime);
      if (!span) continue;
      const lastMs = Math.min(span.endMs, span.startMs + longestHours * hourMs);
      const share = kind === 'total' ? hourMs / (span.endMs - span.startMs) : 1;
      // Only whole hours inside the interval: half an hour's rain is no hour's.
      for (let startMs = Math.ceil(span.startMs / hourMs) * hourMs; startMs + hourMs <= lastMs; startMs += hourMs) {
        table.put(startMs, field, value === null ? null : convert(value) * share);
      }
    }
  }
  return table.toHours();
}

/** The middle of the grid cell and its elevation; the place asked for where the answer does not tell. */
export function gridPlace(answer: GridAnswer, asked: Place): Place {
  const ring = answer.geometry?.coordinates[0] ?? [];
  // The ring's last corner repeats its first.
  const corners = ring.slice(0, -1);
  const mean = (axis: 0 | 1): number => corners.reduce((sum, corner) => sum + corner[axis], 0) / corners.length;
  const { elevation } = answer.properties;
  const convert = conversionFrom('depthMm', elevation?.unitCode);
  const elevationM = elevation && elevation.value !== null && convert ? convert(elevation.value) / 1000 : null;
  return corners.length === 0 ? { ...asked, elevationM: elevationM ?? asked.elevationM } : { latitude: mean(1), longitude: mean(0), elevationM };
}
