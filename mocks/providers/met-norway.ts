import { http } from 'msw';
import type { ForecastHour } from '../../shared/assessment/case.ts';
import { denied, inMood, saysWhoAsks, send, type Answer, type Failures } from './mood.ts';
import type { FakeTools } from './provider-fakes.ts';
import { hourMs, httpDate, rounded, staleByMs, type Meant } from './skies.ts';

const service = 'metNorway';
const html = { 'content-type': 'text/html; charset=utf-8' };
const failures: Failures = {
  error500: { status: 500, headers: html, body: '<html><body><h1>500 Internal Server Error</h1></body></html>' },
  tooMany: { status: 429, headers: { ...html, 'retry-after': '30' }, body: '<html><body><h1>429 Too Many Requests</h1></body></html>' },
};

const units = {
  air_pressure_at_sea_level: 'hPa',
  air_temperature: 'celsius',
  air_temperature_max: 'celsius',
  air_temperature_min: 'celsius',
  cloud_area_fraction: '%',
  cloud_area_fraction_high: '%',
  cloud_area_fraction_low: '%',
  cloud_area_fraction_medium: '%',
  dew_point_temperature: 'celsius',
  fog_area_fraction: '%',
  precipitation_amount: 'mm',
  relative_humidity: '%',
  ultraviolet_index_clear_sky: '1',
  wind_from_direction: 'degrees',
  wind_speed: 'm/s',
};
const nordicUnits = { ...units, probability_of_precipitation: '%', wind_speed_of_gust: 'm/s' };

/** Where the finer Nordic model adds gusts and probabilities, roughly. */
const isNordic = (latitude: number, longitude: number): boolean => latitude > 54 && latitude < 72 && longitude > 0 && longitude < 32;

function symbol(hours: readonly ForecastHour[]): string {
  const rainMm = hours.reduce((sum, hour) => sum + (hour.precipitationMm ?? 0), 0);
  const cloud = hours.reduce((sum, hour) => sum + (hour.cloudCoverPct ?? 0), 0) / Math.max(1, hours.length);
  if (rainMm >= 0.2 * hours.length) return rainMm > 1.5 * hours.length ? 'heavyrain' : 'rain';
  if (cloud > 85) return 'cloudy';
  const name = cloud > 45 ? 'partlycloudy' : cloud > 12 ? 'fair' : 'clearsky';
  return `${name}_${(hours[0]?.shortwaveWm2 ?? 0) > 0 ? 'day' : 'night'}`;
}

