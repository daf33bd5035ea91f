import { useSuspenseQuery } from '@tanstack/react-query';
import { Button, PageHeading, Panel, useToast } from '../../../components/index.ts';
import { useUnits } from '../../../lib/session/session.ts';
import { dateTime } from '../../../lib/time.ts';
import { demoClockQuery, useSetDemoClock, useSetDemoMood } from '../api/demo.ts';
import { stepWords } from '../steps.ts';

/** The demo's time: stepped forward, everything due until then happens. */
export function ClockPage() {
  const { data: clock } = useSuspenseQuery(demoClockQuery);
  const units = useUnits();
  const set = useSetDemoClock();
  const toast = useToast();
  const reader = { units, timeZone: clock.timeZone };
  return (
    <>
      <PageHeading title="Demo clock" over="Only in the demo" />
      <p className="answer mb-2">{dateTime(clock.now, reader)}</p>
      <p className="mb-6 text-ink-soft">{clock.timeZone.replaceAll('_', ' ')}. The clock runs on by itself; step it, and everything due until then happens at once: forecasts are fetched, verdicts told, notices sent.</p>
      <Panel title="Step on">
        <ol className="space-y-3">
          {clock.next.map(({ name, at }) => (
            <li key={name} className="flex flex-wrap items-center justify-between gap-3">
              <span>
                <span className="block font-semibold">
                  {stepWords[name].name}, {dateTime(at, reader)}
                </span>
                <span className="block text-ink-soft">{stepWords[name].hint}</span>
              </span>
              <Button busy={set.isPending && set.variables === at} onClick={() => set.mutate(at, { onError: (error) => toast(error.message) })}>
                Step there
              </Button>
            </li>
          ))}
        </ol>
      </Panel>
      <Panel title="Let the forecast fail">
        <Moods />
      </Panel>
    </>
  );
}

const moods = [
  ['ok', 'Answers well'],
  ['error500', 'Is broken (status 500)'],
  ['tooMany', 'Is asked too often (status 429)'],
  ['slow', 'Answers byte by byte'],
  ['cut', 'Cuts its answer short'],
  ['stale', 'Repeats an old forecast'],
] as const;
const providers = [
  ['openMeteo', 'Open-Meteo'],
  ['nws', 'US National Weather Service'],
  ['metNorway', 'MET Norway'],
] as const;

/** Makes a fake provider fail in one of the ways in which real ones do. */
function Moods() {
  const set = useSetDemoMood();
  const toast = useToast();
  return (
    <div className="space-y-3">
      <p className="text-ink-soft">Each provider is a fake that answers in the real one’s format. Let it fail, fetch the forecast on a morning’s page, and see what Dawnvane says.</p>
      {providers.map(([provider, name]) => (
        <label key={provider} className="flex flex-wrap items-center gap-3">
          <span className="w-64">{name}</span>
          <select className="min-h-touch rounded-lg border border-ink/25 bg-paper-raised px-3" defaultValue="ok" onChange={(event) => set.mutate({ provider, mood: moods.find(([mood]) => mood === event.target.value)![0] }, { onError: (error) => toast(error.message) })}>
            {moods.map(([mood, words]) => (
              <option key={mood} value={mood}>
                {words}
              </option>
            ))}
          </select>
        </label>
      ))}
    </div>
  );
}
