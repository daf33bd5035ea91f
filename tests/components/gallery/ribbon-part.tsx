import { useSearchParams } from 'react-router-dom';
import { MiniRibbon } from '../../../src/components/index.ts';
import { HeadroomRibbon } from '../../../src/components/ribbon/headroom-ribbon.tsx';
import { morningAnswer, smallRibbonOf, type MorningName } from '../support/mornings.ts';

/** One morning as a ribbon, and every morning as a small one. */
export function RibbonPart() {
  const [search] = useSearchParams();
  const morning = (search.get('morning') ?? 'go') as MorningName;
  const units = search.get('units') === 'metric' ? 'metric' : 'us';
  return (
    <>
      <HeadroomRibbon answer={morningAnswer(morning)} timeZone="America/Los_Angeles" minutesNeeded={42} units={units} />
      <ol className="mt-8 grid grid-cols-4 gap-3">
        {(['go', 'hold', 'unknown', 'gusty'] as const).map((name) => (
          <li key={name}>
            {name}
            <MiniRibbon {...smallRibbonOf(morningAnswer(name))} className="h-9 w-full" />
          </li>
        ))}
      </ol>
    </>
  );
}
