import 'server-only';
import { addAuditEntry } from '@/db/audit-store';
import { db, type Db } from '@/db/connection';
import { listMeasurands } from '@/db/measurand-store';
import {
  createRoundMeasurand,
  listRoundMeasurands,
  removeRoundMeasurand,
  updateRoundMeasurand,
  type RoundMeasurand,
} from '@/db/round-measurand-store';
import { createRound, findRound, updateRoundPlan, type Round } from '@/db/round-store';
import { findScheme, listSlugsLike } from '@/db/scheme-store';
import {
  createTestItem,
  listTestItems,
  removeTestItem,
  updateTestItem,
  type TestItem,
} from '@/db/test-item-store';
import { inTransaction } from '@/db/transaction';
import { AppError, notFound } from '@/lib/errors';
import type { Actor } from '@/lib/rules/roles';
import { roundStateWords } from '@/lib/rules/round-states';
import type { RoundInput, RoundMeasurandInput, TestItemInput } from '@/lib/schemas/rounds';
import { freeSlug, slugify } from '@/lib/slug';
import { massFractionPerUnit } from '@/lib/units';
import { mailParticipants } from './round-mail';

/** Names that stand for pages below /rounds. */
const RESERVED = ['new'];

export async function getRound(slug: string): Promise<Round> {
  const round = await findRound(db(), slug);
  if (!round) throw notFound('The round');
  return round;
}

export type PlannedItem = TestItem;
export type PlannedMeasurand = RoundMeasurand;

export interface RoundPlanOverview {
  items: PlannedItem[];
  measurands: PlannedMeasurand[];
  /** The measurands of the scheme, to choose from. */
  choices: { id: number; code: string; name: string }[];
}

export async function getRoundPlan(slug: string): Promise<RoundPlanOverview> {
  const round = await getRound(slug);
  const choices = await listMeasurands(db(), round.schemeId);
  return {
    items: await listTestItems(db(), round.id),
    measurands: await listRoundMeasurands(db(), round.id),
    choices: choices.map(({ id, code, name }) => ({ id, code, name })),
  };
}

export async function addRound(
  actor: Actor,
  schemeSlug: string,
  input: RoundInput,
): Promise<{ slug: string }> {
  return inTransaction(db(), async (trx) => {
    const scheme = await findScheme(trx, schemeSlug);
    if (!scheme) throw notFound('The scheme');
    const taken = await listSlugsLike(trx, 'rounds', slugify(input.name));
    const slug = freeSlug(input.name, [...taken, ...RESERVED]);
    const roundId = await createRound(trx, { ...input, slug, schemeId: scheme.id, createdBy: actor.userId });
    await addAuditEntry(trx, { userId: actor.userId, roundId, action: 'round.created', detail: input.name });
    return { slug };
  });
}

/** Runs `work` on a round that is still being planned and writes what it says into the log. */
async function editDraft(
  actor: Actor,
  slug: string,
  action: string,
  work: (trx: Db, round: Round) => Promise<string>,
): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await findRound(trx, slug);
    if (!round) throw notFound('The round');
    if (round.state !== 'draft') {
      throw new AppError(
        'conflict',
        `The plan is fixed, since the round is ${roundStateWords(round.state)}.`,
      );
    }
    const detail = await work(trx, round);
    await addAuditEntry(trx, { userId: actor.userId, roundId: round.id, action, detail });
  });
}

/** Changes name, dates and instructions. Once open, only the closing and publication dates and the instructions move. */
export async function changeRound(actor: Actor, slug: string, input: RoundInput): Promise<void> {
  await inTransaction(db(), async (trx) => {
    const round = await findRound(trx, slug);
    if (!round) throw notFound('The round');
    if (!['draft', 'open'].includes(round.state)) {
      throw new AppError(
        'conflict',
        `The dates are fixed, since the round is ${roundStateWords(round.state)}.`,
      );
    }
    const { closesAt, publishAt, instructions } = input;
    const isDraft = round.state === 'draft';
    if (!isDraft) requireOrder(round, closesAt);
    await updateRoundPlan(trx, round.id, isDraft ? input : { closesAt, publishAt, instructions });
    const detail = `closes ${round.closesAt} -> ${closesAt}, publication ${round.publishAt} -> ${publishAt}`;
    await addAuditEntry(trx, { userId: actor.userId, roundId: round.id, action: 'round.changed', detail });
    const isMoved = !isDraft && !round.isPast && closesAt !== round.closesAt;
    if (isMoved) await mailParticipants(trx, { ...round, closesAt }, 'moved');
  });
}

/** The dates that stay are those that are stored, whatever the form says of them. */
function requireOrder(round: Round, closesAt: string): void {
  if (closesAt >= round.dispatchAt) return;
  throw new AppError('invalid', 'Nothing was saved.', {
    fieldErrors: { closesAt: 'The close must not be before the dispatch.' },
  });
}

