import { celsiusSpanToF, celsiusToF, metresToFeet, msToMph, type UnitSystem } from '../units/units.ts';
import { zoneOffsetMinutes } from '../units/time-zone.ts';
import type { LimitName } from './answer.ts';

export interface FormatOptions {
  units: UnitSystem;
  timeZone: string;
  /** Date of the morning, `YYYY-MM-DD`: times on other days are told with the day. */
  date: string;
}

/** Figures and clock times as people read them; words stay with the language. */
export interface Formats {
  units: UnitSystem;
  speed(ms: number): string;
  temperature(celsius: number): string;
  temperatureSpan(celsius: number): string;
  distance(metres: number): string;
  percent(share: number): string;
  hours(hours: number): string;
  /** Clock time, and whole days after the morning's date (0 = same day). */
  clock(iso: string): { text: string; daysLater: number };
  /** A limit's value or bound with its unit. */
  ofLimit(limit: LimitName, value: number | null): string;
}

const tidy = (value: number, digits: number): string => {
  const scale = 10 ** digits;
  const rounded = Math.round(value * scale) / scale;
  return String(rounded === 0 ? 0 : rounded);
};

/** Distances are no better known than this. */
const toNearest = (value: number, grain: number): number => Math.max(grain, Math.round(value / grain) * grain);

/** Makes the formats of one person: US units with a 12-hour clock, or metric with a 24-hour clock. */
export function formatsFor({ units, timeZone, date }: FormatOptions): Formats {
  const isUs = units === 'us';
  const midnightMs = Date.parse(`${date}T00:00:00Z`);
  const formats: Formats = {
    units,
    speed: (ms) => (isUs ? `${tidy(msToMph(ms), 1)} mph` : `${tidy(ms, 1)} m/s`),
    temperature: (celsius) => (isUs ? `${tidy(celsiusToF(celsius), 0)} °F` : `${tidy(celsius, 1)} °C`),
    temperatureSpan: (celsius) => (isUs ? `${tidy(celsiusSpanToF(celsius), 1)} °F` : `${tidy(celsius, 1)} °C`),
    distance: (metres) => (isUs ? `${toNearest(metresToFeet(metres), 10)} ft` : `${toNearest(metres, 5)} m`),
    percent: (share) => `${Math.round(share * 100)} %`,
    hours: (hours) => `${tidy(hours, 1)} h`,
    clock(iso) {
      const epochMs = Date.parse(iso);
      const minutes = Math.round((epochMs + zoneOffsetMinutes(epochMs, timeZone) * 60_000 - midnightMs) / 60_000);
      const daysLater = Math.floor(minutes / 1440);
      const ofDay = minutes - daysLater * 1440;
      const hour = Math.floor(ofDay / 60);
      const minute = String(ofDay % 60).padStart(2, '0');
      if (!isUs) return { text: `${String(hour).padStart(2, '0')}:${minute}`, daysLater };
      // The morning and its noon need no "am" or "pm"; everything else does need its half of the day.
      const half = ofDay === 720 && daysLater === 0 ? '' : hour >= 12 ? ' pm' : daysLater === 0 ? '' : ' am';
      return { text: `${hour % 12 === 0 ? 12 : hour % 12}:${minute}${half}`, daysLater };
    },
    ofLimit(limit, value) {
      if (value === null) return '–';
      switch (limit) {
        case 'wind':
        case 'gusts':
        case 'stillAir':
          return formats.speed(value);
        case 'temperature':
          return formats.temperature(value);
        case 'deltaT':
          return formats.temperatureSpan(value);
        case 'rainFree':
          return formats.hours(value);
        case 'towardSensitivePlace':
          return `${Math.round(value)}°`;
        default:
          return formats.percent(value);
      }
    },
  };
  return formats;
}
