import { redirect } from 'next/navigation';
import { requirePageActor } from '@/lib/auth/guards';
import type { RoundState } from '@/lib/rules/round-states';
import { getRound } from '@/lib/services/round-plan';
import { findOr404 } from '../find-or-404';

const PLACE: Record<RoundState, string> = {
  draft: 'plan',
  open: 'participants',
  closed: 'review',
  evaluated: 'evaluation',
  published: 'evaluation',
  cancelled: 'plan',
};

/** A round opens where its work is at the moment. */
export default async function RoundPage({ params }: PageProps<'/rounds/[round]'>) {
  await requirePageActor('round:view');
  const round = await findOr404(getRound((await params).round));
  redirect(`/rounds/${round.slug}/${PLACE[round.state]}`);
}
