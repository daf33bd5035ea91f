import { useEffect, useRef } from 'react';
import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import { useT } from '../../lib/messages/use-t.ts';
import { clockTime, type Reader } from '../../lib/time.ts';
import type { Lane } from './geometry.ts';
import { standing, valueText } from './words.ts';

const rowEvery = 3;

/** The same morning as a table: a row every quarter of an hour. It takes the focus, so that a key leads straight into it. */
export function RibbonTable({ answer, lanes, reader }: { answer: AssessmentAnswer; lanes: Lane[]; reader: Reader }) {
  const t = useT();
  const region = useRef<HTMLDivElement>(null);
  useEffect(() => region.current?.focus({ preventScroll: true }), []);
  const rows = answer.steps.filter((_, index) => index % rowEvery === 0);
  return (
    <div ref={region} className="overflow-x-auto" tabIndex={0} role="region" aria-label={t('ribbon.table')}>
      <table className="w-full text-left text-sm">
        <thead>
          <tr>
            <th scope="col" className="sticky left-0 bg-paper py-2 pr-4">
              {t('ribbon.time')}
            </th>
            {lanes.map(({ limit }) => (
              <th key={limit} scope="col" className="py-2 pr-4">
                {t(`limit.${limit}`)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((step) => (
            <tr key={step.time} className="border-t border-ink/10">
              <th scope="row" className="sticky left-0 bg-paper py-1.5 pr-4">
                {clockTime(step.time, reader)}
              </th>
              {lanes.map(({ limit }) => {
                const at = step.limits[limit];
                return (
                  <td key={limit} className="py-1.5 pr-4 whitespace-nowrap">
                    {at && (
                      <>
                        {valueText(limit, at.value, reader.units, t)} <span className="block text-xs text-ink-soft">{standing(at, t)}</span>
                      </>
                    )}
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