async function refuseTakenItemCode(
  trx: Db,
  roundId: number,
  code: string,
  ownId: number | null,
): Promise<void> {
  const items = await listTestItems(trx, roundId);
  const taken = items.find((item) => item.code.toLowerCase() === code.toLowerCase() && item.id !== ownId);
  if (taken) {
    throw new AppError('conflict', `Item ${taken.code} is in the plan already.`, {
      fieldErrors: { code: `${taken.code} is in the plan already. Choose another code.` },
    });
  }
}

export async function addTestItem(
  actor: Actor,
  slug: string,
  input: TestItemInput,
  measurandIds: readonly number[],
): Promise<void> {
  await editDraft(actor, slug, 'item.created', async (trx, round) => {
    await refuseTakenItemCode(trx, round.id, input.code, null);
    const testItemId = await createTestItem(trx, { ...input, roundId: round.id });
    for (const measurandId of measurandIds) await addWithSchemeDefaults(trx, round, testItemId, measurandId);
    return input.code;
  });
}

export async function changeTestItem(
  actor: Actor,
  slug: string,
  id: number,
  input: TestItemInput,
): Promise<void> {
  await editDraft(actor, slug, 'item.changed', async (trx, round) => {
    await refuseTakenItemCode(trx, round.id, input.code, id);
    const count = await updateTestItem(trx, { id, roundId: round.id }, input);
    if (count === 0) throw notFound('The test item');
    return input.code;
  });
}

export async function dropTestItem(actor: Actor, slug: string, id: number): Promise<void> {
  await editDraft(actor, slug, 'item.removed', async (trx, round) => {
    const item = (await listTestItems(trx, round.id)).find((entry) => entry.id === id);
    if (!item) throw notFound('The test item');
    await removeTestItem(trx, { id, roundId: round.id });
    return item.code;
  });
}

async function addWithSchemeDefaults(
  trx: Db,
  round: Round,
  testItemId: number,
  measurandId: number,
): Promise<void> {
  const measurand = (await listMeasurands(trx, round.schemeId)).find((entry) => entry.id === measurandId);
  if (!measurand) throw notFound('The measurand');
  await createRoundMeasurand(trx, {
    roundId: round.id,
    testItemId,
    measurandId,
    position: measurand.position,
    replicates: 1,
    assignedMethod: 'algorithm-a',
    statedValue: null,
    statedUncertainty: null,
    statedSource: null,
    sigmaRule: measurand.sigmaRule,
    sigmaValue: measurand.sigmaValue,
    sigmaPercent: measurand.sigmaPercent,
    scoreKind: 'z',
    zPrimeWhenNeeded: true,
  });
}

/** Adds a measurand to an item with the scheme's own sigma_pt rule; the rest is set afterwards. */
export async function addRoundMeasurand(
  actor: Actor,
  slug: string,
  testItemId: number,
  measurandId: number,
): Promise<void> {
  await editDraft(actor, slug, 'measurand.added', async (trx, round) => {
    const item = (await listTestItems(trx, round.id)).find((entry) => entry.id === testItemId);
    if (!item) throw notFound('The test item');
    const present = await listRoundMeasurands(trx, round.id);
    if (present.some((entry) => entry.testItemId === testItemId && entry.measurandId === measurandId)) {
      throw new AppError('conflict', `Item ${item.code} has this measurand already.`);
    }
    await addWithSchemeDefaults(trx, round, testItemId, measurandId);
    return item.code;
  });
}

export async function changeRoundMeasurand(
  actor: Actor,
  slug: string,
  id: number,
  input: RoundMeasurandInput,
): Promise<void> {
  await editDraft(actor, slug, 'measurand.planned', async (trx, round) => {
    const entry = (await listRoundMeasurands(trx, round.id)).find((candidate) => candidate.id === id);
    if (!entry) throw notFound('The measurand');
    if (input.sigmaRule.startsWith('horwitz') && massFractionPerUnit(entry.unit) === null) {
      const message = `The Horwitz function needs a mass fraction such as ug/kg; ${entry.unit} is none. Choose another rule.`;
      throw new AppError('invalid', message, { fieldErrors: { sigmaRule: message } });
    }
    await updateRoundMeasurand(trx, { id, roundId: round.id }, input);
    return `${entry.itemCode} ${entry.code}`;
  });
}

export async function dropRoundMeasurand(actor: Actor, slug: string, id: number): Promise<void> {
  await editDraft(actor, slug, 'measurand.removed', async (trx, round) => {
    const count = await removeRoundMeasurand(trx, { id, roundId: round.id });
    if (count === 0) throw notFound('The measurand');
    return String(id);
  });
}
