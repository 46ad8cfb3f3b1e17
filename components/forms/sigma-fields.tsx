import { NumberInput, Select } from '@/components/ui/controls';
import { SIGMA_RULE_NAMES } from '@/lib/schemas/schemes';

type FieldWiring = { name: string; error?: string; defaultValue?: string };

export type SigmaFieldsProps = {
  rule: string;
  unit: string;
  field: (name: string) => FieldWiring;
};

export const SIGMA_OPTIONS = Object.entries(SIGMA_RULE_NAMES).map(([value, label]) => ({ value, label }));

/** How sigma_pt is set, and the number that the chosen rule needs. */
export function SigmaFields({ rule, unit, field }: SigmaFieldsProps) {
  return (
    <>
      <Select label="How sigma_pt is set" options={SIGMA_OPTIONS} {...field('sigmaRule')} />
      {rule === 'prescribed' && (
        <NumberInput label="sigma_pt" unit={unit || 'unit of the results'} {...field('sigmaValue')} />
      )}
      {rule === 'percent' && (
        <NumberInput label="sigma_pt in percent of the assigned value" unit="%" {...field('sigmaPercent')} />
      )}
    </>
  );
}
