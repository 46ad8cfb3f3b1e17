export const THEME_COOKIE = 'assize_theme';
export const THEMES = ['system', 'light', 'dark'] as const;
export type Theme = (typeof THEMES)[number];

/** The theme named by a cookie; anything unknown follows the system. */
export function readTheme(cookie: string | undefined): Theme {
  return THEMES.find((theme) => theme === cookie) ?? 'system';
}
