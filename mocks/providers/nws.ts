import tzLookup from '@photostructure/tz-lookup';
import { http } from 'msw';
import { stream, uniform } from '../weather/noise.ts';
import { denied, inMood, saysWhoAsks, send, type Answer, type Failures } from './mood.ts';
import { durationText, gridLayers } from './nws-layers.ts';
import type { FakeTools } from './provider-fakes.ts';
import { hourMs, httpDate, staleByMs, type Meant } from './skies.ts';

const service = 'nws';
const home = 'https://api.weather.gov';
const correlationId = '5fd2a1c0';

function problem(status: number, title: string, type: string, detail: string, headers: Record<string, string> = {}): Answer {
  const body = { correlationId, title, type: `${home}/problems/${type}`, status, detail, instance: `${home}/requests/${correlationId}` };
  return { status, headers: { 'content-type': 'application/problem+json', ...headers }, body: JSON.stringify(body, null, 4) };
}
const failures: Failures = {
  error500: problem(500, 'Unexpected Problem', 'UnexpectedProblem', 'An unexpected problem has occurred.'),
  tooMany: problem(429, 'Too Many Requests', 'TooManyRequests', 'Rate limit exceeded.', { 'retry-after': '30' }),
};
const noPoint = (point: string): Answer => problem(404, 'Data Unavailable For Requested Point', 'InvalidPoint', `Unable to provide data for requested point ${point}`);

/** Grid of the fake office `TST`: cells of about 2.5 km, numbered from the corner of the map. */
const cellDeg = 0.025;
const cellOf = (latitude: number, longitude: number): { x: number; y: number } => ({ x: Math.round((longitude + 180) / cellDeg), y: Math.round(latitude / cellDeg) });
const middleOf = (x: number, y: number): { latitude: number; longitude: number } => ({ latitude: y * cellDeg, longitude: x * cellDeg - 180 });
const insideStates = (latitude: number, longitude: number): boolean => latitude > 17 && latitude < 72 && longitude > -180 && longitude < -64;

const contextOf = (extra: Record<string, unknown>): unknown[] => ['https://geojson.org/geojson-ld/geojson-context.jsonld', { '@version': '1.1', ...extra }];
const pointContext = contextOf({
  wx: `${home}/ontology#`,
  s: 'https://schema.org/',
  geo: 'http://www.opengis.net/ont/geosparql#',
  unit: 'http://codes.wmo.int/common/unit/',
  '@vocab': `${home}/ontology#`,
  geometry: { '@id': 's:GeoCoordinates', '@type': 'geo:wktLiteral' },
  city: 's:addressLocality',
  state: 's:addressRegion',
  distance: { '@id': 's:Distance', '@type': 's:QuantitativeValue' },
  bearing: { '@type': 's:QuantitativeValue' },
  value: { '@id': 's:value' },
  unitCode: { '@id': 's:unitCode', '@type': '@id' },
  forecastOffice: { '@type': '@id' },
  forecastGridData: { '@type': '@id' },
  publicZone: { '@type': '@id' },
  county: { '@type': '@id' },
});
const gridContext = contextOf({ wmoUnit: 'https://codes.wmo.int/common/unit/', nwsUnit: `${home}/ontology/unit/` });

