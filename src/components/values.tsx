import type { UnitSystem } from '../../shared/units/units.ts';
import { quantityText, type Quantity as QuantityKind } from '../lib/quantities.ts';
import { useUnits } from '../lib/session/session.ts';
import { clockTime, dateTime, type Reader } from '../lib/time.ts';

interface LocalTimeProps {
  /** UTC instant, ISO 8601. */
  instant: string;
  reader: Reader;
  /** `clock` for a moment of the morning in view, `date` for anything that may lie outside. */
  as?: 'clock' | 'date';
}

/** An instant in the farm's own time, as the person writes times. */
export const LocalTime = ({ instant, reader, as = 'clock' }: LocalTimeProps) => <time dateTime={instant}>{as === 'clock' ? clockTime(instant, reader) : dateTime(instant, reader)}</time>;

interface QuantityProps {
  /** In SI (m/s, °C, ha, L, L/ha, m, mm); null when not known. */
  value: number | null;
  of: QuantityKind;
  /** Left out: the person's own choice. */
  units?: UnitSystem;
}

/** A stored figure with its unit, in the person's units; figure and unit stay on one line. */
export function Quantity({ value, of, units }: QuantityProps) {
  const own = useUnits();
  return <span className="whitespace-nowrap tabular-nums">{quantityText(value, of, units ?? own)}</span>;
}
