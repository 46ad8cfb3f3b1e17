'use server';

import { revalidatePath } from 'next/cache';
import * as z from 'zod';
import { formAction } from '@/lib/action';
import { requiredNote, requiredText } from '@/lib/schemas/fields';
import { enrolLaboratories, moveEnrolment } from '@/lib/services/enrolments';

const inRound = z.object({ round: requiredText('the round') });
const oneLaboratory = inRound.extend({ laboratory: z.coerce.number().int().positive() });

/** Ids come joined by commas: a form with a field for each of some hundred laboratories is slow to send. */
const laboratoryIds = z
  .string()
  .transform((text) => text.split(',').filter(Boolean).map(Number))
  .pipe(z.array(z.int().positive()).min(1, 'Tick at least one laboratory.').max(5_000));

export const addLaboratoriesAction = formAction({
  permission: 'enrolment:edit',
  schema: inRound.extend({ laboratories: laboratoryIds, state: z.enum(['invited', 'enrolled']) }),
  run: async ({ round, laboratories, state }, { actor }) => {
    await enrolLaboratories(actor, round, laboratories, state);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});

export const withdrawAction = formAction({
  permission: 'enrolment:edit',
  schema: oneLaboratory.extend({ reason: requiredNote('the reason', 500) }),
  run: async ({ round, laboratory, reason }, { actor }) => {
    await moveEnrolment(actor, round, laboratory, 'withdrawn', reason);
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});

export const enrolAction = formAction({
  permission: 'enrolment:edit',
  schema: oneLaboratory,
  run: async ({ round, laboratory }, { actor }) => {
    await moveEnrolment(actor, round, laboratory, 'enrolled');
    revalidatePath(`/rounds/${round}`, 'layout');
  },
});
