import { chanceOf, eachMember, judge, morningOf, prepareEnsemble, prepareMorning, assess, type PlanToJudge } from '../../shared/assessment/index.ts';
import { allLimits, caseOf, date, fairHours, site } from '../science/cases.ts';
import type { BenchLine } from './line.ts';

const places = [
  { name: 'Hives', bearingDeg: 270, distanceM: 300 },
  { name: 'House', bearingDeg: 20, distanceM: 250 },
  { name: 'Creek', bearingDeg: 180, distanceM: 180 },
];

/** Runs `work` for about `forMs` after a warm-up and gives calls per second, the best of five. */
function perSecond(work: () => void, forMs = 400): number {
  const run = (ms: number): number => {
    const start = performance.now();
    let calls = 0;
    do {
      for (let turn = 0; turn < 50; turn += 1) work();
      calls += 50;
    } while (performance.now() - start < ms);
    return (calls * 1000) / (performance.now() - start);
  };
  run(forMs);
  return Math.max(...Array.from({ length: 5 }, () => run(forMs)));
}

/** Weather of one ensemble member: the fair day, a little windier and cloudier with its number. */
const member = (number: number) => fairHours((_, localHour) => ({ windSpeed10mMs: 2.5 + ((number * 7 + localHour) % 13) * 0.25, windGust10mMs: 6 + (number % 5), cloudCoverPct: (number * 11) % 100 }));

/** Speed of the assessment: plan-mornings on a prepared morning, whole cases, plans at once, an ensemble. */
export async function run(): Promise<BenchLine[]> {
  const theCase = caseOf({ limits: allLimits, sensitivePlaces: places });
  const morning = prepareMorning(theCase);
  const layout = morningOf(site, date);
  const plans: PlanToJudge[] = Array.from({ length: 100 }, (_, index) => ({ ...theCase, minutesNeeded: 30 + index }));
  let kept = 0;
  const members = Array.from({ length: 50 }, (_, number) => member(number));
  const ensembleMs = 1000 / perSecond(() => (kept += chanceOf(eachMember(site, date, members), theCase).fit), 800);
  const judged = perSecond(() => (kept += judge(morning, theCase).windows.length));
  const withSteps = perSecond(() => (kept += judge(morning, theCase).steps.length));
  const prepared = perSecond(() => (kept += prepareMorning(theCase, layout).morning.count));
  const whole = perSecond(() => (kept += assess(theCase).steps.length));
  const onePlanMs = 1000 / perSecond(() => (kept += judge(morning, plans[0]!).windows.length));
  const hundredPlansMs = 1000 / perSecond(() => plans.forEach((plan) => (kept += judge(morning, plan).windows.length)), 800);
  const readyMembers = prepareEnsemble(site, date, members);
  const readyMs = 1000 / perSecond(() => (kept += chanceOf(readyMembers, theCase).fit));
  if (!Number.isFinite(kept)) throw new Error('nothing was assessed');
  return [
    { name: 'assess: plan-mornings, all ten limits, verdict, windows and reasons', value: judged, unit: '1/s', goal: '≥ 20 000 /s', met: judged >= 20_000 },
    { name: 'assess: the same with every 5-minute step built', value: withSteps, unit: '1/s' },
    { name: 'assess: mornings prepared from 72 hours', value: prepared, unit: '1/s' },
    { name: 'assess: whole cases, sun, weather and plan from nothing', value: whole, unit: '1/s' },
    { name: 'assess: 100 plans on one morning', value: hundredPlansMs, unit: 'ms', baseline: { name: '100 × one plan', value: 100 * onePlanMs }, ratio: hundredPlansMs / (100 * onePlanMs), goal: 'ratio about 1: linear in plans', met: hundredPlansMs / (100 * onePlanMs) < 1.25 },
    { name: 'assess: 50-member ensemble, one plan, from hours to chance', value: ensembleMs, unit: 'ms', goal: '≤ 5 ms', met: ensembleMs <= 5 },
    { name: 'assess: 50 members prepared before, one plan', value: readyMs, unit: 'ms' },
  ];
}
