import * as z from 'zod';
import {
  checkbox,
  codeText,
  optionalNumber,
  optionalText,
  requiredText,
  utcDateTime,
  wholeNumber,
} from './fields';
import { settleSigma, sigmaFields } from './schemes';

export const ASSIGNED_METHOD_NAMES = {
  'algorithm-a': 'Robust mean of the participants (Algorithm A)',
  median: 'Median of the participants',
  mean: 'Mean of the participants',
  stated: 'Stated beforehand (formulation, reference material, reference or expert laboratories)',
} as const;

export const SCORE_KIND_NAMES = {
  z: 'z',
  'z-prime': "z' (with the uncertainty of the assigned value)",
  zeta: 'zeta (with the uncertainty of each result)',
  'e-n': 'E_n (with expanded uncertainties)',
} as const;

export const CURRENCIES = ['EUR', 'USD', 'GBP', 'CHF'] as const;
export const MAX_REPLICATES = 10;

export const roundSchema = z
  .object({
    name: requiredText('a name for the round'),
    isPast: checkbox,
    opensAt: utcDateTime('the opening date'),
    dispatchAt: utcDateTime('the dispatch date'),
    closesAt: utcDateTime('the closing date'),
    publishAt: utcDateTime('the publication date'),
    instructions: optionalText(),
    fee: optionalNumber('the fee', { min: 0, max: 1_000_000 }).refine(
      (fee) => fee === null || Number(fee.toFixed(2)) === fee,
      'Enter the fee with at most two decimals.',
    ),
    feeCurrency: z.enum(CURRENCIES).default('EUR'),
  })
  .superRefine((round, context) => {
    const inOrder = [
      ['dispatchAt', round.opensAt, round.dispatchAt, 'The dispatch must not be before the opening.'],
      ['closesAt', round.dispatchAt, round.closesAt, 'The close must not be before the dispatch.'],
      ['publishAt', round.closesAt, round.publishAt, 'The publication must not be before the close.'],
    ] as const;
    for (const [path, earlier, later, message] of inOrder) {
      if (earlier && later && later < earlier) context.addIssue({ code: 'custom', path: [path], message });
    }
  })
  .transform(({ fee, ...round }) => ({ ...round, feeCents: Math.round((fee ?? 0) * 100) }));

export const newRoundSchema = z.intersection(z.object({ scheme: requiredText('the scheme') }), roundSchema);

export const testItemSchema = z.object({
  code: codeText('the code on the label'),
  name: requiredText('what the item is'),
  matrix: optionalText(200),
  handling: optionalText(),
});

export const roundMeasurandSchema = z
  .object({
    replicates: wholeNumber('the number of replicates', 1, MAX_REPLICATES),
    assignedMethod: z.enum(['algorithm-a', 'median', 'mean', 'stated'], {
      error: 'Choose how the assigned value is set.',
    }),
    statedValue: optionalNumber('the assigned value'),
    statedUncertainty: optionalNumber('the standard uncertainty', { min: 0 }),
    statedSource: optionalText(500).transform((text) => text || null),
    ...sigmaFields,
    scoreKind: z.enum(['z', 'z-prime', 'zeta', 'e-n'], { error: 'Choose the score.' }),
    zPrimeWhenNeeded: checkbox,
  })
  .transform((plan, context) => {
    if (plan.assignedMethod === 'stated' && plan.statedValue === null) {
      context.addIssue({ code: 'custom', path: ['statedValue'], message: 'Enter the assigned value.' });
    }
    if (plan.assignedMethod === 'stated' && !plan.statedSource) {
      context.addIssue({
        code: 'custom',
        path: ['statedSource'],
        message: 'Say where the assigned value comes from.',
      });
    }
    const isStated = plan.assignedMethod === 'stated';
    return settleSigma(
      {
        ...plan,
        statedValue: isStated ? plan.statedValue : null,
        statedUncertainty: isStated ? plan.statedUncertainty : null,
        statedSource: isStated ? plan.statedSource : null,
      },
      context,
    );
  });

export type RoundInput = z.output<typeof roundSchema>;
export type TestItemInput = z.output<typeof testItemSchema>;
export type RoundMeasurandInput = z.output<typeof roundMeasurandSchema>;
