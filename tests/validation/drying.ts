import { isJudged, labelDay, type FoliageRow } from './foliage-fitting.ts';

const hourMs = 3_600_000;

export interface DryingMorning {
  day: number;
  observedMs: number;
  saidMs: number;
}

/** First instant at which a line through hourly values falls below `threshold`, epoch ms; null when it never does. */
function fallsBelow(hours: readonly FoliageRow[], valueOf: (row: FoliageRow) => number, threshold: number): number | null {
  for (const [index, row] of hours.entries()) {
    const value = valueOf(row);
    if (value >= threshold) continue;
    const before = hours[index - 1];
    if (!before) return row.hour.epochMs;
    const was = valueOf(before);
    return before.hour.epochMs + (hourMs * (was - threshold)) / (was - value);
  }
  return null;
}

/** Mornings wet at label 03 UTC that dry by 12 UTC: when the sensor fell below 50, and when the logit fell below 0. */
export function dryingMornings(said: readonly { row: FoliageRow; logit: number }[]): { mornings: DryingMorning[]; neverSaidDry: number } {
  const logits = new Map(said.map(({ row, logit }) => [row, logit]));
  const days = new Map<number, FoliageRow[]>();
  for (const { row } of said) {
    if (!isJudged(row.hour) && !(row.hour.endHourUtc > 10 && row.hour.endHourUtc <= 12)) continue;
    const day = labelDay(row.hour);
    days.set(day, [...(days.get(day) ?? []), row]);
  }
  const mornings: DryingMorning[] = [];
  let neverSaidDry = 0;
  for (const [day, rows] of days) {
    rows.sort((a, b) => a.hour.epochMs - b.hour.epochMs);
    if (rows.length < 10 || !rows[0]!.isWet) continue;
    const observedMs = fallsBelow(rows, ({ hour }) => hour.leafWetnessPct, 50);
    if (observedMs === null) continue;
    const saidMs = fallsBelow(rows, (row) => logits.get(row)!, 0);
    if (saidMs === null) neverSaidDry += 1;
    // Not dry by the end of the morning counts from there: the error is at least so large.
    mornings.push({ day, observedMs, saidMs: saidMs ?? rows.at(-1)!.hour.epochMs + hourMs });
  }
  return { mornings, neverSaidDry };
}