/** Fake of MET Norway's Locationforecast 2.0, complete form. */
export function metNorwayFake({ clock, skies, moodOf, note, elevationM }: FakeTools) {
  const seenNowMs = (): number => clock.now().getTime() - (moodOf(service) === 'stale' ? staleByMs : 0);
  /** A run every six hours, out one and a half hours after its start. */
  const lagMs = 90 * 60_000 + 57_000;
  const runMs = (): number => Math.floor((seenNowMs() - lagMs) / (6 * hourMs)) * 6 * hourMs;

  function meantOver(latitude: number, longitude: number, altitudeM: number): Meant {
    const startMs = runMs();
    return skies.issue(skies.over(latitude, longitude, altitudeM), service, startMs, startMs - 12 * hourMs, startMs + 228 * hourMs);
  }

  function answer(request: Request): Answer {
    const query = new URL(request.url).searchParams;
    const [latitude, longitude, altitudeM] = [Number(query.get('lat')), Number(query.get('lon')), Number(query.get('altitude') ?? elevationM)];
    const { issuedAtMs, hours } = meantOver(latitude, longitude, altitudeM);
    const now = clock.now().getTime();
    // How fresh the HTTP answer is says nothing of the model's age.
    const lastModified = httpDate(issuedAtMs + lagMs + 13 * 60_000);
    const headers = { 'content-type': 'application/json', date: httpDate(now), expires: httpDate(now + 31 * 60_000), 'last-modified': lastModified, 'access-control-allow-origin': '*', vary: 'Accept, Accept-Encoding', via: '1.1 varnish (Varnish/6.2)' };
    if (Date.parse(request.headers.get('if-modified-since') ?? '') >= Date.parse(lastModified)) return { status: 304, headers, body: '' };

    const nordic = isNordic(latitude, longitude);
    const hourlyUntilMs = issuedAtMs + 66 * hourMs;
    const stamps = new Set<number>();
    for (let at = Math.floor(seenNowMs() / hourMs) * hourMs; at <= issuedAtMs + 222 * hourMs; at += at < hourlyUntilMs ? hourMs : 6 * hourMs) stamps.add(at);
    const span = (at: number, length: number): ForecastHour[] => Array.from({ length }, (_, index) => hours.get(at + index * hourMs)).filter((hour) => hour !== undefined);
    const amount = (many: ForecastHour[]): number => rounded(many.reduce((sum, hour) => sum + (hour.precipitationMm ?? 0), 0), 1);
    const chance = (many: ForecastHour[]): Record<string, number> => (nordic ? { probability_of_precipitation: Math.max(...many.map((hour) => hour.precipitationProbabilityPct ?? 0)) } : {});

    const timeseries = [...stamps].map((at) => {
      const hour = hours.get(at);
      if (!hour) throw new Error('The fake was asked for an hour that it did not make.');
      const cloud = hour.cloudCoverPct ?? 0;
      const details = {
        air_pressure_at_sea_level: rounded(1014 + 6 * Math.sin(at / (40 * hourMs)), 1),
        air_temperature: hour.temperature2mC,
        ...(moodOf(service) === 'missingLayer' ? {} : { cloud_area_fraction: cloud }),
        cloud_area_fraction_high: rounded(cloud * 0.2, 1),
        cloud_area_fraction_low: rounded(cloud * 0.8, 1),
        cloud_area_fraction_medium: rounded(cloud * 0.4, 1),
        dew_point_temperature: hour.dewPoint2mC,
        ...(at <= hourlyUntilMs ? { fog_area_fraction: (hour.relativeHumidityPct ?? 0) >= 99 ? 100 : 0 } : {}),
        relative_humidity: hour.relativeHumidityPct,
        ...(at <= hourlyUntilMs ? { ultraviolet_index_clear_sky: rounded((hour.shortwaveWm2 ?? 0) / 130, 1) } : {}),
        wind_from_direction: hour.windFromDeg,
        wind_speed: rounded(hour.windSpeed10mMs ?? 0, 1),
        ...(nordic && at <= hourlyUntilMs ? { wind_speed_of_gust: hour.windGust10mMs } : {}),
      };
      const six = span(at, 6);
      const temperatures = six.map((one) => one.temperature2mC ?? 0);
      return {
        time: `${new Date(at).toISOString().slice(0, 19)}Z`,
        data: {
          instant: { details },
          ...(stamps.has(at + 12 * hourMs) ? { next_12_hours: { summary: { symbol_code: symbol(span(at, 12)) } } } : {}),
          ...(stamps.has(at + hourMs) ? { next_1_hours: { summary: { symbol_code: symbol([hour]) }, details: { precipitation_amount: amount([hour]), ...chance([hour]) } } } : {}),
          ...(stamps.has(at + 6 * hourMs) ? { next_6_hours: { summary: { symbol_code: symbol(six) }, details: { air_temperature_max: Math.max(...temperatures), air_temperature_min: Math.min(...temperatures), precipitation_amount: amount(six), ...chance(six) } } } : {}),
        },
      };
    });
    const body = { type: 'Feature', geometry: { type: 'Point', coordinates: [longitude, latitude, altitudeM] }, properties: { meta: { updated_at: `${new Date(issuedAtMs + lagMs).toISOString().slice(0, 19)}Z`, units: nordic ? nordicUnits : units }, timeseries } };
    return { headers, body: JSON.stringify(body) };
  }

  const handlers = [
    http.get('https://api.met.no/weatherapi/locationforecast/2.0/complete', ({ request }) => {
      note(service, request);
      const query = new URL(request.url).searchParams;
      const tooFine = ['lat', 'lon'].some((name) => /\.\d{5,}/.test(query.get(name) ?? ''));
      if (!saysWhoAsks(request) || tooFine) return send(denied);
      return inMood(moodOf(service), failures, () => answer(request));
    }),
  ];
  return { handlers, meant: (latitude: number, longitude: number, altitudeM: number): Meant => meantOver(latitude, longitude, altitudeM) };
}
