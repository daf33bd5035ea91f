import type { DemoParts } from '../demo/parts.ts';
import { stepClock } from '../demo/step-clock.ts';
import { worthSteppingTo } from '../demo/worth-stepping-to.ts';
import { demoEndpoints, type DemoClock } from '../../shared/api/system.ts';
import type { Daybreak } from '../../shared/api/mornings.ts';
import type { Register } from '../http/route.ts';
import { HttpProblem, invalid, notFound } from '../http/problem.ts';
import type { FarmRow } from '../models/farms.ts';
import type { Parts } from '../parts.ts';
import type { Services } from '../services.ts';

const stepDaysMax = 10;

export function demoRoutes(register: Register, services: Services, parts: Parts): void {
  const { models, settings } = services;
  let stepping = false;

  /** The fakes; where they do not run, the address names nothing. */
  const fakes = (): DemoParts => {
    if (!parts.demo) throw notFound();
    return parts.demo;
  };

  async function clockFacts(demo: DemoParts): Promise<DemoClock> {
    const now = demo.clock.now();
    const farm = await models.farms.findOne({ where: { archivedAt: null }, order: [['createdAt', 'ASC'], ['id', 'ASC']] });
    if (!farm) return { now: now.toISOString(), timeZone: 'UTC', next: [] };
    const daybreak = JSON.parse(await parts.assessor.daybreakJson(farm.id)) as Daybreak;
    return { now: now.toISOString(), timeZone: farm.timeZone, next: worthSteppingTo(farm.get({ plain: true }) as FarmRow, now, (morning) => windowStart(daybreak, morning)) };
  }

  register(demoEndpoints.status, async () => ({ demo: settings.demo && parts.demo !== null, signIns: settings.demo ? (parts.demo?.signIns ?? []) : [] }));
  register(demoEndpoints.readClock, async () => clockFacts(fakes()));
  register(demoEndpoints.setClock, async ({ body }) => {
    const demo = fakes();
    const to = new Date(body.now);
    const now = demo.clock.now();
    if (to < now) throw invalid([{ path: 'now', message: 'must not lie before the demo clock: it only goes forward' }]);
    if (to.getTime() - now.getTime() > stepDaysMax * 86_400_000) throw invalid([{ path: 'now', message: `must be at most ${stepDaysMax} days ahead` }]);
    if (stepping) throw new HttpProblem(409, 'The demo clock is on its way already; wait until it has arrived.');
    stepping = true;
    try {
      await stepClock(demo.clock, parts.scheduler, parts.worker, to);
    } finally {
      stepping = false;
    }
    return clockFacts(demo);
  });
  register(demoEndpoints.phone, async () => ({ items: fakes().pushes() }));
  register(demoEndpoints.mailbox, async () => ({ items: fakes().mails() }));
  register(demoEndpoints.hookLog, async () => ({ items: fakes().hooks() }));
  register(demoEndpoints.mood, async ({ body }) => {
    fakes().setMood(body.provider, body.mood);
    return undefined;
  });
}

/** Start of the first window that a plan goes into on a morning. */
function windowStart(daybreak: Daybreak, morning: string): Date | null {
  const starts = (daybreak.mornings.find(({ date }) => date === morning)?.verdicts ?? []).flatMap((verdict) => (verdict.verdict === 'go' && verdict.window ? [verdict.window.start] : []));
  return starts.length > 0 ? new Date(starts.sort()[0]!) : null;
}
