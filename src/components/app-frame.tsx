import type { ReactNode } from 'react';
import { NavLink, useLocation } from 'react-router-dom';
import { LastWord } from './page.tsx';
import { VerdictSign } from './verdict-sign.tsx';

export interface FrameLink {
  to: string;
  name: string;
  /** The exact address only. */
  end?: boolean;
}

interface AppFrameProps {
  /** The pages within thumb's reach; the first four stand in the bar of a phone. */
  links: FrameLink[];
  /** Name of the farm, above the links on a wide screen. */
  place?: string;
  /** A strip above everything, such as the demo's. */
  strip?: ReactNode;
  children: ReactNode;
}

/** Pages in a phone's bar. */
const inBar = 4;

const linkLook = ({ isActive }: { isActive: boolean }): string =>
  `flex min-h-touch items-center justify-center px-2 text-center text-[0.95rem] md:justify-start md:rounded-lg md:px-3 ${isActive ? 'font-bold underline decoration-[3px] decoration-straw underline-offset-8' : 'text-ink-soft hover:text-ink'}`;

const PageLink = ({ to, name, end }: FrameLink) => (
  <NavLink to={to} end={end ?? false} className={linkLook}>
    {name}
  </NavLink>
);

/** Links that find no room in a phone's bar; it closes when one has arrived. */
function MoreLinks({ links }: { links: FrameLink[] }) {
  const { pathname } = useLocation();
  return (
    <details key={pathname} className="relative">
      <summary className="flex min-h-touch list-none items-center px-2 text-[0.95rem] text-ink-soft">More</summary>
      <ul className="absolute right-0 bottom-14 min-w-40 rounded-lg border border-ink/15 bg-paper-raised p-2 shadow-lg">
        {links.map((link) => (
          <li key={link.to}>
            <PageLink {...link} />
          </li>
        ))}
      </ul>
    </details>
  );
}

/** The frame of every page: links in a bar under the thumb on a phone, at the side on a wide screen. */
export function AppFrame({ links, place, strip, children }: AppFrameProps) {
  return (
    <>
      <a href="#main" className="sr-only focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:z-30 focus:bg-paper-raised focus:p-3">
        To the content
      </a>
      {strip}
      <div className="mx-auto max-w-6xl md:grid md:grid-cols-[12rem_1fr] md:gap-10 md:px-6">
        {links.length > 0 && (
          <nav aria-label="Pages" className="fixed inset-x-0 bottom-0 z-10 border-t border-ink/15 bg-paper-raised pb-[env(safe-area-inset-bottom)] md:sticky md:top-6 md:self-start md:border-0 md:bg-transparent md:pt-8">
            <p className="mb-4 hidden items-center gap-2 font-bold md:flex">
              <VerdictSign state="go" size={32} silent />
              {place ?? 'Dawnvane'}
            </p>
            <ul className="flex justify-around md:block">
              {links.map((link, index) => (
                <li key={link.to} className={index >= inBar ? 'hidden md:block' : ''}>
                  <PageLink {...link} />
                </li>
              ))}
              {links.length > inBar && (
                <li className="md:hidden">
                  <MoreLinks links={links.slice(inBar)} />
                </li>
              )}
            </ul>
          </nav>
        )}
        <div className={`px-4 pt-5 md:px-0 md:pt-8 ${links.length > 0 ? 'pb-28 md:pb-12' : 'pb-12 md:col-span-2'}`}>
          <main id="main">{children}</main>
          <footer className="mt-10 border-t border-ink/15 pt-4">
            <LastWord />
          </footer>
        </div>
      </div>
    </>
  );
}
