import type { AssessmentStep } from '../../../shared/assessment/answer.ts';
import type { UnitSystem } from '../../../shared/units/units.ts';
import { clockTime } from '../../lib/time.ts';
import type { Lane } from './geometry.ts';
import { limitWord, standing, valueText } from './words.ts';

interface ReadingProps {
  step: AssessmentStep;
  lanes: Lane[];
  timeZone: string;
  units: UnitSystem;
  binding: string | null;
}

/** What the time cursor reads: every limit at that moment. */
export function RibbonReading({ step, lanes, timeZone, units, binding }: ReadingProps) {
  return (
    <div className="ribbon-reading" aria-hidden="true">
      <p className="ribbon-clock">{clockTime(step.time, { units, timeZone })}</p>
      <dl>
        {lanes.map(({ limit }) => {
          const at = step.limits[limit];
          if (!at) return null;
          return (
            <div key={limit} className="flex items-baseline justify-between gap-3 border-t border-ink/10 py-1.5">
              <dt className={limit === binding ? 'font-bold' : ''}>{limitWord[limit]}</dt>
              <dd className="text-right tabular-nums">
                {valueText(limit, at.value, units)}
                <span className="block text-sm text-ink-soft">{standing(at)}</span>
              </dd>
            </div>
          );
        })}
      </dl>
    </div>
  );
}
