import { readTheme, THEME_COOKIE, type Theme } from './theme';

const YEAR_S = 365 * 24 * 3600;
const listeners = new Set<() => void>();

/** Shows the theme at once and keeps it for the next visits, where the server reads it. */
export function applyTheme(theme: Theme): void {
  document.documentElement.dataset.theme = theme;
  document.cookie = `${THEME_COOKIE}=${theme}; path=/; max-age=${YEAR_S}; samesite=lax`;
  for (const listener of listeners) listener();
}

export function shownTheme(): Theme {
  return readTheme(document.documentElement.dataset.theme);
}

/** The switch stands in the header twice, for wide and for narrow screens; both follow one choice. */
export function onThemeChange(listener: () => void): () => void {
  listeners.add(listener);
  return () => void listeners.delete(listener);
}
