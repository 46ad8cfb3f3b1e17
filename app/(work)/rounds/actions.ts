'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import * as z from 'zod';
import { formAction } from '@/lib/action';
import { requiredNote, requiredText } from '@/lib/schemas/fields';
import { newRoundSchema } from '@/lib/schemas/rounds';
import { evaluateRound } from '@/lib/services/evaluate-round';
import { addRound } from '@/lib/services/round-plan';
import { cancelRound, closeRound, openRound, publishRound } from '@/lib/services/round-steps';

const inRound = z.object({ round: requiredText('the round') });

export const createRoundAction = formAction({
  permission: 'round:edit',
  schema: newRoundSchema,
  run: async ({ scheme, ...input }, { actor }) => {
    const { slug } = await addRound(actor, scheme, input);
    redirect(`/rounds/${slug}/plan`);
  },
});

export const openRoundAction = formAction({
  permission: 'round:open',
  schema: inRound,
  run: async ({ round }, { actor }) => {
    await openRound(actor, round);
    revalidatePath('/rounds', 'layout');
    redirect(`/rounds/${round}/participants`);
  },
});

export const closeRoundAction = formAction({
  permission: 'round:close',
  schema: inRound,
  run: async ({ round }, { actor }) => {
    await closeRound(actor, round);
    revalidatePath('/rounds', 'layout');
    redirect(`/rounds/${round}/results`);
  },
});

export const evaluateRoundAction = formAction({
  permission: 'round:evaluate',
  schema: inRound,
  run: async ({ round }, { actor }) => {
    await evaluateRound(actor, round);
    revalidatePath('/rounds', 'layout');
    redirect(`/rounds/${round}/evaluation`);
  },
});

export const publishRoundAction = formAction({
  permission: 'round:publish',
  schema: inRound,
  run: async ({ round }, { actor }) => {
    await publishRound(actor, round);
    revalidatePath('/rounds', 'layout');
    redirect(`/rounds/${round}/report`);
  },
});

export const cancelRoundAction = formAction({
  permission: 'round:cancel',
  schema: inRound.extend({ reason: requiredNote('the reason', 500) }),
  run: async ({ round, reason }, { actor }) => {
    await cancelRound(actor, round, reason);
    revalidatePath('/rounds', 'layout');
  },
});
