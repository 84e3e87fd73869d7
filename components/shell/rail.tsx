import Link from 'next/link';
import { classNames } from '@/components/ui/class-names';
import { Mark } from '@/components/drawings/mark';
import { ShareStrip } from '@/components/drawings/share-strip';
import { PersonMenu } from './person-menu';
import type { ShellItem, ShellProps } from './shell-types';
import { WorkspaceMenu } from './workspace-menu';

/** The rail of a wide screen: places, joint projects with their shares, workspace and person at the foot. */
export function Rail({ homeHref, items, projects, workspaces, user, onSignOut }: ShellProps) {
  return (
    <header className="sticky top-0 flex h-dvh flex-col bg-rail text-rail-ink max-md:hidden print:hidden [&_:focus-visible]:outline-rail-ember">
      <Link
        href={homeHref}
        className="flex items-center gap-2 px-5 pt-5 pb-4 font-display text-xl font-bold focus-visible:-outline-offset-4"
      >
        <Mark onRail /> Moiety
      </Link>
      <div className="min-h-0 flex-1 overflow-y-auto px-3 pb-4">
        <nav aria-label="Places">
          <ul className="flex flex-col gap-0.5">
            {items.map((item) => (
              <li key={item.href}>
                <PlaceLink item={item} />
              </li>
            ))}
          </ul>
        </nav>
        {projects.length > 0 ? (
          <nav aria-labelledby="rail-projects" className="mt-5">
            <h2
              id="rail-projects"
              className="px-2.5 pb-1 font-sans text-sm font-normal tracking-normal text-rail-ink-2 [font-stretch:100%]"
            >
              Joint projects
            </h2>
            <ul className="flex flex-col gap-0.5">
              {projects.map((project) => (
                <li key={project.href}>
                  <Link
                    href={project.href}
                    aria-current={project.active ? 'page' : undefined}
                    className={classNames(
                      'flex min-h-9 items-center gap-2.5 rounded-lg px-2.5 py-1.5 text-base hover:bg-rail-2 hover:text-rail-ink',
                      project.active ? 'bg-rail-2 font-semibold' : 'text-rail-ink-2',
                    )}
                  >
                    {/* Light colours in both themes: the rail is always dark. */}
                    <span className="dark w-9 shrink-0">
                      <ShareStrip shares={project.shares} size="sm" label="Parts" />
                    </span>
                    <span className="min-w-0 truncate">{project.name}</span>
                  </Link>
                </li>
              ))}
            </ul>
          </nav>
        ) : null}
      </div>
      <div className="flex flex-col gap-0.5 border-t border-rail-2 p-3">
        <WorkspaceMenu workspaces={workspaces} />
        <PersonMenu user={user} onSignOut={onSignOut} />
      </div>
    </header>
  );
}

function PlaceLink({ item }: { item: ShellItem }) {
  return (
    <Link
      href={item.href}
      aria-current={item.active ? 'page' : undefined}
      className={classNames(
        'relative flex min-h-9 items-center gap-2.5 rounded-lg px-2.5 text-base hover:bg-rail-2 hover:text-rail-ink [&_svg]:size-4.5',
        item.active ? 'bg-rail-2 font-semibold text-rail-ink' : 'text-rail-ink-2',
      )}
    >
      {item.active ? (
        <span aria-hidden className="absolute inset-y-1 -left-1 w-[3px] rounded-full bg-rail-ember" />
      ) : null}
      {item.icon}
      <span className="flex-1">{item.label}</span>
      {item.count ? (
        <span className="font-mono text-sm font-normal text-rail-ember">
          {item.count}
          <span className="sr-only"> waiting</span>
        </span>
      ) : null}
    </Link>
  );
}
