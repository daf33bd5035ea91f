import { windProfileFactor } from '../atmosphere/wind-profile.ts';
import { beeActivity } from '../pollinators/activity.ts';
import { beeKinds, type BeeKind } from './case.ts';
import type { HourTable } from './hours.ts';
import type { Morning } from './morning.ts';

interface BeeWeather {
  temperatureC: Float64Array;
  /** At 10 m. */
  windMs: Float64Array;
  radiationWm2: Float64Array;
  brightestWm2: Float64Array;
}

/** Activity of every kind on every step: as shown, and as judged (brightest sky where radiation is missing). */
export function prepareBees(morning: Morning, table: HourTable, weather: BeeWeather): Record<BeeKind, { shown: Float64Array; judged: Float64Array }> {
  const toFlower = windProfileFactor(10, 2);
  const of = (kind: BeeKind): { shown: Float64Array; judged: Float64Array } => {
    const shown = new Float64Array(morning.count);
    const judged = new Float64Array(morning.count);
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
    return { shown, judged };
  };
  return Object.fromEntries(beeKinds.map((kind) => [kind, of(kind)])) as Record<BeeKind, { shown: Float64Array; judged: Float64Array }>;
}
