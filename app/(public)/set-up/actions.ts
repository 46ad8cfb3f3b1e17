'use server';

import { redirect } from 'next/navigation';
import { openFormAction } from '@/lib/action';
import { startSession } from '@/lib/auth/start-session';
import { setUpSchema } from '@/lib/schemas/sign-in';
import { setUp } from '@/lib/services/set-up';

export const setUpAction = openFormAction({
  schema: setUpSchema,
  run: async (input) => {
    const { sessionId } = await setUp(input);
    redirect(await startSession(sessionId));
  },
});
