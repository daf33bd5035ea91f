import { useState, useSyncExternalStore } from 'react';
import { useT } from '../lib/messages/use-t.ts';
import { readTheme, setTheme, subscribeTheme, type Place, type ThemeChoice } from '../lib/theme.ts';
import { SegmentedControl } from './segmented-control.tsx';

/** Light, dark for before sunrise, by the sun, or as the device has it. By the sun needs to know where: the farm, else the device. */
export function ThemeToggle({ place }: { place?: Place }) {
  const t = useT();
  const [noPlace, setNoPlace] = useState(false);
  const theme = useSyncExternalStore(subscribeTheme, readTheme, () => 'system' as const);

  function choose(choice: ThemeChoice) {
    setNoPlace(false);
    if (choice !== 'sun') return setTheme(choice);
    if (place) return setTheme('sun', place);
    if (!('geolocation' in navigator)) return setNoPlace(true);
    navigator.geolocation.getCurrentPosition(
      ({ coords }) => setTheme('sun', { latitude: coords.latitude, longitude: coords.longitude }),
      () => setNoPlace(true),
    );
  }

  const options = (['light', 'dark', 'sun', 'system'] as const).map((choice) => [choice, t(`theme.${choice}`)] as const);
  return (
    <div>
      <SegmentedControl legend={t('theme.legend')} value={theme} onChange={choose} options={options} />
      {noPlace && (
        <p role="alert" className="mt-2">
          {t('theme.noPlace')}
        </p>
      )}
    </div>
  );
}
