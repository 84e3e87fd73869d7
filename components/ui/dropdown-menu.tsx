'use client';

import { DropdownMenu as Radix } from 'radix-ui';
import Link from 'next/link';
import type { ReactNode } from 'react';
import { classNames } from './class-names';

const itemClasses =
  'flex min-h-9 w-full items-center gap-2 rounded-md px-2.5 py-1.5 text-base outline-none pointer-coarse:min-h-11 data-[highlighted]:bg-hover data-[disabled]:opacity-50 [&_svg]:size-4 [&_svg]:text-ink-3';

/** A list of actions behind a button. The trigger is any button; items are `MenuItem`, `MenuLink`, `MenuCheck`. */
export function DropdownMenu({
  trigger,
  align = 'end',
  side,
  label,
  children,
}: {
  trigger: ReactNode;
  align?: 'start' | 'center' | 'end';
  side?: 'top' | 'right' | 'bottom' | 'left';
  label?: string;
  children: ReactNode;
}) {
  return (
    <Radix.Root>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          align={align}
          side={side}
          sideOffset={6}
          collisionPadding={8}
          aria-label={label}
          className="z-50 max-h-[min(70dvh,var(--radix-dropdown-menu-content-available-height))] min-w-48 overflow-y-auto rounded-lg border border-edge bg-card p-1 text-ink"
        >
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

export function MenuItem({
  icon,
  danger,
  disabled,
  onSelect,
  children,
}: {
  icon?: ReactNode;
  danger?: boolean;
  disabled?: boolean;
  onSelect: () => void;
  children: ReactNode;
}) {
  return (
    <Radix.Item
      disabled={disabled}
      onSelect={onSelect}
      className={classNames(itemClasses, danger && 'text-alarm [&_svg]:text-alarm')}
    >
      {icon}
      {children}
    </Radix.Item>
  );
}

export function MenuLink({ href, icon, children }: { href: string; icon?: ReactNode; children: ReactNode }) {
  return (
    <Radix.Item asChild>
      <Link href={href} className={itemClasses}>
        {icon}
        {children}
      </Link>
    </Radix.Item>
  );
}

/** An item that is on or off; the menu stays open, so that several can be changed in one go. */
export function MenuCheck({
  checked,
  onCheckedChange,
  disabled,
  children,
}: {
  checked: boolean;
  onCheckedChange: (checked: boolean) => void;
  disabled?: boolean;
  children: ReactNode;
}) {
  return (
    <Radix.CheckboxItem
      checked={checked}
      disabled={disabled}
      onCheckedChange={onCheckedChange}
      onSelect={(event) => event.preventDefault()}
      className={itemClasses}
    >
      <span
        aria-hidden
        className="grid size-4 place-items-center rounded-sm border border-edge text-tick font-bold text-ink"
      >
        {checked ? '✓' : ''}
      </span>
      {children}
    </Radix.CheckboxItem>
  );
}

export function MenuLabel({ children }: { children: ReactNode }) {
  return <Radix.Label className="px-2.5 pt-2 pb-1 text-sm text-ink-3">{children}</Radix.Label>;
}

export function MenuSeparator() {
  return <Radix.Separator className="my-1 h-px bg-rule" />;
}
