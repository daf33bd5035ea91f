import { useSyncExternalStore } from 'react';
import { readTheme, setTheme, subscribeTheme, type ThemeChoice } from '../lib/theme.ts';

const choices: [ThemeChoice, string][] = [
  ['light', 'Light'],
  ['dark', 'Dark, for the field'],
  ['system', 'As this device'],
];

/** Light, dark for before sunrise, or as the device has it. */
export function ThemeToggle() {
  const theme = useSyncExternalStore(subscribeTheme, readTheme, () => 'system' as const);
  return (
    <fieldset>
      <legend className="mb-2 font-semibold">Light or dark</legend>
      <div className="flex flex-wrap gap-2">
        {choices.map(([value, name]) => (
          <label key={value} className="inline-flex min-h-touch cursor-pointer items-center gap-3 rounded-lg border-[1.5px] border-ink/25 px-4 has-checked:border-ink has-checked:bg-paper-sunk">
            <input type="radio" name="theme" value={value} checked={theme === value} onChange={() => setTheme(value)} className="size-5 accent-needle" />
            {name}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
