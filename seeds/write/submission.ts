import { addAuditEntry } from '@/db/audit-store';
import type { Db } from '@/db/connection';
import type { Round } from '@/db/round-store';
import {
  createResults,
  createSubmission,
  findCurrentSubmission,
  keepUpload,
  markSuperseded,
} from '@/db/submission-store';
import { readResultsFile, type ResultsPlan } from '@/lib/results-file';
import { resultFromRow } from '@/lib/services/submission-rows';
import { sha256Of } from '@/lib/services/submit-results';
import { slugify } from '@/lib/slug';
import { receiptCode } from '../generate/codes';
import type { Member } from './cast';

export interface Sending {
  member: Member;
  round: Pick<Round, 'id' | 'slug'>;
  enrolmentId: number;
  plan: ResultsPlan;
  bytes: Uint8Array;
  /** 0 for the first file of the laboratory in the round. */
  number: number;
  byToken: boolean;
  moment: string;
}

function readBack({ bytes, plan, moment, member, round }: Sending) {
  const report = readResultsFile(bytes, plan, { kind: 'laboratory', today: moment.slice(0, 10) });
  if (report.ok) return report.results;
  const words = report.problems.map((problem) => JSON.stringify(problem)).join('\n');
  throw new Error(`the file of ${member.laboratory.name} for ${round.slug} is refused:\n${words}`);
}

/** Keeps a file as the upload page does: the bytes, the submission, and what the reader reads in those bytes. */
export async function sendFile(trx: Db, sending: Sending): Promise<void> {
  const { member, round, enrolmentId, bytes, number, byToken, moment } = sending;
  const rows = readBack(sending);
  const sha256 = sha256Of(bytes);
  const current = number > 0 ? await findCurrentSubmission(trx, enrolmentId) : null;
  if (current) await markSuperseded(trx, current.id);
  const who = {
    userId: byToken ? null : member.analystId,
    apiTokenId: byToken ? member.tokenId : null,
  };
  const receipt = receiptCode(round.slug, member.laboratory.name, number);
  const submissionId = await createSubmission(trx, {
    ...who,
    roundId: round.id,
    enrolmentId,
    uploadId: await keepUpload(trx, sha256, bytes),
    fileName: `${slugify(member.laboratory.name)}-${round.slug}${number > 0 ? `-v${number + 1}` : ''}.csv`,
    channel: byToken ? 'token' : 'browser',
    receiptCode: receipt,
    resultCount: rows.length,
    supersedesId: current?.id ?? null,
    submittedAt: moment,
  });
  await createResults(
    trx,
    rows.map((row) => resultFromRow(submissionId, row)),
  );
  await addAuditEntry(trx, {
    ...who,
    laboratoryId: member.id,
    roundId: round.id,
    action: current ? 'results.amended' : 'results.submitted',
    detail: `receipt ${receipt}, ${rows.length} results, SHA-256 ${sha256}`,
  });
}
