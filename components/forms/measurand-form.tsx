'use client';

import { NumberInput, TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { measurandSchema } from '@/lib/schemas/schemes';
import { SigmaFields } from './sigma-fields';
import { useCheckedForm } from './use-checked-form';
import type { FormAction } from './use-server-form';

export type MeasurandValues = {
  id?: number;
  code: string;
  name: string;
  unit: string;
  decimals: string;
  decisionLimit: string;
  decisionLimitSource: string;
  sigmaRule: string;
  sigmaValue: string;
  sigmaPercent: string;
};

export type MeasurandFormProps = {
  action: FormAction;
  scheme: string;
  values: MeasurandValues;
  onDone?: () => void;
};

export function MeasurandForm({ action, scheme, values, onDone }: MeasurandFormProps) {
  const { id, ...defaults } = values;
  const form = useCheckedForm(measurandSchema, action, defaults, onDone);
  const unit = String(form.watch('unit') ?? '');
  return (
    <form {...form.formProps} className="flex flex-col gap-4">
      <input type="hidden" name="scheme" value={scheme} />
      {id !== undefined && <input type="hidden" name="measurand" value={id} />}
      <div className="grid gap-4 sm:grid-cols-2">
        <TextInput label="Code" hint="As in results files, such as AFT" {...form.field('code')} />
        <TextInput label="Name" hint="Such as Aflatoxins, total" {...form.field('name')} />
        <TextInput label="Unit" hint="A UCUM code, such as ug/kg" {...form.field('unit')} />
        <NumberInput label="Decimals" hint="Digits after the point in tables" {...form.field('decimals')} />
        <NumberInput
          label="Decision limit"
          optional
          hint="The regulatory or contract limit, if there is one"
          unit={unit}
          {...form.field('decisionLimit')}
        />
        <TextInput
          label="Source of the limit"
          optional
          hint="Regulation and date; the person in charge confirms which limit applies"
          {...form.field('decisionLimitSource')}
        />
        <SigmaFields rule={String(form.watch('sigmaRule') ?? '')} unit={unit} field={form.field} />
      </div>
      <FormMessage>{form.formError}</FormMessage>
      <div>
        <SubmitButton pending={form.pending} pendingLabel="Saving">
          {id === undefined ? 'Add measurand' : 'Save measurand'}
        </SubmitButton>
      </div>
    </form>
  );
}
