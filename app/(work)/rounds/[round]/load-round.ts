import 'server-only';
import { cache } from 'react';
import { getRoundOverview } from '@/lib/services/round-overview';
import { findOr404 } from '../find-or-404';

/** The round of this request; the layout and the page ask for the same one. */
export const loadRound = cache((slug: string) => findOr404(getRoundOverview(slug)));
