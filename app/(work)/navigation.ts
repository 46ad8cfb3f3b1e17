import { can } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';

export interface Place {
  href: string;
  label: string;
}

/** The places of the header by role. Hiding one is courtesy; each page asks the rules itself. */
export function navigationOf(actor: Actor): Place[] {
  const own = { laboratoryId: actor.laboratoryId };
  const places: Place[] = [];
  if (can(actor, 'round:view')) places.push({ href: '/rounds', label: 'Rounds' });
  if (can(actor, 'scheme:view')) places.push({ href: '/schemes', label: 'Schemes' });
  if (can(actor, 'laboratory:list')) places.push({ href: '/laboratories', label: 'Laboratories' });
  if (can(actor, 'own:view', own)) {
    places.push(
      { href: '/laboratory', label: 'Today' },
      { href: '/laboratory/trend', label: 'Results over time' },
    );
  }
  const isAdministrator = can(actor, 'people:edit');
  if (can(actor, 'own:people', own)) {
    places.push({ href: '/laboratory/people', label: isAdministrator ? 'Our people' : 'People' });
  }
  if (can(actor, 'own:tokens', own)) places.push({ href: '/laboratory/tokens', label: 'Tokens' });
  if (isAdministrator) places.push({ href: '/admin/people', label: 'People' });
  if (can(actor, 'mail:view')) places.push({ href: '/admin/mail', label: 'Mail' });
  if (can(actor, 'log:view')) places.push({ href: '/admin/log', label: 'Log' });
  return places;
}

/** The place a path lies in: the longest address that it equals or lies below. */
export function placeOf(places: readonly Place[], path: string): string | undefined {
  return places
    .map((place) => place.href)
    .filter((href) => path === href || path.startsWith(`${href}/`))
    .sort((a, b) => b.length - a.length)[0];
}
