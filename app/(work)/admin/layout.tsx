import type { ReactNode } from 'react';
import { requirePageActor } from '@/lib/auth/guards';

/**
 * Asked out here too, where an answer of 404 is still possible: once a loading page has been sent, it is not. That is
 * also why loading pages stand only beside pages that are never missing.
 */
export default async function AdminLayout({ children }: { children: ReactNode }) {
  await requirePageActor('log:view');
  return children;
}
