import { THEME_COOKIE, type Theme } from './theme';

const YEAR_S = 365 * 24 * 3600;

/** Shows the theme at once and keeps it for the next visits, where the server reads it. */
export function applyTheme(theme: Theme): void {
  document.documentElement.dataset.theme = theme;
  document.cookie = `${THEME_COOKIE}=${theme}; path=/; max-age=${YEAR_S}; samesite=lax`;
}
