import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Link, NavLink, Outlet, ScrollRestoration, useNavigate } from 'react-router-dom';
import { roleNames } from '../../../shared/api/roles';
import type { User } from '../../../shared/api/session';
import { sessionQuery, signOut } from '../../api/session';
import { Menu, MenuItem, MenuLabel } from '../../components/menu';
import { Wordmark } from '../../components/wordmark';
import { classNames } from '../../lib/class-names';
import { paths } from '../../lib/paths';

function initialsOf(name: string): string {
  const words = name.split(/\s+/).filter(Boolean);
  return [words[0], words.length > 1 ? words[words.length - 1] : '']
    .map((word) => word?.charAt(0) ?? '')
    .join('');
}

function NavItem({ to, children }: { to: string; children: string }) {
  return (
    <NavLink
      to={to}
      className={({ isActive }) =>
        classNames(
          'flex h-full items-center border-b-[3px] border-transparent px-1 text-section',
          isActive ? 'border-b-teal font-semibold text-ink' : 'text-ink-2 hover:text-ink',
        )
      }
    >
      {children}
    </NavLink>
  );
}

function PersonMenu({ user }: { user: User }) {
  const navigate = useNavigate();
  const queryClient = useQueryClient();
  const leave = async (): Promise<void> => {
    await signOut();
    queryClient.clear();
    await navigate(paths.signIn());
  };
  return (
    <Menu
      label={`${user.name}, ${roleNames[user.role]}`}
      trigger={
        <span className="grid size-8 place-items-center rounded-full border border-edge text-caption font-semibold">
          {initialsOf(user.name)}
        </span>
      }
    >
      <MenuLabel>
        <span className="block font-semibold text-ink">{user.name}</span>
        <span className="block text-dense text-ink-3">
          {roleNames[user.role]}, {user.department}
        </span>
      </MenuLabel>
      <MenuItem onSelect={() => void leave()}>Sign out</MenuItem>
    </Menu>
  );
}

/** Header, page, and the caution that stays at the foot of every page. */
export function AppLayout() {
  const { data: user } = useQuery(sessionQuery);
  if (!user) return null;
  return (
    <div className="flex min-h-dvh flex-col">
      <a
        href="#page"
        className="sr-only focus:not-sr-only focus:absolute focus:left-4 focus:top-2 focus:z-50 focus:bg-sheet focus:px-3 focus:py-2"
      >
        Skip to the page
      </a>
      <header className="flex h-13 shrink-0 items-center gap-4 border-b border-rule-strong px-4 tablet:gap-10 tablet:px-6">
        <Link to={paths.strips()} aria-label="Paceloom, strips">
          <Wordmark />
        </Link>
        <nav
          aria-label="Main"
          className="flex h-full min-w-0 items-stretch gap-3 overflow-x-auto tablet:gap-6"
        >
          {user.role !== 'learner' && <NavItem to={paths.strips()}>Strips</NavItem>}
          <NavItem to={paths.recorder()}>Recorder</NavItem>
          {user.role !== 'learner' && <NavItem to={paths.exports()}>Exports</NavItem>}
          <NavItem to={paths.help()}>Help</NavItem>
        </nav>
        <div className="ml-auto flex items-center gap-3">
          <span className="hidden text-dense text-ink-3 desk:inline">{user.organisation}</span>
          <PersonMenu user={user} />
        </div>
      </header>
      <div id="page" className="flex min-h-0 grow flex-col">
        <Outlet />
      </div>
      <footer className="flex shrink-0 items-center border-t border-rule px-4 py-1.5 text-caption text-ink-3 tablet:px-6">
        For education only. Synthetic teaching strips, not patient recordings. Not for diagnosis, monitoring,
        device programming or treatment.
      </footer>
      <ScrollRestoration />
    </div>
  );
}
