import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { createEnrolment, listEnrolments, updateEnrolment, type Enrolment } from '@/db/enrolment-store';
import { createLaboratory, listLaboratories, type LaboratoryFields } from '@/db/laboratory-store';
import { findRound, type Round } from '@/db/round-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import { readResultsFile, type CheckedResult, type ReadFile } from '@/lib/results-file';
import type { Actor } from '@/lib/rules/roles';
import { roundStateWords } from '@/lib/rules/round-states';
import type { UploadedFile } from '@/lib/upload-body';
import { drawParticipantCode } from './participant-codes';
import { getResultsPlan } from './results-plan';
import { keepSubmission, sha256Of } from './submit-results';

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
  const today = new Date().toISOString().slice(0, 10);
  const report = readResultsFile(file.bytes, plan, { kind: 'whole-round', today });
  const laboratoryCount = groupByLaboratory(report.results).size;
  return { report, laboratoryCount, resultCount: report.results.length };
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
    const enrolments = await listEnrolments(trx, round.id);
    const byLaboratory = new Map(enrolments.map((enrolment) => [enrolment.laboratoryId, enrolment]));
    const taken = new Set(enrolments.map((enrolment) => enrolment.participantCode));
    for (const rows of groupByLaboratory(checked.report.results).values()) {
      const laboratoryId =
        rows[0]?.laboratoryId ?? (await createLaboratory(trx, newLaboratory(rows[0]?.laboratory ?? '')));
      const enrolmentId = await ensureEnrolled(
        trx,
        round,
        laboratoryId,
        byLaboratory.get(laboratoryId),
        taken,
      );
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

function newLaboratory(name: string): LaboratoryFields {
  return { name, kind: 'other', town: '', contactEmail: null, isActive: true };
}

async function ensureEnrolled(
  trx: Db,
  round: Round,
  laboratoryId: number,
  present: Enrolment | undefined,
  taken: Set<string>,
): Promise<number> {
  if (present) {
    if (present.state !== 'enrolled') await updateEnrolment(trx, present.id, { state: 'enrolled' });
    return present.id;
  }
  const participantCode = drawParticipantCode(taken);
  taken.add(participantCode);
  return createEnrolment(trx, { roundId: round.id, laboratoryId, participantCode, state: 'enrolled' });
}
