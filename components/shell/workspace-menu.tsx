'use client';

import { Check, ChevronsUpDown, Warehouse } from 'lucide-react';
import { DropdownMenu, MenuLabel, MenuLink } from '@/components/ui/dropdown-menu';
import type { ShellWorkspace } from './shell-types';

/** Which workspace this is, and the way to the others. */
export function WorkspaceMenu({ workspaces }: { workspaces: readonly ShellWorkspace[] }) {
  const current = workspaces.find((workspace) => workspace.current) ?? workspaces[0];
  if (!current) return null;
  return (
    <DropdownMenu
      align="start"
      side="top"
      label="Workspaces"
      trigger={
        <button
          type="button"
          className="flex min-h-11 w-full items-center gap-2.5 rounded-lg px-2.5 py-1 text-left hover:bg-rail-2"
        >
          <Warehouse aria-hidden className="size-4.5 shrink-0 text-rail-ink-2" />
          <span className="min-w-0 flex-1">
            <span className="line-clamp-2 text-sm leading-4 font-semibold">{current.name}</span>
            <span className="block truncate text-sm leading-4 text-rail-ink-2">{current.role}</span>
          </span>
          <ChevronsUpDown aria-hidden className="size-4 shrink-0 text-rail-ink-2" />
        </button>
      }
    >
      <MenuLabel>Workspaces</MenuLabel>
      {workspaces.map((workspace) => (
        <MenuLink
          key={workspace.href}
          href={workspace.href}
          icon={workspace.current ? <Check aria-label="current" /> : <span className="w-4" />}
        >
          <span className="min-w-0">
            <span className="block truncate">{workspace.name}</span>
            <span className="block text-sm text-ink-3">{workspace.role}</span>
          </span>
        </MenuLink>
      ))}
    </DropdownMenu>
  );
}
