'use client';

import { LogOut, Menu } from 'lucide-react';
import Link from 'next/link';
import { useState, type ReactNode } from 'react';
import { ShareStrip } from '@/components/drawings/share-strip';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { Sheet } from '@/components/ui/sheet';
import { ThemeSwitch } from '@/components/ui/theme-switch';
import type { ShellItem, ShellProps } from './shell-types';

const barItem =
  'relative flex min-h-14 flex-1 flex-col items-center justify-center gap-0.5 px-1 text-sm leading-4 focus-visible:-outline-offset-2 [&_svg]:size-5';

/** The foot of a phone: the four places of the person's role, and everything else behind "More". */
export function PhoneBar({ items, projects, workspaces, user, onSignOut }: ShellProps) {
  const [open, setOpen] = useState(false);
  const inBar = items.filter((item) => item.onPhone).slice(0, 4);
  const others = items.filter((item) => !inBar.includes(item));
  const elsewhere = others.some((item) => item.active) || projects.some((project) => project.active);
  const close = () => setOpen(false);

  return (
    <nav
      aria-label="Places on a phone"
      className="fixed inset-x-0 bottom-0 z-30 flex border-t border-rail-2 bg-rail pb-[env(safe-area-inset-bottom)] text-rail-ink-2 md:hidden print:hidden [&_:focus-visible]:outline-rail-ember"
    >
      {inBar.map((item) => (
        <Link
          key={item.href}
          href={item.href}
          aria-current={item.active ? 'page' : undefined}
          className={classNames(barItem, item.active && 'font-semibold text-rail-ink')}
        >
          {item.active ? (
            <span aria-hidden className="absolute inset-x-3 top-0 h-[3px] rounded-full bg-rail-ember" />
          ) : null}
          <span className="relative">
            {item.icon}
            {item.count ? (
              <span className="absolute -top-1.5 left-3.5 min-w-4 rounded-full bg-rail px-1 font-mono text-tick leading-4 text-rail-ember">
                {item.count}
              </span>
            ) : null}
          </span>
          {item.label}
        </Link>
      ))}
      <button
        type="button"
        onClick={() => setOpen(true)}
        className={classNames(barItem, elsewhere && 'font-semibold text-rail-ink')}
      >
        <Menu aria-hidden />
        More
      </button>
      <Sheet open={open} onOpenChange={setOpen} title={user.name} description={user.email}>
        <MoreList title="Places">
          {others.map((item) => (
            <MoreLink key={item.href} item={item} onGo={close} />
          ))}
        </MoreList>
        {projects.length > 0 ? (
          <MoreList title="Joint projects">
            {projects.map((project) => (
              <li key={project.href}>
                <Link
                  href={project.href}
                  onClick={close}
                  className="flex min-h-12 items-center gap-3 text-lg"
                >
                  <span className="w-12 shrink-0">
                    <ShareStrip shares={project.shares} label="Parts" />
                  </span>
                  {project.name}
                </Link>
              </li>
            ))}
          </MoreList>
        ) : null}
        {workspaces.length > 1 ? (
          <MoreList title="Workspaces">
            {workspaces.map((workspace) => (
              <li key={workspace.href}>
                <Link
                  href={workspace.href}
                  onClick={close}
                  className="flex min-h-12 flex-col justify-center text-lg"
                >
                  {workspace.name}
                  <span className="text-sm text-ink-3">
                    {workspace.role}
                    {workspace.current ? ', current' : ''}
                  </span>
                </Link>
              </li>
            ))}
          </MoreList>
        ) : null}
        <div className="mt-5 flex flex-wrap items-center justify-between gap-3 border-t border-rule pt-4">
          <ThemeSwitch />
          <div className="flex gap-2">
            {user.accountHref ? (
              <Button asChild>
                <Link href={user.accountHref} onClick={close}>
                  Account
                </Link>
              </Button>
            ) : null}
            <Button icon={<LogOut aria-hidden />} onClick={onSignOut}>
              Sign out
            </Button>
          </div>
        </div>
      </Sheet>
    </nav>
  );
}

function MoreList({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="mt-3 first:mt-0">
      <h3 className="font-sans text-sm font-normal text-ink-3">{title}</h3>
      <ul className="divide-y divide-rule-2">{children}</ul>
    </section>
  );
}

function MoreLink({ item, onGo }: { item: ShellItem; onGo: () => void }) {
  return (
    <li>
      <Link
        href={item.href}
        onClick={onGo}
        aria-current={item.active ? 'page' : undefined}
        className={classNames(
          'flex min-h-12 items-center gap-3 text-lg [&_svg]:size-5 [&_svg]:text-ink-3',
          item.active && 'font-semibold',
        )}
      >
        {item.icon}
        <span className="flex-1">{item.label}</span>
        {item.count ? <span className="font-mono text-base text-ember">{item.count}</span> : null}
      </Link>
    </li>
  );
}
