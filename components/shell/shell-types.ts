import type { ReactNode } from 'react';
import type { Share } from '@/components/drawings/share-strip';

export type ShellItem = {
  href: string;
  label: string;
  icon: ReactNode;
  /** What waits there for this person; nothing is shown for 0. */
  count?: number;
  active?: boolean;
  /** Stands in the bottom bar of a phone (the first four that say so). */
  onPhone?: boolean;
};

type ShellProject = { href: string; name: string; shares: readonly Share[]; active?: boolean };

export type ShellWorkspace = { href: string; name: string; role: string; current?: boolean };

export type ShellUser = { name: string; email: string; accountHref?: string };

export type ShellProps = {
  homeHref: string;
  items: readonly ShellItem[];
  projects: readonly ShellProject[];
  workspaces: readonly ShellWorkspace[];
  user: ShellUser;
  onSignOut: () => void;
};
