// Light, dark or as the system has it; the choice is kept in this browser, and public/theme.js applies it before the first paint.
import { useSyncExternalStore } from 'react';

export type ThemeChoice = 'system' | 'light' | 'dark';

const KEY = 'spragyard-theme';
const listeners = new Set<() => void>();

function stored(): ThemeChoice {
  try {
    const value = localStorage.getItem(KEY);
    return value === 'light' || value === 'dark' ? value : 'system';
  } catch {
    return 'system';
  }
}

const systemDark = (): MediaQueryList => matchMedia('(prefers-color-scheme: dark)');

function apply(choice: ThemeChoice): void {
  const dark = choice === 'system' ? systemDark().matches : choice === 'dark';
  document.documentElement.dataset.theme = dark ? 'dark' : 'light';
}

export function chooseTheme(choice: ThemeChoice): void {
  try {
    if (choice === 'system') localStorage.removeItem(KEY);
    else localStorage.setItem(KEY, choice);
  } catch {
    // Nothing can be kept in a private window; the choice still holds until the page is left.
  }
  apply(choice);
  for (const listener of listeners) listener();
}

/** Follows the system while nothing is chosen. Called once at the start. */
export function followSystemTheme(): void {
  systemDark().addEventListener('change', () => {
    if (stored() === 'system') apply('system');
  });
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

export const useThemeChoice = (): ThemeChoice => useSyncExternalStore(subscribe, stored);
