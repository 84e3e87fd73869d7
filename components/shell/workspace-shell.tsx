'use client';

import { Bug, Egg, FolderOpen, GitFork, Sprout } from 'lucide-react';
import { usePathname, useRouter } from 'next/navigation';
import type { ReactNode } from 'react';
import { auth } from '@/lib/client/auth';
import { useWorkspace } from '@/lib/client/workspace';
import type { Action } from '@/lib/contracts/actions';
import { AppShell } from './app-shell';

const places: { path: string; label: string; icon: ReactNode; needs: Action; onPhone?: boolean }[] = [
  { path: 'season', label: 'Season', icon: <Sprout />, needs: 'pairing.see', onPhone: true },
  { path: 'collection', label: 'Collection', icon: <Bug />, needs: 'animal.see', onPhone: true },
  { path: 'clutches', label: 'Clutches', icon: <Egg />, needs: 'clutch.see', onPhone: true },
  { path: 'collection/lineage', label: 'Lineage', icon: <GitFork />, needs: 'animal.see', onPhone: true },
  { path: 'projects', label: 'Joint projects', icon: <FolderOpen />, needs: 'project.see' },
];

/** The frame around every page of a workspace: the places that the person's role has, their projects and themselves. */
export function WorkspaceShell({ children }: { children: ReactNode }) {
  const workspace = useWorkspace();
  const path = usePathname();
  const router = useRouter();
  const base = `/${workspace.slug}`;
  const parties = new Map(workspace.parties.map((party) => [party.id, party]));
  const shown = places.filter(({ needs }) => workspace.actions.includes(needs));
  // The longest matching address is the place that one is in.
  const active = shown
    .filter((place) => path === `${base}/${place.path}` || path.startsWith(`${base}/${place.path}/`))
    .sort((a, b) => b.path.length - a.path.length)[0];
  return (
    <AppShell
      homeHref={base}
      items={shown.map((place) => ({
        href: `${base}/${place.path}`,
        label: place.label,
        icon: place.icon,
        active: place === active,
        onPhone: place.onPhone,
      }))}
      projects={workspace.projects.map((project) => ({
        href: `${base}/projects/${project.id}`,
        name: project.name,
        active: path.startsWith(`${base}/projects/${project.id}`),
        shares: project.parties.map(({ partyId }) => ({
          partner: parties.get(partyId)?.mark ?? 0,
          name: parties.get(partyId)?.name ?? '',
          parts: 1,
        })),
      }))}
      workspaces={workspace.workspaces.map(({ slug, name, role }) => ({
        href: `/${slug}`,
        name,
        role,
        current: slug === workspace.slug,
      }))}
      user={{ name: workspace.me.name, email: workspace.me.email }}
      onSignOut={async () => {
        await auth.signOut();
        router.replace('/sign-in');
        router.refresh();
      }}
    >
      {children}
    </AppShell>
  );
}
