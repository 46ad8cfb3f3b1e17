'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { formAction } from '@/lib/action';
import {
  changePersonSchema,
  invitePersonSchema,
  laboratoryRoleSchema,
  personSchema,
} from '@/lib/schemas/people';
import {
  changePerson,
  disablePerson,
  enablePerson,
  giveLaboratoryRole,
  invitePerson,
  sendNewLink,
  takeLaboratoryRole,
} from '@/lib/services/people';

function refreshPeople(): void {
  revalidatePath('/admin/people', 'layout');
}

export const invitePersonAction = formAction({
  permission: 'people:edit',
  schema: invitePersonSchema,
  run: async (input, { actor }) => {
    const { userId } = await invitePerson(actor, input);
    redirect(`/admin/people/${userId}?invited=1`);
  },
});

export const changePersonAction = formAction({
  permission: 'people:edit',
  schema: changePersonSchema,
  run: async (input, { actor }) => {
    await changePerson(actor, input);
    refreshPeople();
  },
});

export const giveLaboratoryRoleAction = formAction({
  permission: 'people:edit',
  schema: laboratoryRoleSchema,
  run: async (input, { actor }) => {
    await giveLaboratoryRole(actor, input);
    refreshPeople();
  },
});

export const takeLaboratoryRoleAction = formAction({
  permission: 'people:edit',
  schema: laboratoryRoleSchema,
  run: async (input, { actor }) => {
    await takeLaboratoryRole(actor, input);
    refreshPeople();
  },
});

export const disablePersonAction = formAction({
  permission: 'people:edit',
  schema: personSchema,
  run: async ({ userId }, { actor }) => {
    await disablePerson(actor, userId);
    refreshPeople();
  },
});

export const enablePersonAction = formAction({
  permission: 'people:edit',
  schema: personSchema,
  run: async ({ userId }, { actor }) => {
    await enablePerson(actor, userId);
    refreshPeople();
  },
});

export const sendLinkAction = formAction({
  permission: 'people:edit',
  schema: personSchema,
  run: async ({ userId }, { actor }) => sendNewLink(actor, userId),
});
