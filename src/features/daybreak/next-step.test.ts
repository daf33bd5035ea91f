import { describe, expect, it, vi } from 'vitest';
import type { Daybreak, PlanVerdict } from '../../../shared/api/mornings.ts';
import { morningName, nextStep } from './next-step.ts';

// The words are made for a page, whose language they ask for.
vi.stubGlobal('document', { documentElement: { lang: 'en' } });

const reader = { units: 'us', timeZone: 'America/Detroit' } as const;
const all = { refresh: true, plan: true };

const verdictOn = (date: string, changes: Partial<PlanVerdict> = {}): PlanVerdict => ({
  planId: '3f0f5d0e-6f6c-4d6a-8a51-0d1f6a3c2b10',
  planName: 'Mites on the ridge',
  date,
  verdict: 'go',
  enoughToTell: true,
  bindingLimit: 'wind',
  headline: { us: '', metric: '' },
  reasons: [],
  // 5:25 to 6:10 in Detroit, where clocks are four hours behind UTC in June.
  window: { start: `${date}T09:25:00.000Z`, end: `${date}T10:10:00.000Z`, minutes: 45, bestStart: `${date}T09:30:00.000Z`, latestStart: `${date}T09:39:00.000Z` },
  minutesNeeded: 31,
  reserveMinutes: 0,
  sun: { civilDawn: null, sunrise: null, localNoon: `${date}T16:00:00.000Z` },
  ribbon: { startAt: null, stepMinutes: 10, headroom: [], sunAltitudeDeg: [] },
  revision: 1,
  decidedAt: `${date}T00:00:00.000Z`,
  ...changes,
});
const hold = { verdict: 'hold', window: null } as const;

const daybreakAt = (now: string, verdicts: PlanVerdict[]): Daybreak => ({ farmId: '3f0f5d0e-6f6c-4d6a-8a51-0d1f6a3c2b11', now, timeZone: reader.timeZone, forecast: null, stale: false, mornings: verdicts.map((verdict) => ({ date: verdict.date, verdicts: [verdict] })) });
const stepAt = (now: string, ...verdicts: PlanVerdict[]) => nextStep(daybreakAt(now, verdicts), verdicts[0]!, reader, all);

describe('the morning is called', () => {
  it.each([
    ['the evening before', '2026-06-10T00:00:00.000Z', 'Tomorrow morning'],
    ['after midnight', '2026-06-10T04:10:00.000Z', 'This morning'],
    ['two days ahead', '2026-06-08T20:00:00.000Z', 'Wednesday, June 10'],
  ])('%s', (_, now, name) => expect(morningName('2026-06-10', now, reader.timeZone)).toBe(name));
});

describe('what to do next', () => {
  const go = verdictOn('2026-06-10');

  it('on the evening of a go: set out, and wait for dawn', () => expect(stepAt('2026-06-10T00:00:00.000Z', go)).toMatchObject({ text: expect.stringMatching(/tonight/) as string, does: { kind: 'morning', date: '2026-06-10' } }));
  it('at dawn: when to start, and to measure first', () => expect(stepAt('2026-06-10T08:50:00.000Z', go)).toMatchObject({ text: 'Best start 5:30, at the latest 5:39. Measure the wind first.', does: { label: 'Check on site' } }));
  it('in the window: by when to start', () => expect(stepAt('2026-06-10T09:28:00.000Z', go).text).toBe('The window is open. Measure the wind, then start by 5:39.'));
  it('past the latest start: that it is too late', () => expect(stepAt('2026-06-10T09:39:00.000Z', go).text).toBe('Too late to start: the job would not end before 6:10.'));
  it('past the end: that it has closed', () => expect(stepAt('2026-06-10T10:10:00.000Z', go).text).toBe('The window closed at 6:10.'));
  it('on a hold: the next morning on which the same plan may go', () => {
    const step = stepAt('2026-06-10T00:00:00.000Z', verdictOn('2026-06-10', hold), verdictOn('2026-06-11', { planId: null }), verdictOn('2026-06-12'));
    expect(step).toEqual({ text: 'Friday, June 12 looks better.', does: { kind: 'morning', date: '2026-06-12', label: 'Look at Fri' } });
  });
  it('on a hold with nothing better in sight: no false comfort', () => expect(stepAt('2026-06-10T00:00:00.000Z', verdictOn('2026-06-10', hold)).text).toMatch(/^No better morning in sight/));
  it('without a plan: make one, if one may', () => {
    const usual = verdictOn('2026-06-10', { planId: null });
    expect(stepAt('2026-06-10T00:00:00.000Z', usual).does.kind).toBe('plan');
    expect(nextStep(daybreakAt('2026-06-10T00:00:00.000Z', [usual]), usual, reader, { refresh: false, plan: false }).does.kind).toBe('morning');
  });
  it('with too little to tell: fetch the forecast, if one may', () => {
    const untold = verdictOn('2026-06-10', { ...hold, enoughToTell: false });
    expect(stepAt('2026-06-10T00:00:00.000Z', untold)).toMatchObject({ text: expect.stringMatching(/^Silence is never a go/) as string, does: { kind: 'refresh' } });
    expect(nextStep(daybreakAt('2026-06-10T00:00:00.000Z', [untold]), untold, reader, { refresh: false, plan: true }).does.kind).toBe('morning');
  });
});
