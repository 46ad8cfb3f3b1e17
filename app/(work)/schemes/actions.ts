'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import * as z from 'zod';
import { formAction } from '@/lib/action';
import { requiredText } from '@/lib/schemas/fields';
import { measurandSchema, schemeSchema } from '@/lib/schemas/schemes';
import { addMeasurand, addScheme, changeMeasurand, changeScheme } from '@/lib/services/schemes';

const inScheme = z.object({ scheme: requiredText('the scheme') });
const oneMeasurand = inScheme.extend({ measurand: z.coerce.number().int() });

export const createSchemeAction = formAction({
  permission: 'scheme:edit',
  schema: schemeSchema,
  run: async (input, { actor }) => {
    const { slug } = await addScheme(actor, input);
    redirect(`/schemes/${slug}`);
  },
});

export const changeSchemeAction = formAction({
  permission: 'scheme:edit',
  schema: z.intersection(inScheme, schemeSchema),
  run: async ({ scheme, ...input }, { actor }) => {
    await changeScheme(actor, scheme, input);
    revalidatePath('/schemes', 'layout');
  },
});

export const addMeasurandAction = formAction({
  permission: 'scheme:edit',
  schema: z.intersection(inScheme, measurandSchema),
  run: async ({ scheme, ...input }, { actor }) => {
    await addMeasurand(actor, scheme, input);
    revalidatePath('/schemes', 'layout');
  },
});

export const changeMeasurandAction = formAction({
  permission: 'scheme:edit',
  schema: z.intersection(oneMeasurand, measurandSchema),
  run: async ({ scheme, measurand, ...input }, { actor }) => {
    await changeMeasurand(actor, scheme, measurand, input);
    revalidatePath('/schemes', 'layout');
  },
});
