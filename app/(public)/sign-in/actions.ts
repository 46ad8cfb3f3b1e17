'use server';

import { redirect } from 'next/navigation';
import { openFormAction } from '@/lib/action';
import { startSession } from '@/lib/auth/start-session';
import { signInSchema } from '@/lib/schemas/sign-in';
import { signIn } from '@/lib/services/sign-in';

export const signInAction = openFormAction({
  schema: signInSchema,
  run: async ({ email, password, from }) => {
    const { sessionId } = await signIn({ email, password });
    redirect(await startSession(sessionId, from));
  },
});
