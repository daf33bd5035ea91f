import { NavLink } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';
import { useFarm, useMay } from '../../../lib/session/session.ts';

/** The three pages about notices. */
export function NoticeTabs() {
  const { id: farmId } = useFarm();
  const may = useMay();
  const tabs: [string, string][] = [
    [paths.notices(farmId), 'Told'],
    [paths.devices(farmId), 'Your devices'],
    ...(may('read', 'webhook') ? [[paths.hooks(farmId), 'Webhooks'] as [string, string]] : []),
  ];
  return (
    <nav aria-label="Notices" className="mb-4 flex gap-1 border-b border-ink/20">
      {tabs.map(([to, name]) => (
        <NavLink key={to} to={to} end className="inline-flex min-h-touch items-center border-b-4 border-transparent px-3 aria-[current=page]:border-needle aria-[current=page]:font-semibold">
          {name}
        </NavLink>
      ))}
    </nav>
  );
}
