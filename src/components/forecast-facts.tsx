import type { ForecastFacts } from '../../shared/api/mornings.ts';
import { minutesBetween, span } from '../lib/time.ts';

/** Where the weather comes from and how old it is; a stand-in and a forecast too old say so. */
export function ForecastNote({ forecast, stale, now }: { forecast: ForecastFacts | null; stale: boolean; now: string }) {
  if (!forecast) return <p className="text-sm">No forecast yet. Until one comes, every morning is a hold.</p>;
  const { providerName, attribution, fetchedAt, issuedAt, standInBecause } = forecast;
  return (
    <div className="text-sm text-ink-soft">
      <p>
        Forecast by {providerName}, {span(minutesBetween(issuedAt ?? fetchedAt, now))} old. {attribution}.
      </p>
      {standInBecause && <p>It stands in for the farm’s first provider: {standInBecause}</p>}
      {stale && <span className="sr-only">This forecast is too old to say go.</span>}
    </div>
  );
}

/** The warning above everything when the newest forecast is too old. */
export function StaleBanner({ forecast, now }: { forecast: ForecastFacts | null; now: string }) {
  return (
    <p role="alert" className="mb-3 rounded-lg bg-rose-pale px-4 py-2 font-semibold">
      {forecast ? `The newest forecast is ${span(minutesBetween(forecast.fetchedAt, now))} old: too old to say go.` : 'There is no forecast: nothing here can say go.'}
    </p>
  );
}
