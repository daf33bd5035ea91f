import type { UnitSystem } from '../units/units.ts';
import type { AssessmentAnswer, AssessmentStep, LimitAtStep, Reason, SprayWindow } from './answer.ts';
import type { BeeKind } from './case.ts';
import { isoAt } from './failing.ts';
import { formatsFor } from './formats.ts';
import { stepMs } from './morning.ts';
import type { PreparedMorning } from './prepare.ts';
import { reasonsOf } from './reasons.ts';
import { sentenceOf, type Language } from './sentences.ts';
import { boundAt, type Track } from './track.ts';
import type { Judgement } from './verdict.ts';

/** In which words the reasons are told; any other can be had from their key and params by `retell`. */
export interface AnswerOptions {
  units?: UnitSystem;
  language?: Language;
}

/** Digits kept of a value; headroom is rounded DOWN, so that it never crosses its limit. */
const valueScale = 1e6;
const headroomScale = 1e4;

const rounded = (value: number): number | null => (Number.isNaN(value) ? null : Math.round(value * valueScale) / valueScale);

/** Turns a judgement into the answer of the contract; the steps are built when they are first read. */
export function answerOf(judgement: Judgement, options: AnswerOptions = {}): AssessmentAnswer {
  const { morning } = judgement;
  const { morning: layout } = morning;
  const units = options.units ?? 'us';
  const formats = formatsFor({ units, timeZone: layout.site.timeZone, date: layout.date });
  const told = reasonsOf(judgement).map((bare): Reason => ({ limit: bare.limit, kind: bare.kind, at: bare.at, text: sentenceOf(bare, formats, options.language), key: bare.key, params: bare.params as Record<string, unknown> }));
  // Two limits may want for the same value: it is said once.
  const reasons = told.filter(({ text, kind }, index) => told.findIndex((other) => other.text === text && other.kind === kind) === index);
  let steps: AssessmentStep[] | null = null;
  return {
    verdict: judgement.verdict,
    enoughToTell: judgement.enoughToTell,
    bindingLimit: judgement.bindingLimit,
    reasons,
    windows: windowsOf(judgement),
    sun: layout.sunTimes(),
    beeActivity: bandsOf(judgement),
    siteWindFactor: morning.siteFactor,
    get steps() {
      return (steps ??= stepsOf(judgement, units));
    },
  };
}

function windowsOf(judgement: Judgement): SprayWindow[] {
  const { startMs } = judgement.morning.morning;
  return judgement.runs.map((run, index) => {
    const fit = judgement.fits[index];
    return {
      start: isoAt(judgement, run.from),
      end: isoAt(judgement, run.to),
      minutes: ((run.to - run.from) * stepMs) / 60_000,
      bestStart: fit ? new Date(startMs + fit.bestStartMin * 60_000).toISOString() : null,
      latestStart: fit ? new Date(startMs + Math.floor(fit.latestStartMin) * 60_000).toISOString() : null,
    };
  });
}

function bandsOf({ plan, morning }: Judgement): NonNullable<AssessmentAnswer['beeActivity']> {
  const bands: NonNullable<AssessmentAnswer['beeActivity']> = {};
  for (const kind of plan.limits.pollinators?.kinds ?? []) {
    bands[kind] = morning.bees[kind].band();
  }
  return bands;
}

function stepsOf(judgement: Judgement, units: UnitSystem): AssessmentStep[] {
  const { morning, tracks, plan } = judgement;
  const times = morning.morning.times();
  const inversion = morning.inversionSteps(units);
  const kinds = plan.limits.pollinators?.kinds ?? [];
  const steps: AssessmentStep[] = [];
  for (let step = 0; step < morning.morning.count; step += 1) {
    const limits: AssessmentStep['limits'] = {};
    for (const track of tracks) limits[track.limit] = atStep(track, step);
    steps.push({ time: times[step]!, sunAltitudeDeg: Math.round(morning.morning.sunAltitudeDeg[step]! * 1e4) / 1e4, limits, inversion: inversion[step]!, pollinators: beesAt(morning, kinds, step) });
  }
  return steps;
}

function atStep(track: Track, step: number): LimitAtStep {
  const headroom = track.headroom[step]!;
  return {
    value: rounded(track.value[step]!),
    limit: rounded(boundAt(track, step)),
    headroom: Number.isNaN(headroom) ? null : Math.floor(headroom * headroomScale) / headroomScale,
    kind: track.isHard ? 'hard' : 'advice',
  };
}

function beesAt(morning: PreparedMorning, kinds: readonly BeeKind[], step: number): AssessmentStep['pollinators'] {
  const bees: AssessmentStep['pollinators'] = {};
  for (const kind of kinds) bees[kind] = rounded(morning.bees[kind].shown[step]!);
  return bees;
}
