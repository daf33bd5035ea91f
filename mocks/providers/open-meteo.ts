import { DateTime } from 'luxon';
import { http } from 'msw';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import type { FakeTools } from './provider-fakes.ts';
import { inMood, type Answer, type Failures } from './mood.ts';
import { hourMs, newestRunMs, rounded, staleByMs, type Meant } from './skies.ts';

const json = { 'content-type': 'application/json; charset=utf-8' };
const refuse = (status: number, reason: string): Answer => ({ status, headers: json, body: JSON.stringify({ error: true, reason }) });
const failures: Failures = { error500: refuse(500, 'Internal Server Error'), tooMany: refuse(429, 'Minutely API request limit exceeded. Please try again in one minute.') };

/** The two models behind the blend: how often they start, and how long they are on the way. */
const models: Record<string, { intervalH: number; delayMs: number }> = { ncep_hrrr_conus: { intervalH: 1, delayMs: 55 * 60_000 }, ncep_gfs013: { intervalH: 6, delayMs: 290 * 60_000 } };
const ensembleDelayMs = 330 * 60_000;
const memberCount = 30;

type Kind = 'temperature' | 'speed' | 'depth' | 'percent' | 'bearing' | 'irradiance';
/** What the service knows by name, at the stamp or over the hour that ends there. */
const variables: Record<string, { kind: Kind; ending: boolean; of: (hour: ForecastHour) => number | null }> = {
  temperature_2m: { kind: 'temperature', ending: false, of: (hour) => hour.temperature2mC },
  dew_point_2m: { kind: 'temperature', ending: false, of: (hour) => hour.dewPoint2mC },
  temperature_80m: { kind: 'temperature', ending: false, of: (hour) => hour.temperature80mC },
  relative_humidity_2m: { kind: 'percent', ending: false, of: (hour) => hour.relativeHumidityPct },
  cloud_cover: { kind: 'percent', ending: false, of: (hour) => hour.cloudCoverPct },
  wind_speed_10m: { kind: 'speed', ending: false, of: (hour) => hour.windSpeed10mMs },
  wind_direction_10m: { kind: 'bearing', ending: false, of: (hour) => hour.windFromDeg },
  wind_gusts_10m: { kind: 'speed', ending: true, of: (hour) => hour.windGust10mMs },
  precipitation: { kind: 'depth', ending: true, of: (hour) => hour.precipitationMm },
  precipitation_probability: { kind: 'percent', ending: true, of: (hour) => hour.precipitationProbabilityPct },
  shortwave_radiation: { kind: 'irradiance', ending: true, of: (hour) => hour.shortwaveWm2 },
};

interface Units {
  label: string;
  convert: (value: number) => number;
  decimals: number;
}
const speeds: Record<string, Units> = {
  kmh: { label: 'km/h', convert: (ms) => ms * 3.6, decimals: 1 },
  ms: { label: 'm/s', convert: (ms) => ms, decimals: 2 },
  mph: { label: 'mp/h', convert: (ms) => ms / 0.44704, decimals: 1 },
  kn: { label: 'kn', convert: (ms) => (ms * 3600) / 1852, decimals: 1 },
};
const plain = (label: string, decimals: number): Units => ({ label, convert: (value) => value, decimals });

/** The units that a question asks for, or the service's own; null when it knows no such unit. */
function unitsOf(kind: Kind, query: URLSearchParams): Units | null {
  if (kind === 'speed') return speeds[query.get('wind_speed_unit') ?? 'kmh'] ?? null;
  if (kind === 'temperature') return query.get('temperature_unit') === 'fahrenheit' ? { label: '°F', convert: (c) => c * 1.8 + 32, decimals: 1 } : plain('°C', 1);
  if (kind === 'depth') return query.get('precipitation_unit') === 'inch' ? { label: 'inch', convert: (mm) => mm / 25.4, decimals: 3 } : plain('mm', 2);
  if (kind === 'bearing') return plain('°', 0);
  return kind === 'irradiance' ? plain('W/m²', 1) : plain('%', 0);
}

