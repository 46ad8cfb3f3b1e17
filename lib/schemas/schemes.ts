import * as z from 'zod';
import { massFractionPerUnit } from '@/lib/units';
import { codeText, optionalNumber, optionalText, requiredText, wholeNumber } from './fields';

export const SIGMA_RULE_NAMES = {
  prescribed: 'Prescribed value',
  percent: 'Percent of the assigned value',
  horwitz: 'Horwitz function',
  'horwitz-thompson': 'Horwitz function, modified by Thompson',
  'robust-sd': 'Robust standard deviation of this round',
} as const;

export const sigmaFields = {
  sigmaRule: z.enum(
    Object.keys(SIGMA_RULE_NAMES) as [keyof typeof SIGMA_RULE_NAMES, ...(keyof typeof SIGMA_RULE_NAMES)[]],
    { error: 'Choose how sigma_pt is set.' },
  ),
  sigmaValue: optionalNumber('sigma_pt', { above: 0 }),
  sigmaPercent: optionalNumber('the percentage', { above: 0, max: 100 }),
};

interface SigmaChoice {
  sigmaRule: keyof typeof SIGMA_RULE_NAMES;
  sigmaValue: number | null;
  sigmaPercent: number | null;
}

/** The rule's own number must be there; numbers of the other rules are dropped. */
export function settleSigma<T extends SigmaChoice>(choice: T, context: z.RefinementCtx<unknown>): T {
  if (choice.sigmaRule === 'prescribed' && choice.sigmaValue === null) {
    context.addIssue({
      code: 'custom',
      path: ['sigmaValue'],
      message: 'Enter sigma_pt in the unit of the results.',
    });
  }
  if (choice.sigmaRule === 'percent' && choice.sigmaPercent === null) {
    context.addIssue({
      code: 'custom',
      path: ['sigmaPercent'],
      message: 'Enter sigma_pt as a percentage of the assigned value.',
    });
  }
  return {
    ...choice,
    sigmaValue: choice.sigmaRule === 'prescribed' ? choice.sigmaValue : null,
    sigmaPercent: choice.sigmaRule === 'percent' ? choice.sigmaPercent : null,
  };
}

export const schemeSchema = z.object({
  name: requiredText('a name for the scheme'),
  description: optionalText(),
});

export const measurandSchema = z
  .object({
    code: codeText('the code'),
    name: requiredText('the name of the measurand'),
    unit: requiredText('the unit', 20).regex(
      /^\S+$/,
      'Enter the unit without spaces, as a UCUM code such as ug/kg.',
    ),
    decimals: wholeNumber('the number of decimals', 0, 8),
    decisionLimit: optionalNumber('the decision limit', { above: 0 }),
    decisionLimitSource: optionalText(200).transform((text) => text || null),
    ...sigmaFields,
  })
  .transform((measurand, context) => {
    if (measurand.sigmaRule.startsWith('horwitz') && massFractionPerUnit(measurand.unit) === null) {
      context.addIssue({
        code: 'custom',
        path: ['sigmaRule'],
        message: `The Horwitz function needs a mass fraction such as ug/kg; ${measurand.unit} is none. Choose another rule.`,
      });
    }
    return settleSigma(measurand, context);
  });

export type SchemeInput = z.output<typeof schemeSchema>;
export type MeasurandInput = z.output<typeof measurandSchema>;
