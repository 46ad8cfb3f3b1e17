'use server';

import { revalidatePath } from 'next/cache';
import { formAction } from '@/lib/action';
import { colleagueRoleSchema, inviteColleagueSchema, personSchema } from '@/lib/schemas/people';
import { inviteColleague, inviteColleagueAgain, removeColleague } from '@/lib/services/colleagues';

export const inviteColleagueAction = formAction({
  permission: 'own:people',
  schema: inviteColleagueSchema,
  run: async (input, { actor }) => {
    await inviteColleague(actor, input);
    revalidatePath('/laboratory/people');
    return { name: input.name };
  },
});

export const removeColleagueAction = formAction({
  permission: 'own:people',
  schema: colleagueRoleSchema,
  run: async (input, { actor }) => {
    await removeColleague(actor, input);
    revalidatePath('/laboratory/people');
  },
});

export const inviteAgainAction = formAction({
  permission: 'own:people',
  schema: personSchema,
  run: async ({ userId }, { actor }) => inviteColleagueAgain(actor, userId),
});
