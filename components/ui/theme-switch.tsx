'use client';

import { Monitor, Moon, Sun } from 'lucide-react';
import { useSyncExternalStore } from 'react';
import { classNames } from './class-names';

export type ThemeChoice = 'system' | 'light' | 'dark';

const KEY = 'moiety-theme';

function subscribe(changed: () => void): () => void {
  window.addEventListener('storage', changed);
  window.addEventListener(KEY, changed);
  return () => {
    window.removeEventListener('storage', changed);
    window.removeEventListener(KEY, changed);
  };
}

function readChoice(): ThemeChoice {
  try {
    const kept = localStorage.getItem(KEY);
    return kept === 'light' || kept === 'dark' ? kept : 'system';
  } catch {
    return 'system';
  }
}

/** The person's choice of theme and how to change it; kept on this device. The script in the head applies it. */
export function useTheme(): [ThemeChoice, (choice: ThemeChoice) => void] {
  const choice = useSyncExternalStore(subscribe, readChoice, () => 'system' as const);
  return [
    choice,
    (next) => {
      try {
        if (next === 'system') localStorage.removeItem(KEY);
        else localStorage.setItem(KEY, next);
      } catch {
        // Without storage the choice lasts as long as the system's own.
      }
      window.dispatchEvent(new Event(KEY));
    },
  ];
}

const choices = [
  { value: 'system', label: 'As the system', icon: Monitor },
  { value: 'light', label: 'Light', icon: Sun },
  { value: 'dark', label: 'Dark', icon: Moon },
] as const;

/** Three small buttons: as the system, light, dark. */
export function ThemeSwitch({ onRail = false }: { onRail?: boolean }) {
  const [choice, choose] = useTheme();
  return (
    <div
      role="group"
      aria-label="Theme"
      className={classNames(
        'inline-flex rounded-lg border p-0.5',
        onRail ? 'border-rail-2' : 'border-edge bg-card',
      )}
    >
      {choices.map(({ value, label, icon: Icon }) => (
        <button
          key={value}
          type="button"
          aria-pressed={choice === value}
          aria-label={label}
          title={label}
          onClick={() => choose(value)}
          className={classNames(
            'grid h-8 w-9 place-items-center rounded-md pointer-coarse:h-10 pointer-coarse:w-11',
            onRail
              ? 'text-rail-ink-2 hover:text-rail-ink aria-pressed:bg-rail-2 aria-pressed:text-rail-ink'
              : 'text-ink-3 hover:text-ink aria-pressed:bg-rule-2 aria-pressed:text-ink',
          )}
        >
          <Icon aria-hidden className="size-4" />
        </button>
      ))}
    </div>
  );
}
