'use server';

import { revalidatePath } from 'next/cache';
import { formAction } from '@/lib/action';
import { newTokenSchema, revokeTokenSchema } from '@/lib/schemas/tokens';
import { addToken, revokeToken } from '@/lib/services/tokens';

export const addTokenAction = formAction({
  permission: 'own:tokens',
  schema: newTokenSchema,
  run: async (input, { actor }) => {
    const { name, token } = await addToken(actor, input);
    revalidatePath('/laboratory/tokens');
    return { name, token };
  },
});

export const revokeTokenAction = formAction({
  permission: 'own:tokens',
  schema: revokeTokenSchema,
  run: async ({ id }, { actor }) => {
    await revokeToken(actor, id);
    revalidatePath('/laboratory/tokens');
  },
});
