import { useEffect, useId, useRef, type ReactNode } from 'react';
import { Link, useLocation } from 'react-router-dom';
import { useT } from '../lib/messages/use-t.ts';

interface PageHeadingProps {
  title: string;
  /** A few words above the title. */
  over?: string;
  /** Address and name of the page above. */
  up?: [to: string, name: string];
  /** A low heading, where the answer below it is what matters. */
  low?: boolean;
  /** Actions beside the title. */
  children?: ReactNode;
}

/** The heading of a page: names the browser's tab, and takes the focus when one arrives here. */
export function PageHeading({ title, over, up, low = false, children }: PageHeadingProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  const { key } = useLocation();
  useEffect(() => {
    document.title = `${title} – Dawnvane`;
    // The router calls the entry that the browser itself loaded `default`: there the reader begins at the top.
    if (key !== 'default') heading.current?.focus({ preventScroll: true });
  }, [title, key]);
  return (
    <header className={low ? 'mb-3' : 'mb-6'}>
      {up && (
        <Link to={up[0]} className="inline-flex min-h-touch items-center text-ink-soft underline decoration-ink/30 underline-offset-4">
          <span aria-hidden="true">←&nbsp;</span>
          {up[1]}
        </Link>
      )}
      <div className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div>
          {over && <p className="over">{over}</p>}
          <h1 ref={heading} tabIndex={-1} {...(low ? { className: 'text-lg' } : {})}>
            {title}
          </h1>
        </div>
        {children && <div className="flex flex-wrap gap-2">{children}</div>}
      </div>
    </header>
  );
}

interface PanelProps {
  title: string;
  actions?: ReactNode;
  children: ReactNode;
}

/** A part of a page under its own heading, set apart by a line as on paper. */
export function Panel({ title, actions, children }: PanelProps) {
  const id = useId();
  return (
    <section aria-labelledby={id} className="mb-8 border-t-2 border-ink/80 pt-3">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-3">
        <h2 id={id}>{title}</h2>
        {actions && <div className="flex flex-wrap gap-2">{actions}</div>}
      </div>
      {children}
    </section>
  );
}

/** Whose word is final: stands on every page. */
export function LastWord() {
  const t = useT();
  return <p className="text-sm text-ink-soft">{t('lastWord')}</p>;
}
