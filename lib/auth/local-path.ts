/** The request header in which proxy.ts tells a page its own path and query. */
export const PATH_HEADER = 'x-assize-path';

const BASE = 'http://local.invalid';

/** A path of this site, or null: whatever a browser could read as another site's address is refused. */
export function localPath(text: string | null | undefined): string | null {
  if (!text || !text.startsWith('/') || /[\\\u0000-\u001f]/.test(text)) return null;
  if (!URL.canParse(text, BASE)) return null;
  const url = new URL(text, BASE);
  const path = url.pathname + url.search;
  return url.origin === BASE && !path.startsWith('//') ? path : null;
}

export function signInAddress(from: string | null | undefined): string {
  const path = localPath(from);
  return path && path !== '/' ? `/sign-in?from=${encodeURIComponent(path)}` : '/sign-in';
}
