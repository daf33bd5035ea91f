import { useQuery } from '@tanstack/react-query';
import { NavLink } from 'react-router-dom';
import { useUnits } from '../../../lib/session/session.ts';
import { paths } from '../../../lib/paths.ts';
import { clockTime, dateOf, shortDate } from '../../../lib/time.ts';
import { demoClockQuery } from '../api/demo.ts';
import { StepButtons } from './step-buttons.tsx';

const pages: [string, string][] = [
  [paths.demoPhone(), 'Phone'],
  [paths.demoMailbox(), 'Mail'],
  [paths.demoHooks(), 'Hooks'],
];

const look = 'inline-flex min-h-touch items-center px-2.5 whitespace-nowrap aria-[current=page]:font-bold aria-[current=page]:underline';

/** The strip over every page of the demo: what time it is there, the next step, and where notices arrive. */
export function DemoBar() {
  const { data: clock } = useQuery(demoClockQuery);
  const units = useUnits();
  return (
    <div className="bg-[#1e2440] text-[#fbf7ee]">
      <nav aria-label="Demo" className="mx-auto flex max-w-6xl items-center overflow-x-auto px-1 text-sm md:px-3">
        <NavLink to={paths.demoClock()} className={look}>
          <span className="sr-only">Demo clock </span>
          {clock ? (
            <>
              <span className="hidden md:inline">{shortDate(dateOf(clock.now, clock.timeZone))},&nbsp;</span>
              {clockTime(clock.now, { units, timeZone: clock.timeZone })}
            </>
          ) : (
            'starting'
          )}
        </NavLink>
        {clock && <StepButtons clock={clock} only={1} />}
        <span className="ml-auto flex">
          {pages.map(([to, name]) => (
            <NavLink key={to} to={to} className={look}>
              {name}
            </NavLink>
          ))}
        </span>
      </nav>
    </div>
  );
}
