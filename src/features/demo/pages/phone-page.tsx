import { useSuspenseQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { PageHeading, VerdictSign } from '../../../components/index.ts';
import { useUnits } from '../../../lib/session/session.ts';
import { clockTime, dateOf, longDate, minutesBetween, span } from '../../../lib/time.ts';
import { demoClockQuery, demoPhoneQuery } from '../api/demo.ts';

/** The path of an address of ours: a tap opens it in this window. */
const pathOf = (url: string): string => {
  const { pathname, search } = new URL(url, location.origin);
  return pathname + search;
};

/** A phone's lock screen, with what was pushed to it. */
export function PhonePage() {
  const { data: pushes } = useSuspenseQuery(demoPhoneQuery);
  const { data: clock } = useSuspenseQuery(demoClockQuery);
  const units = useUnits();
  const reader = { units, timeZone: clock.timeZone };
  // The newest with a tag takes the place of those before it, as on a real lock screen.
  const newestFirst = [...pushes].sort((a, b) => Date.parse(b.receivedAt) - Date.parse(a.receivedAt));
  const shown = newestFirst.filter(({ tag }, index) => tag === null || newestFirst.findIndex((other) => other.tag === tag) === index);
  return (
    <>
      <PageHeading title="Demo phone" over="Only in the demo" />
      <div className="mx-auto flex h-[40rem] max-h-[80dvh] w-full max-w-[22rem] flex-col overflow-hidden rounded-[2.5rem] border-[10px] border-[#141931] bg-linear-to-b from-[#1e2440] via-[#5d5a86] to-[#c98f86] text-[#fbf7ee]">
        <p className="pt-8 text-center text-6xl font-light">{clockTime(clock.now, reader)}</p>
        <p className="mb-5 text-center">{longDate(dateOf(clock.now, clock.timeZone))}</p>
        <ul aria-label="Notices on the lock screen" className="min-h-0 flex-1 space-y-2 overflow-y-auto px-2 pb-4">
          {shown.length === 0 && <li className="rounded-2xl bg-[#141931]/60 p-4">Nothing yet. Step the demo clock to the evening or to dawn, and a notice comes in here.</li>}
          {shown.map(({ id, title, body, url, verdict, receivedAt, device }) => (
            <li key={id}>
              <Link to={pathOf(url)} className="flex gap-3 rounded-2xl bg-[#fbf7ee] p-3 text-[#23261f]">
                {verdict ? <VerdictSign state={verdict} size={40} silent /> : <VerdictSign state="unknown" size={40} silent />}
                <span className="min-w-0">
                  <span className="block font-bold">{title}</span>
                  <span className="block text-sm">{body}</span>
                  <span className="block text-xs text-[#55584d]">
                    {span(minutesBetween(receivedAt, clock.now))} ago · {device}
                  </span>
                </span>
              </Link>
            </li>
          ))}
        </ul>
      </div>
    </>
  );
}
