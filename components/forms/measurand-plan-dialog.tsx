'use client';

import dynamic from 'next/dynamic';
import { FormDialog } from './form-dialog';
import { FormOnItsWay } from './form-on-its-way';
import type { MeasurandPlanProps } from './measurand-plan-form';

const MeasurandPlanForm = dynamic(
  () => import('./measurand-plan-form').then((module) => module.MeasurandPlanForm),
  { loading: FormOnItsWay },
);

export function MeasurandPlanDialog(props: MeasurandPlanProps) {
  return (
    <FormDialog
      label={`Change ${props.measurand.name}`}
      title={`How ${props.measurand.name} is evaluated`}
      variant="quiet"
      size="small"
      wide
    >
      {(close) => <MeasurandPlanForm {...props} onDone={close} />}
    </FormDialog>
  );
}
