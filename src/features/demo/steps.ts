import type { DemoClock } from '../../../shared/api/system.ts';

/** What each step of the demo clock leads to. */
export const stepWords: Record<DemoClock['next'][number]['name'], { name: string; short: string; hint: string }> = {
  eve: { name: 'The evening', short: 'evening', hint: 'Tomorrow’s go or hold goes out.' },
  dawn: { name: 'Dawn', short: 'dawn', hint: 'The push, the partner’s summary and the webhook go out.' },
  windowStart: { name: 'The window opens', short: 'window', hint: 'Time to measure on site and start.' },
  noon: { name: 'Noon', short: 'noon', hint: 'The morning is over.' },
  nextEvening: { name: 'The next evening', short: 'next eve', hint: 'On to the morning after.' },
};
