import { useSuspenseQuery } from '@tanstack/react-query';
import type { StationReading } from '../../../../shared/api/mornings.ts';
import { Button, EmptyState, useToast } from '../../../components/index.ts';
import { quantityText } from '../../../lib/quantities.ts';
import { useFarm, useMay, useReader } from '../../../lib/session/session.ts';
import { dateTime, type Reader } from '../../../lib/time.ts';
import { readingsQuery } from '../api/get-readings.ts';
import { useTakeBackReading } from '../api/change-readings.ts';
import { hangTestWords } from '../words.ts';

const shown = 6;

/** What one reading says, in a line. */
function readingText({ windMs, windHeightM, windFromDeg, temperatureC, relativeHumidityPct, hangTest, note }: StationReading, { units }: Reader): string {
  return [
    windMs !== null && `wind ${quantityText(windMs, 'speed', units)} at ${quantityText(windHeightM, 'height', units)}`,
    windFromDeg !== null && `from ${Math.round(windFromDeg)}°`,
    temperatureC !== null && quantityText(temperatureC, 'temperature', units),
    relativeHumidityPct !== null && `${Math.round(relativeHumidityPct)} % humidity`,
    hangTest !== null && `smoke: ${hangTestWords[hangTest].toLowerCase()}`,
    note,
  ]
    .filter(Boolean)
    .join(', ');
}

export function ReadingList() {
  const { id: farmId } = useFarm();
  const may = useMay();
  const reader = useReader();
  const toast = useToast();
  const { data: readings } = useSuspenseQuery(readingsQuery(farmId));
  const takeBack = useTakeBackReading(farmId);
  if (readings.length === 0) return <EmptyState>Nothing measured yet. From five wind readings on, Dawnvane learns how your ground differs from the forecast.</EmptyState>;
  return (
    <ul className="divide-y divide-ink/10">
      {readings.slice(0, shown).map((reading) => (
        <li key={reading.id} className="flex items-center justify-between gap-3 py-2">
          <span>
            <span className="block">{readingText(reading, reader)}</span>
            <span className="block text-sm text-ink-soft">
              {dateTime(reading.takenAt, reader)} · {reading.takenBy ?? reading.source}
            </span>
          </span>
          {may('archive', 'reading') && (
            <Button variant="link" busy={takeBack.isPending && takeBack.variables === reading.id} onClick={() => takeBack.mutate(reading.id, { onSuccess: () => toast('The reading is taken back.'), onError: (error) => toast(error.message) })}>
              Take back
            </Button>
          )}
        </li>
      ))}
    </ul>
  );
}
