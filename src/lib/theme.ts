/** Light or dark, kept on this device. */
export type ThemeChoice = 'light' | 'dark' | 'system';

const storageKey = 'dawnvane-theme';
const listeners = new Set<() => void>();
const darkDevice = () => window.matchMedia('(prefers-color-scheme: dark)');

export function readTheme(): ThemeChoice {
  const stored = localStorage.getItem(storageKey);
  return stored === 'light' || stored === 'dark' ? stored : 'system';
}

/** Puts the choice into effect. */
export function applyTheme(): void {
  const choice = readTheme();
  const dark = choice === 'dark' || (choice === 'system' && darkDevice().matches);
  document.documentElement.dataset['theme'] = dark ? 'dark' : 'light';
}

export function setTheme(choice: ThemeChoice): void {
  if (choice === 'system') localStorage.removeItem(storageKey);
  else localStorage.setItem(storageKey, choice);
  applyTheme();
  listeners.forEach((changed) => changed());
}

export function subscribeTheme(changed: () => void): () => void {
  listeners.add(changed);
  const device = darkDevice();
  device.addEventListener('change', applyTheme);
  return () => {
    listeners.delete(changed);
    device.removeEventListener('change', applyTheme);
  };
}
