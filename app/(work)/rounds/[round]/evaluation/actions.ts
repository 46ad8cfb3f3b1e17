'use server';

import { revalidatePath } from 'next/cache';
import * as z from 'zod';
import { dataAction, formAction } from '@/lib/action';
import { optionalText, requiredNote, requiredText } from '@/lib/schemas/fields';
import { FIGURES, getFigureWorking } from '@/lib/services/show-working';
import { returnEvaluation, signEvaluation } from '@/lib/services/sign-evaluation';

const oneVersion = z.object({
  round: requiredText('the round'),
  version: z.coerce.number().int().positive(),
});

/** That the signer did not prepare the version is checked by the service, against the version as it is stored. */
export const signAction = formAction({
  permission: 'round:sign',
  schema: oneVersion.extend({ comment: optionalText(2_000) }),
  run: async ({ round, version, comment }, { actor }) => {
    await signEvaluation(actor, round, version, comment);
    revalidatePath('/rounds', 'layout');
  },
});

export const returnAction = formAction({
  permission: 'round:sign',
  schema: oneVersion.extend({ reason: requiredNote('the reason', 2_000) }),
  run: async ({ round, version, reason }, { actor }) => {
    await returnEvaluation(actor, round, version, reason);
    revalidatePath('/rounds', 'layout');
  },
});

export const figureWorkingAction = dataAction({
  permission: 'round:see-results',
  schema: z.object({ round: z.string(), measurand: z.number().int(), figure: z.enum(FIGURES) }),
  run: ({ round, measurand, figure }) => getFigureWorking(round, measurand, figure),
});
