import { existsSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { SettableClock } from '../../server/clock/clock.ts';

const saveEveryMs = 20_000;

/** The demo clock, kept over restarts: it goes on from where it stood. */
export function keptClock(file: string, opensAt: Date): { clock: SettableClock; stop: () => void } {
  const start = existsSync(file) ? new Date((JSON.parse(readFileSync(file, 'utf8')) as { now: string }).now) : opensAt;
  const clock = new SettableClock(start);
  const save = () => {
    writeFileSync(`${file}.new`, JSON.stringify({ now: clock.now().toISOString() }), { mode: 0o600 });
    renameSync(`${file}.new`, file);
  };
  const timer = setInterval(save, saveEveryMs);
  timer.unref();
  return {
    clock,
    stop() {
      clearInterval(timer);
      save();
    },
  };
}
