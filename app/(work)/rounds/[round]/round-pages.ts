import type { RoundPage } from '@/components/rounds/round-navigation';
import { can, type Permission } from '@/lib/rules/permissions';
import type { Actor } from '@/lib/rules/roles';

const PAGES: (RoundPage & { permission: Permission })[] = [
  { page: 'plan', label: 'Plan', permission: 'round:view' },
  { page: 'items', label: 'Items', permission: 'round:view' },
  { page: 'participants', label: 'Participants', permission: 'round:view' },
  { page: 'results', label: 'Results', permission: 'round:see-results' },
  { page: 'review', label: 'Review', permission: 'round:see-results' },
  { page: 'evaluation', label: 'Evaluation', permission: 'round:see-results' },
  { page: 'report', label: 'Report', permission: 'round:see-results' },
  { page: 'log', label: 'Log', permission: 'round:see-log' },
];

export function roundPages(actor: Actor): RoundPage[] {
  return PAGES.filter(({ permission }) => can(actor, permission)).map(({ page, label }) => ({ page, label }));
}
