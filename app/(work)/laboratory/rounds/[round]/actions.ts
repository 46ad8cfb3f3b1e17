'use server';

import { revalidatePath } from 'next/cache';
import * as z from 'zod';
import { dataAction, formAction } from '@/lib/action';
import { declineSchema, ownRoundSchema } from '@/lib/schemas/own-round';
import { confirmReceipt } from '@/lib/services/enrolments';
import { getOwnFigureWorking } from '@/lib/services/own-scores';
import { FIGURES } from '@/lib/services/show-working';
import { answerInvitation } from '@/lib/services/invitation-answers';

const ofLaboratory = ({ laboratory }: { laboratory: number }) => ({ laboratoryId: laboratory });

export const acceptInvitationAction = formAction({
  permission: 'own:enrol',
  subject: ofLaboratory,
  schema: ownRoundSchema,
  run: async ({ round, laboratory }, { actor }) => {
    await answerInvitation(actor, round, laboratory, 'enrolled');
    revalidatePath('/laboratory', 'layout');
  },
});

export const declineInvitationAction = formAction({
  permission: 'own:enrol',
  subject: ofLaboratory,
  schema: declineSchema,
  run: async ({ round, laboratory, reason }, { actor }) => {
    await answerInvitation(actor, round, laboratory, 'declined', reason);
    revalidatePath('/laboratory', 'layout');
  },
});

export const confirmItemsAction = formAction({
  permission: 'own:receive',
  subject: ofLaboratory,
  schema: ownRoundSchema,
  run: async ({ round, laboratory }, { actor }) => {
    await confirmReceipt(actor, round, laboratory);
    revalidatePath('/laboratory', 'layout');
  },
});

export const ownFigureWorkingAction = dataAction({
  permission: 'own:view',
  subject: ofLaboratory,
  schema: ownRoundSchema.extend({ measurand: z.number().int(), figure: z.enum(FIGURES) }),
  run: ({ round, laboratory, measurand, figure }) =>
    getOwnFigureWorking(round, laboratory, measurand, figure),
});
