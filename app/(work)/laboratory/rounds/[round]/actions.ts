'use server';

import { revalidatePath } from 'next/cache';
import { formAction } from '@/lib/action';
import { declineSchema, ownRoundSchema } from '@/lib/schemas/own-round';
import { confirmReceipt } from '@/lib/services/enrolments';
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
