'use client';

import { FormDialog } from './form-dialog';
import { SchemeForm, type SchemeFormProps } from './scheme-form';

export function SchemeDialog(props: Omit<SchemeFormProps, 'onDone'>) {
  return (
    <FormDialog label="Edit scheme" title="Name and description">
      {(close) => <SchemeForm {...props} onDone={close} />}
    </FormDialog>
  );
}
