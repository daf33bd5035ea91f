import type { AssessmentAnswer } from '../../../shared/assessment/answer.ts';
import { useT } from '../../lib/messages/use-t.ts';
import { clockTime, type Reader } from '../../lib/time.ts';
import type { Cursor } from './cursor.ts';
import type { Lane } from './geometry.ts';
import { knotText } from './words.ts';

interface KnotListProps {
  answer: AssessmentAnswer;
  lanes: Lane[];
  cursor: Cursor;
  reader: Reader;
}

/** Every knot of the morning by its time, named whether or not the drawing has room for it; a tap moves the cursor there. */
export function KnotList({ answer, lanes, cursor, reader }: KnotListProps) {
  const t = useT();
  const knots = lanes.flatMap(({ limit, knots }) => knots.map((knot) => ({ limit, knot }))).sort((one, two) => one.knot - two.knot);
  if (knots.length === 0) return null;
  return (
    <section aria-label={t('ribbon.knots')} className="mt-4">
      <p className="over mb-1">{t('ribbon.knots')}</p>
      <ol className="grid gap-x-8 sm:grid-cols-2">
        {knots.map(({ limit, knot }) => (
          <li key={`${limit}${knot}`} className="border-t border-ink/15">
            <button type="button" className="flex min-h-touch w-full items-center gap-3 text-left hover:bg-paper-sunk" onClick={() => cursor.move(knot)}>
              <span className="w-14 font-bold">{clockTime(answer.steps[knot]!.time, reader)}</span>
              {t('ribbon.knot', { limit: t(`limit.${limit}`), reason: knotText(limit, answer, knot, reader.units, t) })}
            </button>
          </li>
        ))}
      </ol>
    </section>
  );
}
