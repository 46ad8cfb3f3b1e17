import { can, laboratoriesOf } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';

/** Where a person's work begins. */
export function homeOf(actor: Actor): string {
  if (can(actor, 'round:view')) return '/rounds';
  return laboratoriesOf(actor).length > 0 ? '/laboratory' : '/account';
}
