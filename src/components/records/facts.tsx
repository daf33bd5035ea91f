import type { ReactNode } from 'react';

export type Fact = [label: string, value: ReactNode];

/** What is known of one thing, label by label; what is empty is left out. */
export function Facts({ facts }: { facts: Fact[] }) {
  return (
    <dl className="grid gap-x-8 gap-y-3 sm:grid-cols-2">
      {facts
        .filter(([, value]) => value !== '' && value !== '—' && value !== null)
        .map(([label, value]) => (
          <div key={label}>
            <dt className="text-sm text-ink-soft">{label}</dt>
            <dd className="text-lg whitespace-pre-line">{value}</dd>
          </div>
        ))}
    </dl>
  );
}
