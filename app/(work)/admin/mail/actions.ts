'use server';

import { revalidatePath } from 'next/cache';
import { formAction } from '@/lib/action';
import { mailIdSchema } from '@/lib/schemas/people';
import { sendMailAgain } from '@/lib/services/mail';

export const sendMailAgainAction = formAction({
  permission: 'mail:view',
  schema: mailIdSchema,
  run: async ({ id }, { actor }) => {
    await sendMailAgain(actor, id);
    revalidatePath('/admin/mail', 'layout');
  },
});
