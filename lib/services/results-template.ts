import 'server-only';
import { db } from '@/db/connection';
import { resultsTemplate, wholeRoundTemplate } from '@/lib/results-file';
import { listParticipants } from '@/db/views/participants-view';
import { findOwnEnrolment } from './open-enrolment';
import { getRound } from './round-plan';
import { getResultsPlan } from './results-plan';

type Separator = ',' | ';';

/** The template of a round the laboratory takes part in, once its plan is fixed. */
export async function laboratoryTemplate(
  slug: string,
  laboratoryId: number,
  separator: Separator,
): Promise<string> {
  const { round } = await findOwnEnrolment(db(), slug, laboratoryId);
  return resultsTemplate(await getResultsPlan(db(), round), { separator });
}

/** The template of a whole round names its enrolled laboratories: ask for `round:see-key` first. */
export async function roundTemplate(slug: string, separator: Separator): Promise<string> {
  const round = await getRound(slug);
  const enrolled = (await listParticipants(db(), round.id)).filter((entry) => entry.state === 'enrolled');
  const laboratories = enrolled.map((entry) => ({ id: entry.laboratoryId, name: entry.laboratoryName }));
  return wholeRoundTemplate(await getResultsPlan(db(), round, laboratories), { separator });
}