/** Fakes of the forecast, ensemble and model-run calls of Open-Meteo. */
export function openMeteoFake({ clock, skies, moodOf, note, elevationM }: FakeTools) {
  const service = 'openMeteo';
  const seenNowMs = (): number => clock.now().getTime() - (moodOf(service) === 'stale' ? staleByMs : 0);

  /** The span of stamps that a question asks for, whole days of UTC. */
  function spanMs(query: URLSearchParams): { fromMs: number; toMs: number } {
    const todayMs = Math.floor(clock.now().getTime() / (24 * hourMs)) * 24 * hourMs;
    return { fromMs: todayMs - Number(query.get('past_days') ?? 0) * 24 * hourMs, toMs: todayMs + Number(query.get('forecast_days') ?? 7) * 24 * hourMs };
  }

  function meant(query: URLSearchParams, source: string, issuedAtMs: number): Meant {
    const { fromMs, toMs } = spanMs(query);
    const weather = skies.over(Number(query.get('latitude')), Number(query.get('longitude')), Number(query.get('elevation') ?? elevationM));
    return skies.issue(weather, source, issuedAtMs, fromMs - hourMs, toMs);
  }

  function answer(query: URLSearchParams, series: { suffix: string; meant: Meant }[]): Answer {
    const names = (query.get('hourly') ?? '').split(',').filter((name) => name !== '');
    const unknown = names.find((name) => !variables[name]);
    if (unknown) return refuse(400, `Data corrupted at path ''. Cannot initialize variable from invalid String value ${unknown}.`);
    const { fromMs, toMs } = spanMs(query);
    const stamps = Array.from({ length: (toMs - fromMs) / hourMs }, (_, index) => fromMs + index * hourMs);
    const zone = query.get('timezone') ?? 'GMT';
    const offsetS = zone === 'GMT' ? 0 : DateTime.fromMillis(clock.now().getTime(), { zone }).offset * 60;
    const unix = query.get('timeformat') === 'unixtime';
    const units: Record<string, string> = { time: unix ? 'unixtime' : 'iso8601' };
    const hourly: Record<string, (number | string | null)[]> = { time: stamps.map((stamp) => (unix ? stamp / 1000 : new Date(stamp + offsetS * 1000).toISOString().slice(0, 16))) };
    for (const name of names) {
      const { kind, ending, of } = variables[name]!;
      const unit = unitsOf(kind, query);
      if (!unit) return refuse(400, `Data corrupted at path ''. Cannot initialize WindspeedUnit from invalid String value ${query.get('wind_speed_unit')}.`);
      const gone = moodOf(service) === 'missingLayer' && (name === 'wind_gusts_10m' || name === 'temperature_80m');
      for (const { suffix, meant: { hours } } of series) {
        units[`${name}${suffix}`] = unit.label;
        hourly[`${name}${suffix}`] = stamps.map((stamp) => {
          const hour = hours.get(ending ? stamp - hourMs : stamp);
          const value = hour && !gone ? of(hour) : null;
          return value === null ? null : rounded(unit.convert(value), unit.decimals);
        });
      }
    }
    const snapped = (degrees: number): number => Math.fround(Math.round(degrees / 0.0293) * 0.0293);
    return {
      headers: { ...json, date: clock.now().toUTCString() },
      body: JSON.stringify({
        latitude: snapped(Number(query.get('latitude'))),
        longitude: snapped(Number(query.get('longitude'))),
        generationtime_ms: 0.41735172271728516,
        utc_offset_seconds: offsetS,
        timezone: zone,
        timezone_abbreviation: offsetS === 0 ? 'GMT' : `GMT${offsetS > 0 ? '+' : ''}${offsetS / 3600}`,
        elevation: Number(query.get('elevation') ?? elevationM),
        hourly_units: units,
        hourly,
      }),
    };
  }

  const forecastOf = (query: URLSearchParams): Meant => meant(query, service, newestRunMs(seenNowMs(), 1, models.ncep_hrrr_conus!.delayMs));
  const membersOf = (query: URLSearchParams): { suffix: string; meant: Meant }[] =>
    Array.from({ length: memberCount + 1 }, (_, index) => ({ suffix: index === 0 ? '' : `_member${String(index).padStart(2, '0')}`, meant: meant(query, `ensemble/${index}`, newestRunMs(seenNowMs(), 6, ensembleDelayMs)) }));

  const hosts = (name: string): string[] => [`https://${name}.open-meteo.com`, `https://customer-${name}.open-meteo.com`];
  const handlers = [
    ...hosts('api').map((host) =>
      http.get(`${host}/v1/forecast`, ({ request }) => {
        note(service, request);
        const query = new URL(request.url).searchParams;
        return inMood(moodOf(service), failures, () => answer(query, [{ suffix: '', meant: forecastOf(query) }]));
      }),
    ),
    ...hosts('ensemble-api').map((host) =>
      http.get(`${host}/v1/ensemble`, ({ request }) => {
        note(service, request);
        const query = new URL(request.url).searchParams;
        return inMood(moodOf(service), failures, () => answer(query, membersOf(query)));
      }),
    ),
    ...hosts('api').map((host) =>
      http.get(`${host}/data/:model/static/meta.json`, ({ request, params }) => {
        note(service, request);
        const model = models[String(params.model)];
        return inMood(moodOf(service), failures, () => {
          if (!model) return { status: 404, headers: json, body: JSON.stringify({ error: true, reason: 'Not Found' }) };
          const startS = newestRunMs(seenNowMs(), model.intervalH, model.delayMs) / 1000;
          const arrivedS = startS + model.delayMs / 1000;
          return {
            headers: json,
            body: JSON.stringify({ chunk_time_length: 325, crs_wkt: '', data_end_time: startS + 48 * 3600, last_run_availability_time: arrivedS, last_run_initialisation_time: startS, last_run_modification_time: arrivedS - 60, temporal_resolution_seconds: 3600, update_interval_seconds: model.intervalH * 3600 }),
          };
        });
      }),
    ),
  ];
  return { handlers, meant: forecastOf, members: membersOf };
}
