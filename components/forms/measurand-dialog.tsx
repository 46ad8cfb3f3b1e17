'use client';

import { FormDialog } from './form-dialog';
import { MeasurandForm, type MeasurandFormProps } from './measurand-form';

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
