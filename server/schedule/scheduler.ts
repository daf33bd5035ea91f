import { Run } from '../delivery/run.ts';
import { createInbox } from '../hooks/inbox.ts';
import type { FarmRow } from '../models/farms.ts';
import type { Services } from '../services.ts';
import type { Assessor } from '../verdicts/assessor.ts';
import { advance, earliest, forget, postpone, takeDue, type DueMoment } from './due.ts';
import { dawnAt, lastMoment, morningEnds, nextMoment, nextRefresh } from './moments.ts';
import { planMoments } from './plan-moments.ts';

/** Does what is due: eve and dawn notices, forecast refresh, messages that came in. Any number may run on one database. */
export interface Scheduler {
  start(): void;
  /** Ends after the work under way. */
  stop(): Promise<void>;
  /** Does everything due until the clock's present instant, messages that came in included. */
  tick(): Promise<void>;
  /** The earliest moment at which something falls due; null when no farm is scheduled. */
  nextDueAt(): Promise<Date | null>;
  /** Says that a message came in, so that it is taken at once. */
  nudge(): void;
}

export interface SchedulerOptions {
  /** Farms assessed at one time. */
  concurrency?: number;
  /** Longest pause between two looks at what is due. */
  pauseMsMax?: number;
  /** Pause between two looks at messages that came in to another process. */
  inboxPauseMs?: number;
}

const againS = 15;

export function createScheduler(services: Services, assessor: Assessor, options: SchedulerOptions = {}): Scheduler {
  const { clock, log, models, random } = services;
  const { concurrency = 4, pauseMsMax = 30_000, inboxPauseMs = 1000 } = options;
  const inbox = createInbox(services, assessor);
  let running: { moments: Run; messages: Run; loops: Promise<unknown> } | null = null;
  let ticking: Promise<void> = Promise.resolve();

  /** Eve and dawn: the newest moment that has passed is told, late if need be; older ones, and one that helps no more, are dropped with a line in the log. */
  async function notice(farm: FarmRow, moment: DueMoment, kind: 'eve' | 'dawn'): Promise<void> {
    const now = clock.now();
    const { at, morning } = lastMoment(kind, farm, now);
    const missed = (what: { morning: string | null; dueAt: Date }, why: string) => log.warn({ farmId: farm.id, kind, ...what, why }, 'notice not told');
    if (moment.morning !== null && moment.morning < morning) missed({ morning: moment.morning, dueAt: moment.dueAt }, 'its morning was over before it could be told');
    if (morningEnds(morning, farm.timeZone) <= now) missed({ morning, dueAt: at }, 'the morning is over');
    else if (kind === 'eve' && dawnAt(morning, farm) <= now) missed({ morning, dueAt: at }, 'the dawn notice tells the same morning');
    else await assessor.assessFarm(farm.id, { fetch: kind === 'dawn' ? 'now' : 'ifDue', occasion: { kind, morning, dueAt: at } });
    await advance(services, moment, nextMoment(kind, farm, clock.now()));
  }

  async function perform(moment: DueMoment): Promise<void> {
    const row = await models.farms.findOne({ where: { id: moment.farmId } });
    if (!row || row.archivedAt) return forget(services, moment, 'farm');
    const farm = row.get({ plain: true });
    if (moment.kind === 'eve' || moment.kind === 'dawn') return notice(farm, moment, moment.kind);
    if (moment.kind === 'recheck') {
      // Removed first: the assessment may ask for yet another look.
      await forget(services, moment, 'moment');
      await assessor.assessFarm(farm.id, { fetch: 'never' });
      return;
    }
    await assessor.assessFarm(farm.id, { fetch: 'ifDue' });
    await advance(services, moment, { at: nextRefresh(farm.id, clock.now()), morning: null });
  }

  async function tried(moment: DueMoment): Promise<void> {
    try {
      await perform(moment);
    } catch (error) {
      log.error({ err: error, ...moment }, 'a moment could not be done; trying again');
      const waitS = Math.min(300, againS * 2 ** (moment.tries - 1)) * (0.75 + random() / 2);
      await postpone(services, moment, new Date(clock.now().getTime() + waitS * 1000)).catch((failure: unknown) => log.error({ err: failure }, 'a moment could not be put off'));
    }
  }

  async function doDue(): Promise<void> {
    await planMoments(services);
    for (;;) {
      const due = await takeDue(services, concurrency * 5);
      if (due.length === 0) return;
      // The moments of one farm follow each other; farms go side by side.
      const farms = [...new Set(due.map((moment) => moment.farmId))].map((farmId) => due.filter((moment) => moment.farmId === farmId).sort((a, b) => a.dueAt.getTime() - b.dueAt.getTime()));
      const next = farms.values();
      await Promise.all(
        Array.from({ length: concurrency }, async () => {
          for (const moments of next) for (const moment of moments) await tried(moment);
        }),
      );
    }
  }

  /** One at a time in this process: whoever asks while one is under way gets one of their own after it. */
  function moments(): Promise<void> {
    const turn = ticking.then(doDue);
    ticking = turn.catch(() => undefined);
    return turn;
  }

  async function tick(): Promise<void> {
    await inbox.process();
    await moments();
    await inbox.process();
  }

  async function loop(run: Run, work: () => Promise<number>): Promise<void> {
    while (!run.stopped) {
      try {
        await run.sleep(await work());
      } catch (error) {
        log.error({ err: error }, 'the schedule could not be read; trying again');
        await run.sleep(5000);
      }
    }
  }

  /** Milliseconds until the next moment, within bounds: clocks jump, farms are added. */
  async function momentsThenPause(): Promise<number> {
    await moments();
    const next = await earliest(services);
    return Math.max(50, Math.min(pauseMsMax, next ? next.getTime() - clock.now().getTime() : pauseMsMax));
  }

  function start(): void {
    if (running) return;
    const runs = { moments: new Run(), messages: new Run() };
    running = { ...runs, loops: Promise.all([loop(runs.moments, momentsThenPause), loop(runs.messages, async () => ((await inbox.process()) > 0 ? 0 : inboxPauseMs))]) };
  }

  async function stop(): Promise<void> {
    const ended = running;
    running = null;
    ended?.moments.stop();
    ended?.messages.stop();
    await ended?.loops;
  }

  return { start, stop, tick, nextDueAt: () => earliest(services), nudge: () => running?.messages.wake() };
}
