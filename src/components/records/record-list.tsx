import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';

export interface RecordRow {
  id: string;
  to: string;
  name: string;
  /** The two or three facts one looks for in a list. */
  about: string;
  /** A word set apart, such as a state. */
  mark?: ReactNode;
}

/** A list of things, each a wide target that opens it. */
export function RecordList({ rows }: { rows: RecordRow[] }) {
  return (
    <ul className="-mx-2 divide-y divide-ink/10">
      {rows.map(({ id, to, name, about, mark }) => (
        <li key={id}>
          <Link to={to} className="flex min-h-touch items-center justify-between gap-4 rounded px-2 py-3 hover:bg-paper-sunk">
            <span>
              <span className="block font-semibold">{name}</span>
              <span className="block text-sm text-ink-soft">{about}</span>
            </span>
            {mark}
          </Link>
        </li>
      ))}
    </ul>
  );
}
