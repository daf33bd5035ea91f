import type { LimitName } from '../answer.ts';
import type { LimitJudge } from '../track.ts';
import { judgeInversion } from './inversion.ts';
import { judgePollinators } from './pollinators.ts';
import { judgeRainFree } from './rain-free.ts';
import { judgeDeltaT, judgeTemperature } from './temperature.ts';
import { judgeTowardSensitivePlace } from './toward-sensitive-place.ts';
import { judgeWetFoliage } from './wet-foliage.ts';
import { judgeGusts, judgeStillAir, judgeWind } from './wind.ts';

/** The ten limits, each judged by its own file. */
export const limitJudges: Readonly<Record<LimitName, LimitJudge>> = {
  wind: judgeWind,
  gusts: judgeGusts,
  stillAir: judgeStillAir,
  inversion: judgeInversion,
  rainFree: judgeRainFree,
  wetFoliage: judgeWetFoliage,
  pollinators: judgePollinators,
  temperature: judgeTemperature,
  deltaT: judgeDeltaT,
  towardSensitivePlace: judgeTowardSensitivePlace,
};
