'use server';

import { revalidatePath } from 'next/cache';
import * as z from 'zod';
import { formAction } from '@/lib/action';
import { requiredText } from '@/lib/schemas/fields';
import { roundMeasurandSchema, roundSchema, testItemSchema } from '@/lib/schemas/rounds';
import {
  addRoundMeasurand,
  addTestItem,
  changeRound,
  changeRoundMeasurand,
  changeTestItem,
  dropRoundMeasurand,
  dropTestItem,
} from '@/lib/services/round-plan';

const inRound = z.object({ round: requiredText('the round') });
const rowId = z.coerce.number().int().positive();

export const changeRoundAction = formAction({
  permission: 'round:edit',
  schema: z.intersection(inRound, roundSchema),
  run: async ({ round, ...input }, { actor }) => {
    await changeRound(actor, round, input);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});

export const addItemAction = formAction({
  permission: 'round:edit',
  schema: testItemSchema.extend({ ...inRound.shape, measurands: z.array(rowId).default([]) }),
  run: async ({ round, measurands, ...input }, { actor }) => {
    await addTestItem(actor, round, input, measurands);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});

export const changeItemAction = formAction({
  permission: 'round:edit',
  schema: testItemSchema.extend({ ...inRound.shape, item: rowId }),
  run: async ({ round, item, ...input }, { actor }) => {
    await changeTestItem(actor, round, item, input);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});

export const dropItemAction = formAction({
  permission: 'round:edit',
  schema: inRound.extend({ item: rowId }),
  run: async ({ round, item }, { actor }) => {
    await dropTestItem(actor, round, item);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});

export const addMeasurandAction = formAction({
  permission: 'round:edit',
  schema: inRound.extend({ item: rowId, measurand: rowId }),
  run: async ({ round, item, measurand }, { actor }) => {
    await addRoundMeasurand(actor, round, item, measurand);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});

export const changeMeasurandAction = formAction({
  permission: 'round:edit',
  schema: z.intersection(inRound.extend({ measurand: rowId }), roundMeasurandSchema),
  run: async ({ round, measurand, ...input }, { actor }) => {
    await changeRoundMeasurand(actor, round, measurand, input);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});

export const dropMeasurandAction = formAction({
  permission: 'round:edit',
  schema: inRound.extend({ measurand: rowId }),
  run: async ({ round, measurand }, { actor }) => {
    await dropRoundMeasurand(actor, round, measurand);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});
