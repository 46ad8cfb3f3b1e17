const LINK_IN_TEXT = /\/(welcome|reset)\/[A-Za-z0-9_-]{16,}/g;

/** The text without its one-time links, for keeping and showing after it has been sent. */
export function withoutLinks(body: string): string {
  return body.replace(LINK_IN_TEXT, '/$1/(link taken out)');
}
