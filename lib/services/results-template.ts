import 'server-only';
import { db } from '@/db/connection';
import { findEnrolment } from '@/db/enrolment-store';
import { findRound } from '@/db/round-store';
import { notFound } from '@/lib/errors';
import { resultsTemplate } from '@/lib/results-file';
import { getRound } from './round-plan';
import { getResultsPlan } from './results-plan';

type Separator = ',' | ';';

/** The template of a round the laboratory takes part in, once its plan is fixed. */
export async function laboratoryTemplate(
  slug: string,
  laboratoryId: number,
  separator: Separator,
): Promise<string> {
  const round = await findRound(db(), slug);
  const enrolment = round ? await findEnrolment(db(), round.id, laboratoryId) : null;
  if (!round || !enrolment || round.state === 'draft') throw notFound('The round');
  return resultsTemplate(await getResultsPlan(db(), round), { separator });
}

export async function wholeRoundTemplate(slug: string, separator: Separator): Promise<string> {
  const round = await getRound(slug);
  return resultsTemplate(await getResultsPlan(db(), round, []), { separator });
}
