import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { createEnrolment, listEnrolments, updateEnrolment, type Enrolment } from '@/db/enrolment-store';
import { createLaboratory, findLaboratoryByName, listLaboratories } from '@/db/laboratory-store';
import { findRound, type Round } from '@/db/round-store';
import { listOwnSenders } from '@/db/submission-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import { readResultsFile, type CheckedResult, type ReadFile } from '@/lib/results-file';
import type { Actor } from '@/lib/rules/roles';
import { roundStateWords } from '@/lib/rules/round-states';
import type { UploadedFile } from '@/lib/upload-body';
import { drawParticipantCode, requireRoomFor } from './participant-codes';
import { getResultsPlan } from './results-plan';
import { keepSubmission, sha256Of } from './submit-results';
import { todayAnywhere } from './today-anywhere';

export interface WholeRoundLoad {
  report: ReadFile;
  laboratoryCount: number;
  resultCount: number;
}

async function requireOpenRound(connection: Db, slug: string): Promise<Round> {
  const round = await findRound(connection, slug);
  if (!round) throw notFound('The round');
  if (round.state !== 'open') {
    throw new AppError(
      'conflict',
      `Results are loaded into an open round; this one is ${roundStateWords(round.state)}.`,
    );
  }
  return round;
}

/** Reads a file with one row for each laboratory and result; nothing is stored. */
export async function checkWholeRoundFile(slug: string, file: UploadedFile): Promise<WholeRoundLoad> {
  const round = await requireOpenRound(db(), slug);
  const plan = await getResultsPlan(db(), round, await listLaboratories(db()));
  const report = readResultsFile(file.bytes, plan, { kind: 'whole-round', today: todayAnywhere() });
  await refuseOwnResults(db(), round, report);
  const laboratoryCount = groupByLaboratory(report.results).size;
  requireRoomFor(laboratoryCount);
  return { report, laboratoryCount, resultCount: report.results.length };
}

const NAMES_SHOWN = 8;

/** What a laboratory sent itself is replaced by the laboratory alone, which holds the receipt for it. */
async function refuseOwnResults(
  connection: Db,
  round: Round,
  report: Pick<ReadFile, 'results'>,
): Promise<void> {
  const named = new Set(report.results.map(({ laboratoryId }) => laboratoryId));
  const senders = await listOwnSenders(connection, round.id);
  const names = senders.filter(({ laboratoryId }) => named.has(laboratoryId)).map(({ name }) => name);
  if (names.length === 0) return;
  const rest = names.length - NAMES_SHOWN;
  const shown = `${names.slice(0, NAMES_SHOWN).join(', ')}${rest > 0 ? ` and ${rest} more` : ''}`;
  throw new AppError(
    'conflict',
    `The file has results of laboratories that have sent their own: ${shown}. Leave their rows out; only they can amend what they sent.`,
  );
}

function groupByLaboratory(rows: readonly CheckedResult[]): Map<string, CheckedResult[]> {
  const groups = new Map<string, CheckedResult[]>();
  for (const row of rows) {
    const key =
      row.laboratoryId === null ? `new ${(row.laboratory ?? '').toLowerCase()}` : `id ${row.laboratoryId}`;
    const group = groups.get(key);
    if (group) group.push(row);
    else groups.set(key, [row]);
  }
  return groups;
}

/** Enrols what the file names, making laboratories that are new, and keeps one submission for each. */
export async function loadWholeRound(
  actor: Actor,
  slug: string,
  file: UploadedFile,
): Promise<WholeRoundLoad> {
  const checked = await checkWholeRoundFile(slug, file);
  if (!checked.report.ok) return checked;
  await inTransaction(db(), async (trx) => {
    const round = await requireOpenRound(trx, slug);
    await refuseOwnResults(trx, round, checked.report);
    const enrolments = await listEnrolments(trx, round.id);
    const byLaboratory = new Map(enrolments.map((enrolment) => [enrolment.laboratoryId, enrolment]));
    const taken = new Set(enrolments.map((enrolment) => enrolment.participantCode));
    for (const rows of groupByLaboratory(checked.report.results).values()) {
      const laboratoryId =
        rows[0]?.laboratoryId ?? (await ensureLaboratory(trx, actor, rows[0]?.laboratory ?? ''));
      const present = byLaboratory.get(laboratoryId);
      const enrolmentId = await ensureEnrolled(trx, { actor, round, laboratoryId, present, taken });
      const report = { results: rows };
      await keepSubmission(trx, { round, enrolmentId, file, channel: 'whole-round', actor, report });
    }
    await addAuditEntry(trx, {
      userId: actor.userId,
      roundId: round.id,
      action: 'results.loaded',
      detail: `${checked.laboratoryCount} laboratories, ${checked.resultCount} results, SHA-256 ${sha256Of(file.bytes)}`,
    });
  });
  return checked;
}

/** A laboratory that the file brings, unless someone entered it since the file was read. */
async function ensureLaboratory(trx: Db, actor: Actor, text: string): Promise<number> {
  const name = text.replace(/\s+/g, ' ');
  const known = await findLaboratoryByName(trx, name);
  if (known) return known.id;
  const laboratoryId = await createLaboratory(trx, { name, kind: 'other' });
  await addAuditEntry(trx, {
    userId: actor.userId,
    laboratoryId,
    action: 'laboratory.created',
    detail: name,
  });
  return laboratoryId;
}

interface Enrolling {
  actor: Actor;
  round: Round;
  laboratoryId: number;
  present: Enrolment | undefined;
  taken: Set<string>;
}

async function ensureEnrolled(trx: Db, enrolling: Enrolling): Promise<number> {
  const { actor, round, laboratoryId, present, taken } = enrolling;
  if (present?.state === 'enrolled') return present.id;
  await addAuditEntry(trx, {
    userId: actor.userId,
    roundId: round.id,
    laboratoryId,
    action: 'enrolment.enrolled',
    detail: 'named in a file with the whole round',
  });
  if (present) {
    const decidedAt = new Date().toISOString();
    await updateEnrolment(trx, present.id, { state: 'enrolled', reason: '', decidedAt });
    return present.id;
  }
  const participantCode = drawParticipantCode(taken);
  taken.add(participantCode);
  return createEnrolment(trx, { roundId: round.id, laboratoryId, participantCode, state: 'enrolled' });
}
