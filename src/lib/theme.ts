import { useSyncExternalStore } from 'react';

export type Theme = 'light' | 'dark';
export type ThemeChoice = Theme | 'system';

const storageKey = 'skewlight.theme';
const listeners = new Set<() => void>();

/** Dark of the system; jsdom and old browsers have no matchMedia and count as light. */
const systemDark =
  typeof window.matchMedia === 'function' ? window.matchMedia('(prefers-color-scheme: dark)') : null;

function storedChoice(): ThemeChoice {
  const stored = window.localStorage.getItem(storageKey);
  return stored === 'light' || stored === 'dark' ? stored : 'system';
}

function currentTheme(): Theme {
  const choice = storedChoice();
  if (choice !== 'system') return choice;
  return systemDark?.matches ? 'dark' : 'light';
}

/**
 * On screen now. Only `applyTheme` asks the system: whoever reads a media query between its change and the event that
 * tells of it (a render may) takes that event away from the listener, and half the page keeps the other colours.
 */
let shown: Theme = currentTheme();

/** Writes the theme where tokens.css reads it. Called once at the start and at every change. */
export function applyTheme(): void {
  shown = currentTheme();
  document.documentElement.dataset['theme'] = shown;
  listeners.forEach((listener) => listener());
}

/** Keeps the choice over visits; `system` forgets it. */
export function chooseTheme(choice: ThemeChoice): void {
  if (choice === 'system') window.localStorage.removeItem(storageKey);
  else window.localStorage.setItem(storageKey, choice);
  applyTheme();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

systemDark?.addEventListener('change', applyTheme);
window.addEventListener('storage', (event) => {
  if (event.key === storageKey) applyTheme();
});

/** The theme on screen; a component that draws with resolved colours redraws when it changes. */
export function useTheme(): Theme {
  return useSyncExternalStore(subscribe, () => shown);
}

/** What the person chose, which may be to follow the system. */
export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore(subscribe, storedChoice);
}
