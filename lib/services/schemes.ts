import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import {
  createMeasurand,
  isMeasurandInUse,
  listMeasurands,
  updateMeasurand,
  type Measurand,
} from '@/db/measurand-store';
import { createScheme, findScheme, listSlugsLike, updateScheme, type Scheme } from '@/db/scheme-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';
import type { MeasurandInput, SchemeInput } from '@/lib/schemas/schemes';
import { freeSlug, slugify } from '@/lib/slug';

/** Names that stand for pages below /schemes. */
const RESERVED = ['new'];

export type { Measurand } from '@/db/measurand-store';
export type { Scheme } from '@/db/scheme-store';

export async function getScheme(slug: string, connection: Db = db()): Promise<Scheme> {
  const scheme = await findScheme(connection, slug);
  if (!scheme) throw notFound('The scheme');
  return scheme;
}

export async function getSchemeWithMeasurands(
  slug: string,
  connection: Db = db(),
): Promise<{ scheme: Scheme; measurands: Measurand[] }> {
  const scheme = await getScheme(slug, connection);
  return { scheme, measurands: await listMeasurands(connection, scheme.id) };
}

export async function addScheme(actor: Actor, input: SchemeInput): Promise<{ slug: string }> {
  return inTransaction(db(), async (trx) => {
    const taken = await listSlugsLike(trx, 'schemes', slugify(input.name));
    const slug = freeSlug(input.name, [...taken, ...RESERVED]);
    await createScheme(trx, { ...input, slug, createdBy: actor.userId });
    await addAuditEntry(trx, { userId: actor.userId, action: 'scheme.created', detail: input.name });
    return { slug };
  });
}

export async function changeScheme(actor: Actor, slug: string, input: SchemeInput): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const scheme = await getScheme(slug, trx);
    await updateScheme(trx, scheme.id, input);
    await addAuditEntry(trx, { userId: actor.userId, action: 'scheme.changed', detail: input.name });
  });
}

function refuseTakenCode(measurands: readonly Measurand[], code: string, ownId: number | null): void {
  const taken = measurands.find(
    (entry) => entry.code.toLowerCase() === code.toLowerCase() && entry.id !== ownId,
  );
  if (taken) {
    throw new AppError('conflict', `The code ${taken.code} is already used for ${taken.name}.`, {
      fieldErrors: { code: `${taken.code} is already used for ${taken.name}. Choose another code.` },
    });
  }
}

export async function addMeasurand(actor: Actor, schemeSlug: string, input: MeasurandInput): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const { scheme, measurands } = await getSchemeWithMeasurands(schemeSlug, trx);
    refuseTakenCode(measurands, input.code, null);
    await createMeasurand(trx, { ...input, schemeId: scheme.id });
    await addAuditEntry(trx, {
      userId: actor.userId,
      action: 'measurand.created',
      detail: `${scheme.name}: ${input.code}`,
    });
  });
}

export async function changeMeasurand(
  actor: Actor,
  schemeSlug: string,
  measurandId: number,
  input: MeasurandInput,
): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const { scheme, measurands } = await getSchemeWithMeasurands(schemeSlug, trx);
    const current = measurands.find((entry) => entry.id === measurandId);
    if (!current) throw notFound('The measurand');
    refuseTakenCode(measurands, input.code, measurandId);
    const isFixed = await isMeasurandInUse(trx, measurandId);
    if (isFixed && (current.code !== input.code || current.unit !== input.unit)) {
      throw new AppError(
        'conflict',
        `${current.code} is used in a round, so its code and unit stay. Add a new measurand for another unit.`,
      );
    }
    await updateMeasurand(trx, measurandId, input);
    await addAuditEntry(trx, {
      userId: actor.userId,
      action: 'measurand.changed',
      detail: `${scheme.name}: ${input.code}`,
    });
  });
}
