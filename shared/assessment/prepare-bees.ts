import { windProfileFactor } from '../atmosphere/wind-profile.ts';
import { activityBand, beeActivity } from '../pollinators/activity.ts';
import type { AssessmentAnswer } from './answer.ts';
import { beeKinds, type BeeKind } from './case.ts';
import { column } from './columns.ts';
import type { HourTable } from './hours.ts';
import { stepMs, type Morning } from './morning.ts';

interface BeeWeather {
  temperatureC: Float64Array;
  /** At 10 m. */
  windMs: Float64Array;
  radiationWm2: Float64Array;
  brightestWm2: Float64Array;
}

export type BeeBand = NonNullable<NonNullable<AssessmentAnswer['beeActivity']>[BeeKind]>;

/** Activity of one kind on every step. */
export interface BeeSteps {
  shown: Float64Array;
  /** Where radiation is missing, under the brightest sky that the sun allows. */
  judged: Float64Array;
  /** Start and end of flight by the judged activity. */
  band(): BeeBand;
}

/** Prepares the activity of every kind of bee. */
export function prepareBees(morning: Morning, table: HourTable, weather: BeeWeather): Record<BeeKind, BeeSteps> {
  const toFlower = windProfileFactor(10, 2);
  const of = (kind: BeeKind): BeeSteps => {
    const shown = column(morning.count);
    const judged = column(morning.count);
    for (let step = 0; step < morning.count; step += 1) {
      const at = {
        temperatureC: weather.temperatureC[step]!,
        radiationWm2: weather.radiationWm2[step]!,
        windMs: weather.windMs[step]! * toFlower,
        rainMm: table.rainOfMm[Math.floor((step + morning.offsetSteps) / 12)]!,
        sunAltitudeDeg: morning.sunAltitudeDeg[step]!,
      };
      shown[step] = beeActivity(kind, at);
      const brightest = weather.brightestWm2[step]!;
      if (brightest === at.radiationWm2) judged[step] = shown[step]!;
      else {
        at.radiationWm2 = brightest;
        judged[step] = beeActivity(kind, at);
      }
    }
    let band: BeeBand | null = null;
    return { shown, judged, band: () => (band ??= bandOf(morning, judged)) };
  };
  return Object.fromEntries(beeKinds.map((kind) => [kind, of(kind)])) as Record<BeeKind, BeeSteps>;
}

function bandOf(morning: Morning, activity: Float64Array): BeeBand {
  const iso = (ms: number | null): string | null => (ms === null ? null : new Date(ms).toISOString());
  const band = activityBand(morning.stepStartsMs(), activity, stepMs);
  return { possibleFrom: iso(band.possibleFromMs), likelyFrom: iso(band.likelyFromMs), likelyUntil: iso(band.likelyUntilMs), possibleUntil: iso(band.possibleUntilMs) };
}
