import type { z } from 'zod';
import type { demoEndpoints } from '../../shared/api/system.ts';
import type { SettableClock } from '../clock/clock.ts';

type Items<E extends { answer: z.ZodType }> = z.infer<E['answer']> extends { items: (infer T)[] } ? T : never;
type Mood = z.infer<(typeof demoEndpoints)['mood']['body']>;

/** The fakes of the demo, as the demo pages see them. Built in mocks/, handed in by server/index.ts. */
export interface DemoParts {
  clock: SettableClock;
  signIns: { name: string; email: string; password: string; role: string }[];
  pushes(): Items<(typeof demoEndpoints)['phone']>[];
  mails(): Items<(typeof demoEndpoints)['mailbox']>[];
  hooks(): Items<(typeof demoEndpoints)['hookLog']>[];
  setMood(provider: Mood['provider'], mood: Mood['mood']): void;
  stop(): Promise<void>;
}
