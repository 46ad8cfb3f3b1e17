import 'server-only';
import { db } from '@/db/connection';
import { listRoundMeasurands, type RoundMeasurand } from '@/db/round-measurand-store';
import { listTestItems, type TestItem } from '@/db/test-item-store';
import { findLaboratoryRound, type LaboratoryRound } from '@/db/views/laboratory-rounds-view';
import { listOwnReceipts, type ReceiptHead } from '@/db/views/receipt-view';
import { notFound } from '@/lib/errors';

export interface OwnRound {
  round: LaboratoryRound;
  /** Empty while the provider is still planning. */
  items: TestItem[];
  measurands: RoundMeasurand[];
  receipts: ReceiptHead[];
  /** Null when results are taken; else why not, in words. */
  whyNoResults: string | null;
}

/** A round as the laboratory sees it: the plan and its own part, and nothing of anyone else's. */
export async function getOwnRound(slug: string, laboratoryId: number, now: string): Promise<OwnRound> {
  const round = await findLaboratoryRound(db(), slug, laboratoryId);
  if (!round) throw notFound('The round');
  const isPlanned = round.state === 'draft';
  const [items, measurands, receipts] = await Promise.all([
    isPlanned ? [] : listTestItems(db(), round.id),
    isPlanned ? [] : listRoundMeasurands(db(), round.id),
    listOwnReceipts(db(), { slug, laboratoryId }),
  ]);
  return { round, items, measurands, receipts, whyNoResults: whyNoResults(round, now) };
}

function whyNoResults(round: LaboratoryRound, now: string): string | null {
  if (round.enrolmentState !== 'enrolled') return `Your laboratory is ${round.enrolmentState} in this round.`;
  if (round.state === 'draft') return 'The round is not open for results yet.';
  if (round.state !== 'open') return 'The round no longer takes results.';
  return round.closesAt <= now ? 'The time for results has passed.' : null;
}
