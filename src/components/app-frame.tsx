import type { ReactNode } from 'react';
import { NavLink, useLocation } from 'react-router-dom';
import { useT } from '../lib/messages/use-t.ts';
import { Icon, type IconName } from './icon.tsx';
import { LastWord } from './page.tsx';

export interface FrameLink {
  to: string;
  name: string;
  /** Stands with the name. */
  icon?: IconName;
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
  `frame-link ${isActive ? 'active font-bold' : 'text-ink-soft hover:text-ink'}`;

const PageLink = ({ to, name, icon, end }: FrameLink) => (
  <NavLink to={to} end={end ?? false} className={linkLook}>
    {icon && <Icon name={icon} />}
    <span className="frame-name">{name}</span>
  </NavLink>
);

/** Links that find no room in a phone's bar; it closes when one has arrived. */
function MoreLinks({ links }: { links: FrameLink[] }) {
  const t = useT();
  const { pathname } = useLocation();
  return (
    <details key={pathname} className="relative">
      <summary className="frame-link list-none text-ink-soft [&::-webkit-details-marker]:hidden">
        <Icon name="more" />
        <span className="frame-name">{t('frame.more')}</span>
      </summary>
      <ul className="frame-more">
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
  const t = useT();
  return (
    <>
      <a href="#main" className="sr-only focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:z-30 focus:bg-paper-raised focus:p-3">
        {t('frame.skip')}
      </a>
      {strip}
      <div className="mx-auto max-w-6xl md:grid md:grid-cols-[12rem_1fr] md:gap-10 md:px-6">
        {links.length > 0 && (
          <nav aria-label={t('frame.pages')} className="fixed inset-x-0 bottom-0 z-10 border-t border-ink/15 bg-paper-raised pb-[env(safe-area-inset-bottom)] md:sticky md:top-6 md:self-start md:border-0 md:bg-transparent md:pt-8">
            <p className="frame-place hidden md:block">{place ?? 'Dawnvane'}</p>
            <ul className="grid grid-flow-col auto-cols-fr md:block">
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
