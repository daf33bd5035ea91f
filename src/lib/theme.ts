import type { SunTimes } from '../../shared/sun/sun.ts';

/** Light or dark, kept on this device; `sun` is dark from sunset to sunrise where the device was when it was chosen. */
export type ThemeChoice = 'light' | 'dark' | 'system' | 'sun';

export interface Place {
  latitude: number;
  longitude: number;
}

const storageKeys = { theme: 'dawnvane-theme', place: 'dawnvane-place', sun: 'dawnvane-sun' } as const;
const listeners = new Set<() => void>();
const darkDevice = () => window.matchMedia('(prefers-color-scheme: dark)');

/** Storage may be shut off; the choice then lasts as long as the page. */
const unkept = new Map<string, string>();

function read(key: string): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    return unkept.get(key) ?? null;
  }
}

function keep(key: string, value: string): void {
  try {
    localStorage.setItem(key, value);
  } catch {
    unkept.set(key, value);
  }
}

export function readTheme(): ThemeChoice {
  const stored = read(storageKeys.theme);
  return stored === 'light' || stored === 'dark' || stored === 'sun' ? stored : 'system';
}

/** Whether it is night by the sun, and until when that holds. */
export interface SunState {
  dark: boolean;
  untilMs: number;
}

const dayMs = 86_400_000;

/** @param day sun times of the solar day around `nowMs` @param next those of the day after */
export function sunState(nowMs: number, day: SunTimes, next: SunTimes): SunState {
  const { sunriseMs, sunsetMs } = day;
  // Polar day or night: look again tomorrow.
  if (sunriseMs === null || sunsetMs === null) return { dark: false, untilMs: nowMs + dayMs };
  if (nowMs < sunriseMs) return { dark: true, untilMs: sunriseMs };
  if (nowMs < sunsetMs) return { dark: false, untilMs: sunsetMs };
  return { dark: true, untilMs: next.sunriseMs ?? nowMs + dayMs };
}

function readJson<Kept>(key: string): Kept | null {
  try {
    return JSON.parse(read(key) ?? 'null') as Kept | null;
  } catch {
    return null;
  }
}

const longestWaitMs = 3_600_000;
let nextLook: ReturnType<typeof setTimeout> | undefined;

/** Works the sun out anew; its formulas are loaded only for those who chose it. */
async function followSun(): Promise<void> {
  const place = readJson<Place>(storageKeys.place);
  if (!place || readTheme() !== 'sun') return;
  const nowMs = Date.now();
  const { sunTimesNear } = await import('../../shared/sun/sun.ts');
  const noonMs = nowMs - ((nowMs + place.longitude * (dayMs / 360)) % dayMs) + dayMs / 2;
  const state = sunState(nowMs, sunTimesNear(noonMs, place.latitude, place.longitude), sunTimesNear(noonMs + dayMs, place.latitude, place.longitude));
  keep(storageKeys.sun, JSON.stringify(state));
  show();
  clearTimeout(nextLook);
  nextLook = setTimeout(() => void followSun(), Math.min(longestWaitMs, Math.max(1000, state.untilMs - nowMs)));
}

const isDark: Record<ThemeChoice, () => boolean> = {
  light: () => false,
  dark: () => true,
  system: () => darkDevice().matches,
  // What was found last stands until the sun is worked out, so that the page does not flash.
  sun: () => readJson<SunState>(storageKeys.sun)?.dark ?? darkDevice().matches,
};

function show(): void {
  document.documentElement.dataset['theme'] = isDark[readTheme()]() ? 'dark' : 'light';
}

/** Puts the choice into effect. */
export function applyTheme(): void {
  show();
  void followSun();
}

/** @param place where the sun is followed; only for `sun` */
export function setTheme(choice: ThemeChoice, place?: Place): void {
  if (place) keep(storageKeys.place, JSON.stringify(place));
  keep(storageKeys.theme, choice);
  applyTheme();
  listeners.forEach((changed) => changed());
}

export function subscribeTheme(changed: () => void): () => void {
  listeners.add(changed);
  const device = darkDevice();
  device.addEventListener('change', show);
  return () => {
    listeners.delete(changed);
    device.removeEventListener('change', show);
  };
}
