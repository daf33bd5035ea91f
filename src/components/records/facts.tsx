import type { ReactNode } from 'react';

export type Fact = [label: string, value: ReactNode];

/** Longer values take the whole width. */
const longText = 34;

/** What is known of one thing, label by label; what is empty is left out. */
export function Facts({ facts }: { facts: Fact[] }) {
  return (
    <dl className="grid grid-cols-2 gap-x-6 gap-y-3 lg:grid-cols-3">
      {facts
        .filter(([, value]) => value !== '' && value !== '—' && value !== null)
        .map(([label, value]) => (
          <div key={label} className={typeof value === 'string' && value.length > longText ? 'col-span-full' : ''}>
            <dt className="text-sm text-ink-soft">{label}</dt>
            <dd className="text-lg whitespace-pre-line">{value}</dd>
          </div>
        ))}
    </dl>
  );
}
