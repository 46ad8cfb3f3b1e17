import 'server-only';
import { db } from '@/db/connection';
import {
  findOwnFile,
  findOwnReceipt,
  findPublicReceipt,
  listOwnResults,
  type PublicReceipt,
  type ReceiptHead,
  type ReceiptRow,
} from '@/db/views/receipt-view';
import { findLaboratoryRound, type LaboratoryRound } from '@/db/views/laboratory-rounds-view';
import { notFound } from '@/lib/errors';

export interface OwnReceipt {
  round: LaboratoryRound;
  head: ReceiptHead;
  rows: ReceiptRow[];
}

/** One of the laboratory's own receipts with the rows it stands for. */
export async function getOwnReceipt(
  slug: string,
  laboratoryId: number,
  receiptCode: string,
): Promise<OwnReceipt> {
  const owned = { slug, laboratoryId, receiptCode };
  const [round, head, rows] = await Promise.all([
    findLaboratoryRound(db(), slug, laboratoryId),
    findOwnReceipt(db(), owned),
    listOwnResults(db(), owned),
  ]);
  if (!round || !head) throw notFound('The receipt');
  return { round, head, rows };
}

/** The file behind one of the laboratory's own receipts, byte for byte. */
export async function getOwnFile(
  slug: string,
  laboratoryId: number,
  receiptCode: string,
): Promise<{ fileName: string; bytes: Uint8Array }> {
  const file = await findOwnFile(db(), { slug, laboratoryId, receiptCode });
  if (!file) throw notFound('The file');
  return file;
}

const CODE_LENGTH = 12;
const GROUPS = /.{4}/g;
/** Letters that are not in the alphabet of receipt codes, and what is meant when someone types them. */
const MISREAD: Record<string, string> = { I: '1', L: '1', O: '0' };

/** A code as it may be typed from paper: any case, with or without hyphens; null when it cannot be one. */
export function normaliseReceiptCode(text: string): string | null {
  const signs = text
    .toUpperCase()
    .replace(/[\s\u2010-\u2015-]/g, '')
    .replace(/[ILO]/g, (letter) => MISREAD[letter] ?? letter);
  if (signs.length !== CODE_LENGTH || !/^[0-9A-HJKMNP-TV-Z]+$/.test(signs)) return null;
  return signs.match(GROUPS)?.join('-') ?? null;
}

/** Whether a receipt with this code was ever given, for anyone who holds it. */
export async function findReceiptByCode(text: string): Promise<PublicReceipt | null> {
  const code = normaliseReceiptCode(text);
  return code === null ? null : findPublicReceipt(db(), code);
}
