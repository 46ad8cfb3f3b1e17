'use server';

import { redirect } from 'next/navigation';
import { openFormAction } from '@/lib/action';
import { startSession } from '@/lib/auth/start-session';
import { linkPasswordSchema, resetRequestSchema } from '@/lib/schemas/sign-in';
import { askForReset, setPasswordByLink } from '@/lib/services/passwords';

export const welcomeAction = openFormAction({
  schema: linkPasswordSchema,
  run: async ({ link, password }) => {
    const { sessionId } = await setPasswordByLink({ token: link, purpose: 'welcome', password });
    redirect(await startSession(sessionId));
  },
});

export const resetAction = openFormAction({
  schema: linkPasswordSchema,
  run: async ({ link, password }) => {
    const { sessionId } = await setPasswordByLink({ token: link, purpose: 'reset', password });
    redirect(await startSession(sessionId));
  },
});

export const askForResetAction = openFormAction({
  schema: resetRequestSchema,
  run: async ({ email }) => {
    await askForReset(email);
    return { email };
  },
});
