'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import * as z from 'zod';
import { formAction } from '@/lib/action';
import { dropSessionCookie } from '@/lib/auth/start-session';
import { switchLaboratorySchema } from '@/lib/schemas/people';
import { changePasswordSchema } from '@/lib/schemas/sign-in';
import { signOut, signOutEverywhere, switchLaboratory } from '@/lib/services/account';
import { changePassword } from '@/lib/services/passwords';

const nothing = z.object({});

const switchTo = formAction({
  permission: 'signed-in',
  schema: switchLaboratorySchema,
  run: async ({ laboratoryId }, context) => {
    await switchLaboratory(context, laboratoryId);
    revalidatePath('/', 'layout');
    redirect('/laboratory');
  },
});

const endThis = formAction({
  permission: 'signed-in',
  schema: nothing,
  run: async (_input, context) => {
    await signOut(context);
    await dropSessionCookie();
    redirect('/sign-in');
  },
});

const endAll = formAction({
  permission: 'signed-in',
  schema: nothing,
  run: async (_input, context) => {
    await signOutEverywhere(context);
    await dropSessionCookie();
    redirect('/sign-in');
  },
});

// These stand in plain forms, which have nowhere to show a result; whoever is refused stays where they are.
export async function switchLaboratoryAction(form: FormData): Promise<void> {
  await switchTo(null, form);
}

export async function signOutAction(form: FormData): Promise<void> {
  await endThis(null, form);
}

export async function signOutEverywhereAction(form: FormData): Promise<void> {
  await endAll(null, form);
}

export const changePasswordAction = formAction({
  permission: 'signed-in',
  schema: changePasswordSchema,
  run: async (input, { actor, sessionId }) => {
    await changePassword(actor, { ...input, sessionId });
    revalidatePath('/account');
  },
});
