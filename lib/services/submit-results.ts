import 'server-only';
import { createHash } from 'node:crypto';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import type { Enrolment } from '@/db/enrolment-store';
import type { Round } from '@/db/round-store';
import {
  createResults,
  createSubmission,
  findCurrentSubmission,
  keepUpload,
  markSuperseded,
  type Channel,
} from '@/db/submission-store';
import { inTransaction } from '@/db/transaction';
import { AppError } from '@/lib/errors';
import { readResultsFile, type ReadFile } from '@/lib/results-file';
import type { Actor } from '@/lib/rules/roles';
import type { UploadedFile } from '@/lib/upload-body';
import { findOwnEnrolment, requireOpenEnrolment } from './open-enrolment';
import { mailReceipt } from './receipt-mail';
import { drawReceiptCode } from './receipt-code';
import { getResultsPlan } from './results-plan';
import { resultFromRow } from './submission-rows';
import { todayAnywhere } from './today-anywhere';

export interface Receipt {
  receiptCode: string;
  sha256: string;
  submittedAt: string;
  resultCount: number;
  replacedReceiptCode: string | null;
  /** True when exactly this file was the laboratory's current submission already. */
  isRepeat: boolean;
}

export function sha256Of(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}

interface FileReading {
  round: Round;
  enrolment: Enrolment;
  report: ReadFile;
  sha256: string;
}

/** Reads a laboratory's file against the plan; a refusal, of the file or of the time, leaves a line in the log and nothing else. */
async function readAgainstPlan(
  actor: Actor,
  slug: string,
  laboratoryId: number,
  file: UploadedFile,
): Promise<FileReading> {
  const { round, enrolment, whyNot } = await findOwnEnrolment(db(), slug, laboratoryId);
  const sha256 = sha256Of(file.bytes);
  const noteRefusal = (reason: string) =>
    addAuditEntry(db(), {
      ...whoAndWhere(actor, laboratoryId, round),
      action: 'results.refused',
      outcome: 'refused',
      detail: `${reason}, SHA-256 ${sha256}`,
    });
  if (whyNot !== null) {
    await noteRefusal(whyNot);
    throw new AppError('conflict', whyNot);
  }
  const plan = await getResultsPlan(db(), round);
  const report = readResultsFile(file.bytes, plan, { kind: 'laboratory', today: todayAnywhere() });
  if (!report.ok) await noteRefusal(`${report.problems.length + report.unlistedProblems} problems`);
  return { round, enrolment, report, sha256 };
}

function whoAndWhere(actor: Actor, laboratoryId: number, round: Round) {
  return { userId: actor.userId, apiTokenId: actor.apiTokenId, laboratoryId, roundId: round.id };
}

export interface FileCheck {
  report: ReadFile;
  sha256: string;
  current: { receiptCode: string; submittedAt: string } | null;
}

/** Checks a laboratory's file. A good one is kept by its SHA-256; nothing is submitted. */
export async function checkResultsFile(
  actor: Actor,
  slug: string,
  laboratoryId: number,
  file: UploadedFile,
): Promise<FileCheck> {
  const { enrolment, report, sha256 } = await readAgainstPlan(actor, slug, laboratoryId, file);
  if (report.ok) await keepUpload(db(), sha256, file.bytes);
  const current = await findCurrentSubmission(db(), enrolment.id);
  return { report, sha256, current };
}

interface Kept {
  round: Round;
  enrolmentId: number;
  file: UploadedFile;
  channel: Channel;
  actor: Actor;
  report: Pick<ReadFile, 'results'>;
}

/** Writes one laboratory's submission, superseding the one before; the same bytes again change nothing. */
export async function keepSubmission(trx: Db, kept: Kept): Promise<Receipt> {
  const { round, enrolmentId, file, actor, report } = kept;
  const sha256 = sha256Of(file.bytes);
  const current = await findCurrentSubmission(trx, enrolmentId);
  if (current?.sha256 === sha256) {
    return { ...current, replacedReceiptCode: null, isRepeat: true };
  }
  if (current) await markSuperseded(trx, current.id);
  const receipt = { receiptCode: drawReceiptCode(), submittedAt: new Date().toISOString() };
  const submissionId = await createSubmission(trx, {
    ...receipt,
    roundId: round.id,
    enrolmentId,
    uploadId: await keepUpload(trx, sha256, file.bytes),
    fileName: file.name.slice(0, 200),
    channel: kept.channel,
    resultCount: report.results.length,
    supersedesId: current?.id ?? null,
    userId: actor.userId,
    apiTokenId: actor.apiTokenId,
  });
  await createResults(
    trx,
    report.results.map((row) => resultFromRow(submissionId, row)),
  );
  return {
    ...receipt,
    sha256,
    resultCount: report.results.length,
    replacedReceiptCode: current?.receiptCode ?? null,
    isRepeat: false,
  };
}

/** Checks and submits a laboratory's file: all of it or nothing. A null receipt means that the report lists problems. */
export async function submitResultsFile(
  actor: Actor,
  slug: string,
  laboratoryId: number,
  file: UploadedFile,
): Promise<{ report: ReadFile; receipt: Receipt | null }> {
  const { report } = await readAgainstPlan(actor, slug, laboratoryId, file);
  if (!report.ok) return { report, receipt: null };
  const receipt = await inTransaction(db(), async (trx) => {
    const { round, enrolment } = await requireOpenEnrolment(trx, slug, laboratoryId);
    const channel = actor.apiTokenId === null ? 'browser' : 'token';
    const kept = await keepSubmission(trx, {
      round,
      enrolmentId: enrolment.id,
      file,
      channel,
      actor,
      report,
    });
    if (kept.isRepeat) return kept;
    await addAuditEntry(trx, {
      ...whoAndWhere(actor, laboratoryId, round),
      action: kept.replacedReceiptCode ? 'results.amended' : 'results.submitted',
      detail: `receipt ${kept.receiptCode}, ${kept.resultCount} results, SHA-256 ${kept.sha256}`,
    });
    await mailReceipt(trx, round, laboratoryId, kept);
    return kept;
  });
  return { report, receipt };
}
