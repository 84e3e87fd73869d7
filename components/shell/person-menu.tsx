'use client';

import { LogOut, Monitor, Moon, Sun, UserRound } from 'lucide-react';
import { initialsOf } from '@/components/ui/avatar';
import { DropdownMenu, MenuItem, MenuLabel, MenuLink, MenuSeparator } from '@/components/ui/dropdown-menu';
import { useTheme } from '@/components/ui/theme-switch';
import type { ShellUser } from './shell-types';

const themes = [
  { value: 'system', label: 'Theme as the system', icon: Monitor },
  { value: 'light', label: 'Light theme', icon: Sun },
  { value: 'dark', label: 'Dark theme', icon: Moon },
] as const;

/** Who is signed in: account, theme, the way out. */
export function PersonMenu({ user, onSignOut }: { user: ShellUser; onSignOut: () => void }) {
  const [theme, setTheme] = useTheme();
  return (
    <DropdownMenu
      align="start"
      side="top"
      label="You"
      trigger={
        <button
          type="button"
          className="flex min-h-11 w-full items-center gap-2 rounded-lg px-2 py-1 text-left hover:bg-rail-2"
        >
          <span
            aria-hidden
            className="grid size-6 shrink-0 place-items-center rounded-full bg-rail-ink text-tick font-bold text-rail"
          >
            {initialsOf(user.name)}
          </span>
          <span className="min-w-0 flex-1 truncate text-base">{user.name}</span>
        </button>
      }
    >
      <MenuLabel>{user.email}</MenuLabel>
      {user.accountHref ? (
        <MenuLink href={user.accountHref} icon={<UserRound aria-hidden />}>
          Your account
        </MenuLink>
      ) : null}
      <MenuSeparator />
      {themes.map(({ value, label, icon: Icon }) => (
        <MenuItem key={value} icon={<Icon aria-hidden />} onSelect={() => setTheme(value)}>
          <span className="flex-1">{label}</span>
          {theme === value ? <span className="text-sm text-ink-3">in use</span> : null}
        </MenuItem>
      ))}
      <MenuSeparator />
      <MenuItem icon={<LogOut aria-hidden />} onSelect={onSignOut}>
        Sign out
      </MenuItem>
    </DropdownMenu>
  );
}
