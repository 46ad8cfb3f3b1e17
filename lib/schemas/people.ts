import * as z from 'zod';
import { LABORATORY_ROLES, PROVIDER_ROLES } from '@/lib/rules/roles';
import { requiredText, wholeNumber } from './fields';
import { emailText } from './sign-in';

const MAX_ID = 999_999_999;

export const idNumber = wholeNumber('a number', 1, MAX_ID);

const laboratoryRole = z.enum(LABORATORY_ROLES, { error: 'Choose a role.' });
const providerRoles = z.array(z.enum(PROVIDER_ROLES)).optional().default([]);

const noLaboratory = z.literal('').transform(() => null);

export const invitePersonSchema = z
  .object({
    name: requiredText('a name'),
    email: emailText,
    providerRoles,
    laboratoryId: noLaboratory.or(idNumber).optional().default(null),
    laboratoryRole: laboratoryRole.optional().default('analyst'),
  })
  .refine((fields) => fields.providerRoles.length > 0 || fields.laboratoryId !== null, {
    path: ['providerRoles'],
    error: 'Choose at least one role, or a laboratory.',
  });

export const changePersonSchema = z.object({
  userId: idNumber,
  name: requiredText('a name'),
  providerRoles,
});

export const personSchema = z.object({ userId: idNumber });

export const laboratoryRoleSchema = z.object({
  userId: idNumber,
  laboratoryId: z
    .string()
    .regex(/^\d{1,9}$/, 'Choose a laboratory.')
    .transform(Number),
  role: laboratoryRole,
});

export const inviteColleagueSchema = z.object({
  name: requiredText('a name'),
  email: emailText,
  role: laboratoryRole,
});

export const colleagueRoleSchema = z.object({ userId: idNumber, role: laboratoryRole });

export const mailIdSchema = z.object({ id: idNumber });

export const switchLaboratorySchema = z.object({ laboratoryId: idNumber });

export type InvitePersonInput = z.output<typeof invitePersonSchema>;
export type ChangePersonInput = z.output<typeof changePersonSchema>;
export type LaboratoryRoleInput = z.output<typeof laboratoryRoleSchema>;
export type InviteColleagueInput = z.output<typeof inviteColleagueSchema>;
export type ColleagueRoleInput = z.output<typeof colleagueRoleSchema>;
