import { useSyncExternalStore } from 'react';

export const themeChoices = ['system', 'light', 'dark'] as const;
export type ThemeChoice = (typeof themeChoices)[number];

const storageKey = 'fretline-theme';
const listeners = new Set<() => void>();
const systemDark = () => window.matchMedia('(prefers-color-scheme: dark)');

let choice: ThemeChoice = 'system';

/** Sets `data-theme` before the first paint and follows the system while that is the choice. */
export function startTheme(): void {
  choice = remembered();
  apply();
  systemDark().addEventListener('change', apply);
}

export function chooseTheme(next: ThemeChoice): void {
  choice = next;
  try {
    localStorage.setItem(storageKey, next);
  } catch {
    // Storage can be switched off: the choice then lasts until the page is left.
  }
  apply();
  for (const listener of listeners) listener();
}

export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => choice,
  );
}

function apply(): void {
  const dark = choice === 'dark' || (choice === 'system' && systemDark().matches);
  document.documentElement.dataset['theme'] = dark ? 'dark' : 'light';
}

function remembered(): ThemeChoice {
  try {
    const stored = localStorage.getItem(storageKey);
    return themeChoices.find((known) => known === stored) ?? 'system';
  } catch {
    return 'system';
  }
}
