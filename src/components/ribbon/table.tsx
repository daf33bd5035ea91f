import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import { clockTime } from '../../lib/time.ts';
import type { Lane } from './geometry.ts';
import { limitWord, standing, valueText } from './words.ts';

const rowEvery = 3;

/** The same morning as a table: a row every quarter of an hour. */
export function RibbonTable({ answer, lanes, timeZone, units }: { answer: AssessmentAnswer; lanes: Lane[]; timeZone: string; units: UnitSystem }) {
  const rows = answer.steps.filter((_, index) => index % rowEvery === 0);
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="The morning as a table">
      <table className="w-full text-left text-sm tabular-nums">
        <thead>
          <tr>
            <th scope="col" className="py-2 pr-4">
              Time
            </th>
            {lanes.map(({ limit }) => (
              <th key={limit} scope="col" className="py-2 pr-4">
                {limitWord[limit]}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((step) => (
            <tr key={step.time} className="border-t border-ink/10">
              <th scope="row" className="py-1.5 pr-4">
                {clockTime(step.time, { units, timeZone })}
              </th>
              {lanes.map(({ limit }) => {
                const at = step.limits[limit]!;
                return (
                  <td key={limit} className="py-1.5 pr-4">
                    {valueText(limit, at.value, units)} <span className="block text-xs text-ink-soft">{standing(at)}</span>
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
