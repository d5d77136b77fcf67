import { useSyncExternalStore } from 'react';

/** What a person can choose: the system's own look, or one of the two. */
export const themeChoices = ['system', 'light', 'dark'] as const;
export type ThemeChoice = (typeof themeChoices)[number];
export type Theme = 'light' | 'dark';

const storageKey = 'restpoint-theme';
const systemIsDark = matchMedia('(prefers-color-scheme: dark)');
const listeners = new Set<() => void>();

const readChoice = (): ThemeChoice => {
  try {
    const kept = localStorage.getItem(storageKey);
    return themeChoices.find((choice) => choice === kept) ?? 'system';
  } catch {
    // Storage refused by the browser's settings: the choice then lasts as long as the page.
    return 'system';
  }
};

let choice = readChoice();

/** The style sheet goes by this attribute; without it, by the system. */
const show = (): void => {
  if (choice === 'system') delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = choice;
};
show();

const subscribe = (listener: () => void): (() => void) => {
  listeners.add(listener);
  systemIsDark.addEventListener('change', listener);
  return () => {
    listeners.delete(listener);
    systemIsDark.removeEventListener('change', listener);
  };
};

export const chooseTheme = (next: ThemeChoice): void => {
  choice = next;
  show();
  try {
    localStorage.setItem(storageKey, next);
  } catch {
    // As above: kept for this page only.
  }
  for (const listener of listeners) listener();
};

export const useThemeChoice = (): ThemeChoice => useSyncExternalStore(subscribe, () => choice);

/** The look that is on, whoever chose it. */
export const useTheme = (): Theme =>
  useSyncExternalStore(subscribe, () => {
    if (choice !== 'system') return choice;
    return systemIsDark.matches ? 'dark' : 'light';
  });
