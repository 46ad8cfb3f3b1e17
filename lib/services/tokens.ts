import 'server-only';
import { randomInt } from 'node:crypto';
import {
  countTokensInForce,
  createApiToken,
  listApiTokens,
  revokeApiToken,
  type ApiToken,
} from '@/db/api-token-store';
import { addAuditEntry } from '@/db/audit-store';
import { db } from '@/db/connection';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';
import { endOfDay, type NewTokenInput } from '@/lib/schemas/tokens';
import { hashToken } from '@/lib/token-hash';
import { requireLaboratory } from './own-laboratory';

export const TOKEN_PREFIX = 'assize_';
/** More programs than any laboratory runs; without a limit a leaked password could make any number of them. */
export const MOST_TOKENS = 20;
const RANDOM_LENGTH = 40;
const ALPHABET = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

/** 40 characters of 62 are 238 bits; the prefix lets a person or a scanner recognise a leaked token. */
export function makeTokenText(): string {
  let text = TOKEN_PREFIX;
  for (let index = 0; index < RANDOM_LENGTH; index += 1) text += ALPHABET[randomInt(ALPHABET.length)];
  return text;
}

/** Makes a token for the laboratory the actor works for. The text is given back this once and never again. */
export async function addToken(
  actor: Actor,
  input: NewTokenInput,
): Promise<{ id: number; name: string; token: string; expiresAt: string }> {
  const laboratoryId = requireLaboratory(actor);
  const token = makeTokenText();
  const expiresAt = endOfDay(input.expiresOn);
  return inTransaction(db(), async (trx) => {
    if ((await countTokensInForce(trx, laboratoryId)) >= MOST_TOKENS) {
      throw new AppError(
        'conflict',
        `A laboratory has at most ${MOST_TOKENS} tokens in force. Revoke one that is no longer used.`,
      );
    }
    const id = await createApiToken(trx, {
      laboratoryId,
      name: input.name,
      tokenHash: hashToken(token),
      lastFour: token.slice(-4),
      createdBy: actor.userId,
      expiresAt,
    });
    await addAuditEntry(trx, {
      userId: actor.userId,
      apiTokenId: id,
      laboratoryId,
      action: 'token.created',
      detail: input.name,
    });
    return { id, name: input.name, token, expiresAt };
  });
}

export async function revokeToken(actor: Actor, id: number): Promise<void> {
  const laboratoryId = requireLaboratory(actor);
  await inTransaction(db(), async (trx) => {
    const name = await revokeApiToken(trx, { id, laboratoryId });
    if (name === null) throw notFound('The token');
    await addAuditEntry(trx, {
      userId: actor.userId,
      apiTokenId: id,
      laboratoryId,
      action: 'token.revoked',
      detail: name,
    });
  });
}

export async function listTokens(actor: Actor): Promise<ApiToken[]> {
  return listApiTokens(db(), requireLaboratory(actor));
}
