'use client';

import dynamic from 'next/dynamic';
import { FormDialog } from './form-dialog';
import { FormOnItsWay } from './form-on-its-way';
import type { MeasurandFormProps } from './measurand-form';

// The form checks while one types, which takes code that the page itself does not need.
const MeasurandForm = dynamic(() => import('./measurand-form').then((module) => module.MeasurandForm), {
  loading: FormOnItsWay,
});

export function MeasurandDialog(props: Omit<MeasurandFormProps, 'onDone'>) {
  const isNew = props.values.id === undefined;
  return (
    <FormDialog
      label={isNew ? 'Add measurand' : `Edit ${props.values.code}`}
      title={isNew ? 'Add a measurand' : `Measurand ${props.values.code}`}
      variant={isNew ? 'primary' : 'quiet'}
      size={isNew ? 'normal' : 'small'}
      wide
    >
      {(close) => <MeasurandForm {...props} onDone={close} />}
    </FormDialog>
  );
}