/** Fakes of the points and raw-grid calls of the US National Weather Service. */
export function nwsFake({ clock, skies, moodOf, note, elevationM }: FakeTools) {
  const jitter = stream(1, 'nws update minute');
  const seenNowMs = (): number => clock.now().getTime() - (moodOf(service) === 'stale' ? staleByMs : 0);

  /** The office renews its grid about every three hours, at no round minute. */
  function updatedAtMs(): number {
    const updateMs = (turn: number): number => turn * 3 * hourMs + Math.floor((8 + 40 * uniform(jitter, turn)) * 60) * 1000;
    const turn = Math.floor(seenNowMs() / (3 * hourMs));
    return updateMs(turn) <= seenNowMs() ? updateMs(turn) : updateMs(turn - 1);
  }

  function headers(updatedMs: number): Record<string, string> {
    const now = clock.now().getTime();
    return {
      'content-type': 'application/geo+json',
      date: httpDate(now),
      'cache-control': 'public, max-age=749, s-maxage=3600',
      expires: httpDate(now + 749_000),
      'last-modified': httpDate(updatedMs),
      etag: `"${stream(updatedMs / 1000, 'etag').toString(16)}:ov"`,
      vary: 'Accept,Feature-Flags,Accept-Language',
      'x-correlation-id': correlationId,
      'x-request-id': '8f0d1d3e-0000-4000-8000-5fd2a1c00000',
      'x-server-id': 'vm-fake-nws-1',
    };
  }

  function meantAt(x: number, y: number): Meant & { startMs: number; lengthH: number } {
    const issuedAtMs = updatedAtMs();
    // The grid begins some hours before it was made.
    const startMs = (Math.floor(issuedAtMs / hourMs) - 6) * hourMs;
    const lengthH = 182;
    const { latitude, longitude } = middleOf(x, y);
    return { ...skies.issue(skies.over(latitude, longitude, elevationM), service, issuedAtMs, startMs, startMs + lengthH * hourMs), startMs, lengthH };
  }

  function point(latitude: number, longitude: number): Answer {
    if (!insideStates(latitude, longitude)) return noPoint(`${latitude},${longitude}`);
    const { x, y } = cellOf(latitude, longitude);
    const grid = `${home}/gridpoints/TST/${x},${y}`;
    const id = `${home}/points/${latitude},${longitude}`;
    const properties = {
      '@id': id,
      '@type': 'wx:Point',
      cwa: 'TST',
      forecastOffice: `${home}/offices/TST`,
      gridId: 'TST',
      gridX: x,
      gridY: y,
      forecast: `${grid}/forecast`,
      forecastHourly: `${grid}/forecast/hourly`,
      forecastGridData: grid,
      observationStations: `${grid}/stations`,
      relativeLocation: {
        type: 'Feature',
        geometry: { type: 'Point', coordinates: [longitude + 0.02, latitude + 0.02] },
        properties: { city: 'Thornwick Ford', state: 'ZZ', distance: { unitCode: 'wmoUnit:m', value: 2731.4 }, bearing: { unitCode: 'wmoUnit:degree_(angle)', value: 215 } },
      },
      forecastZone: `${home}/zones/forecast/ZZZ001`,
      county: `${home}/zones/county/ZZC001`,
      fireWeatherZone: `${home}/zones/fire/ZZZ001`,
      timeZone: tzLookup(latitude, longitude),
      radarStation: 'KTST',
    };
    return { headers: headers(Math.floor(clock.now().getTime() / (24 * hourMs)) * 24 * hourMs), body: JSON.stringify({ '@context': pointContext, id, type: 'Feature', geometry: { type: 'Point', coordinates: [longitude, latitude] }, properties }, null, 4) };
  }

  function grid(x: number, y: number, request: Request): Answer {
    const meant = meantAt(x, y);
    const sent = headers(meant.issuedAtMs);
    if (request.headers.get('if-none-match') === sent.etag || (!request.headers.has('if-none-match') && Date.parse(request.headers.get('if-modified-since') ?? '') >= Date.parse(sent['last-modified'] ?? ''))) return { status: 304, headers: sent, body: '' };
    const { latitude, longitude } = middleOf(x, y);
    const half = cellDeg / 2;
    const corners = [[-1, 1], [-1, -1], [1, -1], [1, 1], [-1, 1]].map(([east = 0, north = 0]) => [longitude + east * half, latitude + north * half]);
    const id = `${home}/gridpoints/TST/${x},${y}`;
    const instant = (atMs: number): string => `${new Date(atMs).toISOString().slice(0, 19)}+00:00`;
    const properties = {
      '@id': id,
      '@type': 'wx:Gridpoint',
      updateTime: instant(meant.issuedAtMs),
      validTimes: `${instant(meant.startMs)}/${durationText(meant.lengthH)}`,
      elevation: { unitCode: 'wmoUnit:m', value: elevationM },
      forecastOffice: `${home}/offices/TST`,
      gridId: 'TST',
      gridX: String(x),
      gridY: String(y),
      ...gridLayers(meant, meant.startMs, meant.lengthH, moodOf(service) === 'missingLayer'),
    };
    return { headers: sent, body: JSON.stringify({ '@context': gridContext, id, type: 'Feature', geometry: { type: 'Polygon', coordinates: [corners] }, properties }, null, 4) };
  }

  const handlers = [
    http.get(`${home}/points/:point`, ({ request, params }) => {
      note(service, request);
      if (!saysWhoAsks(request)) return send(denied);
      const asked = String(params.point);
      const [latitude, longitude] = asked.split(',').map(Number);
      if (latitude === undefined || longitude === undefined || !Number.isFinite(latitude + longitude)) return send(problem(400, 'Invalid Parameter', 'InvalidParameter', `Parameter "point" is invalid: '${asked}' does not appear to be a valid coordinate`));
      const tidy = `${Number(latitude.toFixed(4))},${Number(longitude.toFixed(4))}`;
      if (tidy !== asked) return send({ status: 301, headers: { location: `${home}/points/${tidy}` }, body: '' });
      // A point is a plain look-up: no grid in it to be stale or thin.
      return inMood(moodOf(service), failures, () => point(latitude, longitude));
    }),
    http.get(`${home}/gridpoints/TST/:cell`, ({ request, params }) => {
      note(service, request);
      if (!saysWhoAsks(request)) return send(denied);
      if (new URL(request.url).search !== '') return send(problem(400, 'Bad Request', 'BadRequest', 'Unknown query parameter.'));
      const [x = 0, y = 0] = String(params.cell).split(',').map(Number);
      return inMood(moodOf(service), failures, () => grid(x, y, request));
    }),
  ];
  return {
    handlers,
    meant(latitude: number, longitude: number): Meant {
      const { x, y } = cellOf(latitude, longitude);
      return meantAt(x, y);
    },
  };
}
