'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { formAction } from '@/lib/action';
import { changeLaboratorySchema, newLaboratorySchema } from '@/lib/schemas/laboratories';
import { addLaboratory, changeLaboratory } from '@/lib/services/laboratories';

export const addLaboratoryAction = formAction({
  permission: 'laboratory:edit',
  schema: newLaboratorySchema,
  run: async (input, { actor }) => {
    const { id } = await addLaboratory(actor, input);
    redirect(`/laboratories/${id}`);
  },
});

export const changeLaboratoryAction = formAction({
  permission: 'laboratory:edit',
  schema: changeLaboratorySchema,
  run: async (input, { actor }) => {
    await changeLaboratory(actor, input);
    revalidatePath('/laboratories', 'layout');
  },
});
