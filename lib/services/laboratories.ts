import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import {
  createLaboratory,
  findLaboratory,
  findLaboratoryByName,
  listLaboratories,
  updateLaboratory,
  type Laboratory,
} from '@/db/laboratory-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';
import type { ChangeLaboratoryInput, NewLaboratoryInput } from '@/lib/schemas/laboratories';

export async function getLaboratory(id: number): Promise<Laboratory> {
  const laboratory = await findLaboratory(db(), id);
  if (!laboratory) throw notFound('The laboratory');
  return laboratory;
}

/** For choosing one in a form. */
export async function listAllLaboratories(): Promise<Laboratory[]> {
  return listLaboratories(db());
}

export async function addLaboratory(actor: Actor, input: NewLaboratoryInput): Promise<{ id: number }> {
  return inTransaction(db(), async (trx) => {
    await refuseTakenName(trx, input.name, null);
    const id = await createLaboratory(trx, { ...input, isActive: true });
    await addAuditEntry(trx, {
      userId: actor.userId,
      laboratoryId: id,
      action: 'laboratory.created',
      detail: input.name,
    });
    return { id };
  });
}

export async function changeLaboratory(actor: Actor, input: ChangeLaboratoryInput): Promise<void> {
  const { id, ...fields } = input;
  await inTransaction(db(), async (trx) => {
    await refuseTakenName(trx, input.name, id);
    if (!(await updateLaboratory(trx, id, fields))) throw notFound('The laboratory');
    await addAuditEntry(trx, {
      userId: actor.userId,
      laboratoryId: id,
      action: 'laboratory.changed',
      detail: input.name,
    });
  });
}

async function refuseTakenName(trx: Db, name: string, ownId: number | null): Promise<void> {
  const taken = await findLaboratoryByName(trx, name);
  if (!taken || taken.id === ownId) return;
  throw new AppError('conflict', 'Nothing was saved.', {
    fieldErrors: { name: `${taken.name} exists already. Enter another name.` },
  });
}
