'use client';

import { Checkbox, NumberInput, Select, TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { ASSIGNED_METHOD_NAMES, roundMeasurandSchema, SCORE_KIND_NAMES } from '@/lib/schemas/rounds';
import { SigmaFields } from './sigma-fields';
import { useCheckedForm } from './use-checked-form';
import type { FormAction } from './use-server-form';

export type MeasurandPlanValues = {
  replicates: string;
  assignedMethod: string;
  statedValue: string;
  statedUncertainty: string;
  statedSource: string;
  sigmaRule: string;
  sigmaValue: string;
  sigmaPercent: string;
  scoreKind: string;
  zPrimeWhenNeeded: boolean;
};

export type MeasurandPlanProps = {
  action: FormAction;
  round: string;
  measurand: { id: number; name: string; unit: string };
  values: MeasurandPlanValues;
};

const optionsOf = (names: Record<string, string>) =>
  Object.entries(names).map(([value, label]) => ({ value, label }));

export function MeasurandPlanForm({
  action,
  round,
  measurand,
  values,
  onDone,
}: MeasurandPlanProps & { onDone: () => void }) {
  const form = useCheckedForm(roundMeasurandSchema, action, values, onDone);
  const isStated = form.watch('assignedMethod') === 'stated';
  const { unit } = measurand;
  return (
    <form {...form.formProps} className="flex flex-col gap-4">
      <input type="hidden" name="round" value={round} />
      <input type="hidden" name="measurand" value={measurand.id} />
      <NumberInput label="Replicates" hint="Results each laboratory reports" {...form.field('replicates')} />
      <Select
        label="How the assigned value is set"
        options={optionsOf(ASSIGNED_METHOD_NAMES)}
        {...form.field('assignedMethod')}
      />
      {isStated && (
        <div className="grid gap-4 sm:grid-cols-2">
          <NumberInput label="Assigned value" unit={unit} {...form.field('statedValue')} />
          <NumberInput
            label="Standard uncertainty of it"
            optional
            unit={unit}
            {...form.field('statedUncertainty')}
          />
          <TextInput
            label="Where it comes from"
            hint="Certificate, formulation record, expert laboratories"
            {...form.field('statedSource')}
          />
        </div>
      )}
      <div className="grid gap-4 sm:grid-cols-2">
        <SigmaFields rule={String(form.watch('sigmaRule') ?? '')} unit={unit} field={form.field} />
      </div>
      <Select label="Score" options={optionsOf(SCORE_KIND_NAMES)} {...form.field('scoreKind')} />
      <Checkbox
        label="Use z' instead of z when u(x_pt) is above 0.3 sigma_pt"
        value="on"
        {...form.tick('zPrimeWhenNeeded')}
      />
      <FormMessage>{form.formError}</FormMessage>
      <div>
        <SubmitButton pending={form.pending} pendingLabel="Saving">
          Save plan
        </SubmitButton>
      </div>
    </form>
  );
}
