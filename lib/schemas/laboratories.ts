import * as z from 'zod';
import { checkbox, requiredText } from './fields';
import { idNumber } from './people';
import { emailText } from './sign-in';

export const LABORATORY_KINDS = {
  'grain-terminal': 'Grain terminal',
  mill: 'Mill',
  'feed-maker': 'Feed maker',
  dairy: 'Dairy',
  public: 'Public laboratory',
  contract: 'Contract laboratory',
  other: 'Other',
} as const;

export type LaboratoryKind = keyof typeof LABORATORY_KINDS;

const KINDS = Object.keys(LABORATORY_KINDS) as [LaboratoryKind, ...LaboratoryKind[]];

export function laboratoryKindName(kind: string): string {
  return kind in LABORATORY_KINDS ? LABORATORY_KINDS[kind as LaboratoryKind] : kind;
}

const fields = {
  name: requiredText('a name'),
  kind: z.enum(KINDS, { error: 'Choose a kind.' }),
  town: z.string().trim().max(120, 'Shorten this to 120 characters.').optional().default(''),
  contactEmail: z
    .literal('')
    .transform(() => null)
    .or(emailText)
    .optional()
    .default(null),
};

export const newLaboratorySchema = z.object(fields);
export const changeLaboratorySchema = z.object({ id: idNumber, ...fields, isActive: checkbox });

export type NewLaboratoryInput = z.output<typeof newLaboratorySchema>;
export type ChangeLaboratoryInput = z.output<typeof changeLaboratorySchema>;
