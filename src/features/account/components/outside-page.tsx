import type { ReactNode } from 'react';
import { PageHeading } from '../../../components/index.ts';

/** A narrow page for whoever is not signed in. */
export function OutsidePage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <div className="mx-auto max-w-md">
      <PageHeading title={title} />
      <div className="space-y-4">{children}</div>
    </div>
  );
}
